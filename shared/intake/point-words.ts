import type { PointTarget } from './mapping'
import { correctSpelling, understand, vocabulary, wordsOf } from './words'

type PointSense = 'bedding' | 'foliation' | 'cleavage' | 'joint' | 'station' | 'overturned'

const pointWords = vocabulary<PointSense>([
  ['bedding', 'bedding, bed, beds, strata, stratum, stratification, layering, s0'],
  ['foliation', 'foliation, schistosity, gneissosity, bedding foliation'],
  ['cleavage', 'cleavage'],
  ['joint', 'joint, joints, fracture, fractures'],
  ['station', 'station, stations, outcrop, outcrops, observation, waypoint, locality, stop'],
  ['overturned', 'overturned, inverted'],
  [
    null,
    'strike, dip, and, of, the, vertical, horizontal, inclined, normal, upright, tops, top, unknown, facing',
  ],
  [
    null,
    'attitude, measurement, reading, plane, planes, planar, surface, surfaces, symbol, point, bedding parallel',
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
  const overturned = senses.has('overturned')
  const planes = (['bedding', 'foliation', 'cleavage', 'joint'] as const).filter((type) => senses.has(type))
  const type = planes.length === 1 ? planes[0] : undefined
  if (senses.has('station')) return planes.length === 0 && !overturned ? { kind: 'station' } : undefined
  return type ? { kind: 'attitude', type, overturned } : undefined
}
