import type { LocationConfidence } from '../items/confidence'
import { foldForms, type FoldForm } from '../items/lines'
import type { LineTarget } from './mapping'
import { correctSpelling, understand, vocabulary, wordsOf } from './words'

type FaultSense = 'normal' | 'reverse' | 'thrust' | 'left-lateral' | 'right-lateral' | 'strike-slip'
type OtherSense = 'dike' | 'vein' | 'marker-bed'
type LineSense = 'contact' | 'fault' | 'frame' | FoldForm | FaultSense | OtherSense

const foldSenses: readonly string[] = foldForms
const faultSenses: readonly string[] = [
  'normal',
  'reverse',
  'thrust',
  'left-lateral',
  'right-lateral',
  'strike-slip',
]

const confidenceWords = vocabulary<LocationConfidence>([
  ['certain', 'certain, accurate, accurately, definite, exact, known, observed, exposed'],
  ['approximate', 'approximate, approximately, approx, aprox'],
  ['inferred', 'inferred, interpreted'],
  ['concealed', 'concealed, covered, buried, hidden'],
  [null, 'located, location, position, well, confidence, the, is'],
])

/** The trade's words for lines. Two-word terms stand beside their one-word spellings. */
const lineWords = vocabulary<LineSense>([
  ['contact', 'contact, contacts, boundary, boundaries'],
  ['fault', 'fault, faults'],
  ['thrust', 'thrust, thrusts, overthrust'],
  ['reverse', 'reverse'],
  ['normal', 'normal'],
  ['left-lateral', 'left lateral, left slip, leftlateral, leftslip, sinistral'],
  ['right-lateral', 'right lateral, right slip, rightlateral, rightslip, dextral'],
  ['strike-slip', 'strike slip, strikeslip, wrench, transcurrent'],
  ['anticline', 'anticline, anticlines, anticlinal'],
  ['syncline', 'syncline, synclines, synclinal'],
  ['antiform', 'antiform, antiforms, antiformal'],
  ['synform', 'synform, synforms, synformal'],
  ['dike', 'dike, dikes, dyke, dykes'],
  ['vein', 'vein, veins'],
  ['marker-bed', 'marker bed, marker beds, marker horizon, key bed, key beds'],
  ['frame', 'frame, map frame, neatline, map border, sheet border'],
  [
    null,
    'geologic, geological, lithologic, lithological, lithology, stratigraphic, formation, formational, unit',
  ],
  [
    null,
    'rock, axis, axes, axial, trace, plane, surface, hinge, fold, line, structural, slip, plunging, of, the, a',
  ],
  [null, [...confidenceWords.keys()].join(', ')],
])

/** What a text says a line is, every word of it understood; undefined where it says nothing, two things, or more than
 *  we know ("fold", "fault contact", "fault breccia"). Frames of map sheets are known, and left out. */
export function readLineType(text: string): LineTarget | undefined {
  const { senses, strange } = understand(wordsOf(text), lineWords)
  return strange.length > 0 ? undefined : targetOf(senses)
}

/** What a text that is not understood may have meant: strange words passed over, misspellings mended. For a person to
 *  confirm, never to be applied unasked. */
export function suggestLineType(text: string): LineTarget | undefined {
  const words = wordsOf(text)
  return (
    targetOf(understand(words, lineWords).senses) ??
    targetOf(understand(correctSpelling(words, lineWords), lineWords).senses)
  )
}

/** The location confidence that a text states; undefined where it states none or two. A text about something else, as
 *  "Concealed fault", may carry one too: `among` then is true. */
export function readConfidence(text: string, among = false): LocationConfidence | undefined {
  const { senses, strange } = understand(wordsOf(text), confidenceWords)
  if (senses.size !== 1 || (strange.length > 0 && !among)) return undefined
  return [...senses][0]
}

/** Strike-slip whose sense is not stated stays a fault of unspecified type. */
export const isSenseless = (text: string): boolean => {
  const { senses } = understand(wordsOf(text), lineWords)
  return senses.has('strike-slip') && !senses.has('left-lateral') && !senses.has('right-lateral')
}

function targetOf(senses: ReadonlySet<LineSense>): LineTarget | undefined {
  if (senses.has('frame')) return { kind: 'leave-out' }
  if (senses.size === 0) return undefined
  const all = [...senses]
  if (all.every((sense) => sense === 'fault' || faultSenses.includes(sense))) return faultTarget(senses)
  const only = all.length === 1 ? all[0] : undefined
  if (only === 'contact') return { kind: 'contact' }
  if (only === 'dike' || only === 'vein' || only === 'marker-bed') return { kind: 'other-line', type: only }
  return isFoldForm(only) ? { kind: 'axial-trace', form: only } : undefined
}

function faultTarget(senses: ReadonlySet<LineSense>): LineTarget | undefined {
  const types = (['normal', 'reverse', 'thrust', 'left-lateral', 'right-lateral'] as const).filter((type) =>
    senses.has(type),
  )
  if (types.length > 1) return undefined
  const type = types[0] ?? 'unspecified'
  const slides = type === 'left-lateral' || type === 'right-lateral' || type === 'unspecified'
  return senses.has('strike-slip') && !slides ? undefined : { kind: 'fault', type }
}

const isFoldForm = (sense: LineSense | undefined): sense is FoldForm =>
  sense !== undefined && foldSenses.includes(sense)
