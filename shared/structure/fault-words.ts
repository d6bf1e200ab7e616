import type { FaultProperties, FaultType } from '../items/lines'
import { otherSide } from '../items/lines'
import { gridAzimuth } from '../geometry/bearings'
import { normalizeAzimuth, type XY } from '../units'
import { compassWords } from './compass'
import { sideAzimuth, sideWords, type ConvergenceAt } from './line-side'
import { upperFirst } from '../words'

/** What a person calls a fault of each type. */
export const faultWords: Record<FaultType, string> = {
  unspecified: 'fault',
  normal: 'normal fault',
  reverse: 'reverse fault',
  thrust: 'thrust',
  'left-lateral': 'left-lateral fault',
  'right-lateral': 'right-lateral fault',
  rotational: 'rotational fault',
}

/** What the decorated side of a fault is, where its type has one. */
export const sideMeanings: Partial<Record<FaultType, string>> = {
  normal: 'down to the',
  reverse: 'upper plate to the',
  thrust: 'upper plate to the',
}

/** A fault on its line in words: `Normal fault, down to the east, dipping 60°`.
 *  @param line sheet metres */
export function describeFault(
  { type, side, dip }: Pick<FaultProperties, 'type' | 'side' | 'dip'>,
  line: readonly XY[],
  convergenceAt: ConvergenceAt,
): string {
  const name = upperFirst(faultWords[type])
  if (type === 'rotational') return `${name}, ${rotationWords(side, line, convergenceAt)}`
  const toward = sideWords(line, side, convergenceAt)
  const meaning = sideMeanings[type]
  const parts = [name, ...(meaning ? [`${meaning} ${toward}`] : [])]
  if (dip === 90) parts.push('vertical')
  else if (dip !== null) parts.push(`dipping ${dip}°${meaning ? '' : ` to the ${toward}`}`)
  return parts.join(', ')
}

/** Which side of a rotational fault is down at which of its ends: `down to the west at its northern end and to the east at
 *  its southern end`. */
export function rotationWords(
  side: FaultProperties['side'],
  line: readonly XY[],
  convergenceAt: ConvergenceAt,
): string {
  const [first, last] = [line[0], line.at(-1)]
  if (!first || !last || sideAzimuth(line, side, convergenceAt) === undefined) {
    return 'its downthrown side changing along it'
  }
  const toStart = normalizeAzimuth(gridAzimuth(last, first) + convergenceAt(last))
  const [atStart, atEnd] = [toStart, toStart + 180].map((azimuth) => `${compassWords(azimuth)}ern end`)
  const [down, up] = [side, otherSide(side)].map((each) => sideWords(line, each, convergenceAt))
  return `down to the ${down} at its ${atStart} and to the ${up} at its ${atEnd}`
}
