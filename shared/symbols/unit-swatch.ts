import type { UnitProperties } from '../items/legend'
import type { Millimetres } from '../units'
import type { DisplayList, TextMark } from './display-list'
import { drawFace } from './draw-face'
import { polyline } from './paths'
import { measureText } from './text-metrics'
import type { UnitFill } from './unit-fill'

/** Letters of a swatch, the room they leave at its sides, and the halo that parts them from a pattern. */
const swatchType = { size: 2.9, weight: 700, edge: 0.6, halo: 0.4 } as const

/** The swatch of a unit: its fill in a hairline frame, with its letters, made smaller where they would not fit. */
export function drawUnitSwatch(
  unit: Pick<UnitProperties, 'label'>,
  fill: UnitFill,
  size: { width: Millimetres; height: Millimetres },
): DisplayList {
  const { width, height } = size
  const corners = polyline(
    [
      [0, 0],
      [width, 0],
      [width, height],
      [0, height],
    ],
    true,
  )
  const label: TextMark = {
    mark: 'text',
    text: unit.label,
    at: [width / 2, height / 2],
    size: swatchType.size * letterFit(unit.label, size),
    weight: swatchType.weight,
    ink: 'black',
    align: 'middle',
    ...(fill.pattern ? { halo: swatchType.halo, haloInk: fill.ground ?? 'paper' } : {}),
  }
  return [
    ...drawFace(corners, fill, [width / 2, height / 2]),
    { mark: 'stroke', path: corners, width: 0.2, ink: 'black' },
    label,
  ]
}

/** Share of their size at which letters fit a swatch. */
function letterFit(label: string, { width, height }: { width: Millimetres; height: Millimetres }): number {
  const natural = measureText(label, swatchType.size, swatchType.weight)
  const room = width - 2 * swatchType.edge
  return Math.min(1, room / Math.max(natural, 0.1), (height * 0.8) / swatchType.size)
}
