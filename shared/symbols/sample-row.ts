import type { Millimetres } from '../units'
import type { DisplayList } from './display-list'
import { boundsOf, placeMarks } from './place-marks'

/** A sample moved up or down by as much as its ink needs to stay in a row of a height, from 0 up; what is higher than the row
 *  stands out as far above as below. */
export function keptInRow(list: DisplayList, height: Millimetres): DisplayList {
  const box = boundsOf(list)
  if (!box) return list
  const [over, under] = [box.y + box.height - height, -box.y]
  if (over <= 0 && under <= 0) return list
  const move = over + under > 0 ? (under - over) / 2 : under > 0 ? under : -over
  return placeMarks(list, ([x, y]) => [x, y + move])
}
