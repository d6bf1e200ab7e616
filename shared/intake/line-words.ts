import type { LocationConfidence } from '../items/confidence'
import { faultTypes, foldForms, otherLineTypes, type FaultType } from '../items/lines'
import type { LineTarget } from './mapping'
import { correctSpelling, named, understand, vocabulary, wordsOf } from './words'

/** What a fold's name is made of: an overturned syncline is both, a monocline's anticlinal bend too. */
type FoldSense = 'anticline' | 'syncline' | 'antiform' | 'synform' | 'overturned' | 'monocline'
type FaultSense = Exclude<FaultType, 'unspecified'> | 'strike-slip'
type OtherSense = (typeof otherLineTypes)[number]
type LineSense = 'contact' | 'fault' | 'frame' | FoldSense | FaultSense | OtherSense

const statedTypes = faultTypes.filter((type) => type !== 'unspecified')
const faultSenses: readonly LineSense[] = ['fault', 'strike-slip', ...statedTypes]

const confidenceWords = vocabulary<LocationConfidence>([
  ['certain', 'certain, accurate, accurately, definite, exact, known, observed, exposed'],
  ['approximate', 'approximate, approximately, approx, aprox'],
  ['inferred', 'inferred, interpreted'],
  ['concealed', 'concealed, covered, buried, hidden'],
  [null, 'located, location, position, well, confidence, the, is'],
])

/** The trade's words for lines. Two-word terms stand beside their one-word spellings. */
const lineWords = vocabulary<LineSense>([
  ...named(statedTypes),
  ...named(otherLineTypes),
  ['contact', 'contact, contacts, boundary, boundaries'],
  ['fault', 'fault, faults'],
  ['thrust', 'thrusts, overthrust'],
  ['left-lateral', 'left slip, leftlateral, leftslip, sinistral'],
  ['right-lateral', 'right slip, rightlateral, rightslip, dextral'],
  ['rotational', 'scissor, scissors, pivotal'],
  ['strike-slip', 'strike slip, strikeslip, wrench, transcurrent'],
  ['anticline', 'anticline, anticlines, anticlinal'],
  ['syncline', 'syncline, synclines, synclinal'],
  ['antiform', 'antiform, antiforms, antiformal'],
  ['synform', 'synform, synforms, synformal'],
  ['overturned', 'overturned'],
  ['monocline', 'monocline, monoclines, monoclinal'],
  ['dike', 'dikes, dyke, dykes'],
  ['vein', 'veins'],
  ['marker-bed', 'marker beds, marker horizon, key bed, key beds'],
  ['frame', 'frame, map frame, neatline, map border, sheet border'],
  [
    null,
    'geologic, geological, lithologic, lithological, lithology, stratigraphic, formation, formational, unit',
  ],
  [
    null,
    'rock, axis, axes, axial, trace, plane, surface, hinge, fold, bend, line, structural, slip, plunging, of, the, a',
  ],
  [null, [...confidenceWords.keys()].join(', ')],
])

/** A form of fold is what its own name says. */
const formSenses = foldForms.map((form) => ({ form, senses: understand(wordsOf(form), lineWords).senses }))

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
  if (all.every((sense) => faultSenses.includes(sense))) return faultTarget(senses)
  const other = otherLineTypes.find((type) => senses.has(type))
  if (other) return all.length === 1 ? { kind: 'other-line', type: other } : undefined
  if (senses.has('contact')) return all.length === 1 ? { kind: 'contact' } : undefined
  const fold = formSenses.find((each) => isSame(each.senses, senses))
  return fold && { kind: 'axial-trace', form: fold.form }
}

function faultTarget(senses: ReadonlySet<LineSense>): LineTarget | undefined {
  const types = statedTypes.filter((type) => senses.has(type))
  if (types.length > 1) return undefined
  const type = types[0] ?? 'unspecified'
  const slides = type === 'left-lateral' || type === 'right-lateral' || type === 'unspecified'
  return senses.has('strike-slip') && !slides ? undefined : { kind: 'fault', type }
}

const isSame = <T>(a: ReadonlySet<T>, b: ReadonlySet<T>): boolean =>
  a.size === b.size && [...a].every((member) => b.has(member))
