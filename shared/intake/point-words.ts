import { lineationTypes, planeTypes, stationTypes } from '../items/points'
import type { PointTarget } from './mapping'
import { correctSpelling, named, understand, vocabulary, wordsOf } from './words'

type PlaneTrait = 'overturned' | 'undulating' | 'tops-known'
type PointSense =
  (typeof planeTypes)[number] | (typeof lineationTypes)[number] | (typeof stationTypes)[number] | PlaneTrait

/** The trade's words for points. What is named like a type of ours is that type. */
const pointWords = vocabulary<PointSense>([
  ...named(planeTypes),
  ...named(lineationTypes),
  ...named(stationTypes),
  ['bedding', 'bed, beds, strata, stratum, stratification, layering, s0'],
  ['foliation', 'schistosity, gneissosity, bedding foliation'],
  ['joint', 'joints, fracture, fractures'],
  ['lineation', 'lineations, mineral lineation, stretching lineation'],
  ['minor-fold-axis', 'minor fold, fold axis'],
  ['station', 'stations, outcrop, outcrops, observation, waypoint, locality, stop'],
  ['sample', 'samples, specimen, specimens'],
  ['fossil-locality', 'fossil, fossils'],
  ['borehole', 'boreholes, drill hole, drillhole, drillholes'],
  ['spring', 'springs'],
  ['quarry', 'quarries'],
  ['mine-adit', 'adit, adits'],
  ['tops-direction', 'younging, younging direction'],
  ['overturned', 'overturned, inverted'],
  ['undulating', 'undulating, wavy, crenulated'],
  ['tops-known', 'tops known, top known'],
  [
    null,
    'strike, dip, and, of, the, vertical, horizontal, inclined, normal, upright, tops, top, unknown, facing',
  ],
  [
    null,
    'attitude, measurement, reading, plane, planes, planar, surface, surfaces, symbol, point, axis, bedding parallel',
  ],
])

/** What a text says a point is, every word of it understood; undefined where it says nothing, two things, or more than
 *  we know. "Bedding-parallel foliation" is foliation. */
export function readPointType(text: string): PointTarget | undefined {
  const { senses, strange } = understand(wordsOf(text), pointWords)
  return strange.length > 0 ? undefined : targetOf(senses)
}

/** What a text that is not understood may have meant; for a person to confirm. */
export function suggestPointType(text: string): PointTarget | undefined {
  const words = wordsOf(text)
  return (
    targetOf(understand(words, pointWords).senses) ??
    targetOf(understand(correctSpelling(words, pointWords), pointWords).senses)
  )
}

/** Whether a text says that nobody knows which way the beds face. */
export const saysTopsUnknown = (text: string): boolean => /\b(tops?|facing)\b.*\bunknown\b/i.test(text)

function targetOf(senses: ReadonlySet<PointSense>): PointTarget | undefined {
  const plane = planeTypes.find((type) => senses.has(type))
  if (plane) return attitudeTarget(plane, senses)
  const [only, ...more] = senses
  if (more.length > 0) return undefined
  const lineation = lineationTypes.find((type) => type === only)
  if (lineation) return { kind: 'lineation', type: lineation }
  const station = stationTypes.find((type) => type === only)
  return station && { kind: 'station', type: station }
}

/** Only beds have a top, and only beds and foliation undulate, as far as a symbol tells. */
function attitudeTarget(
  type: (typeof planeTypes)[number],
  senses: ReadonlySet<PointSense>,
): PointTarget | undefined {
  const overturned = senses.has('overturned')
  const topsKnown = senses.has('tops-known')
  const undulating = senses.has('undulating')
  const others = [...senses].filter(
    (sense) => sense !== type && sense !== 'overturned' && sense !== 'tops-known' && sense !== 'undulating',
  )
  if (others.length > 0) return undefined
  if ((overturned || topsKnown) && type !== 'bedding') return undefined
  if (undulating && type !== 'bedding' && type !== 'foliation') return undefined
  return { kind: 'attitude', type, overturned, undulating, topsKnown }
}
