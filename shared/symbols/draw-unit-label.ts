import type { ItemOf } from '../items/item'
import type { UnitProperties } from '../items/legend'
import { boxAround, grown, leaveBox } from '../geometry/box-edges'
import type { Millimetres, MM } from '../units'
import { unitLabelType } from './definitions/points'
import type { DisplayList, TextMark } from './display-list'
import { circle, polyline } from './paths'
import { capHeight, measureText } from './text-metrics'

/** Where a unit's letters stand, seen from the label's own place, which lies in the area they name. */
export interface LabelStand {
  /** Millimetres at print size. */
  offset: MM
  /** The letters stand outside their area: a line leads from them to the label's place. */
  leader: boolean
}

/** Line of a leader, the dot it ends with in the area, and the air between it and the letters. */
const leaderType = { width: 0.16, dot: 0.32, gap: 0.5 } as const

/** Where a leader to a label's place leaves its letters.
 *  @param at middle of the letters */
export const leaderStart = (text: string, at: MM, place: MM): MM =>
  leaveBox(grown(boxAround(at, unitLabelSize(text)), leaderType.gap), place)

/** The letters of a label: its unit's, queried where they are doubted; `?` where the unit is gone. */
export function unitLabelText(
  { unit, identity }: ItemOf<'unit-label'>['properties'],
  unitOf: (id: string) => UnitProperties | undefined,
): string {
  const label = unitOf(unit)?.label
  return label === undefined ? '?' : label + (identity === 'questionable' ? '?' : '')
}

/** Room that the letters of a label take, their halo left out. */
export const unitLabelSize = (text: string): { width: Millimetres; height: Millimetres } => ({
  width: measureText(text, unitLabelType.size, unitLabelType.weight),
  height: capHeight(unitLabelType.size, unitLabelType.weight),
})

/** A unit's letters at their place, or where they were found room, with a leader if that is outside their area. */
export function drawUnitLabel(text: string, place: MM, stand?: LabelStand): DisplayList {
  const at: MM = stand ? [place[0] + stand.offset[0], place[1] + stand.offset[1]] : place
  const letters: TextMark = {
    mark: 'text',
    text,
    at,
    size: unitLabelType.size,
    weight: unitLabelType.weight,
    ink: 'black',
    align: 'middle',
    halo: unitLabelType.halo,
  }
  if (!stand?.leader) return [letters]
  const from = leaderStart(text, at, place)
  return [
    { mark: 'stroke', path: polyline([from, place]), width: leaderType.width, ink: 'black' },
    { mark: 'fill', path: circle(place, leaderType.dot), ink: 'black' },
    letters,
  ]
}
