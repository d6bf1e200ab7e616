import { gridInterval } from '@shared/sheet-face/intervals'
import { groupThousands } from '@shared/sheet-face/figures'
import type { DisplayList, Mark } from '@shared/symbols/display-list'
import { toMm, type DrawingFrame } from '@shared/symbols/frame'
import type { Millimetres } from '@shared/units'
import type { GroundBox } from './item-index'

/** From the neatline down to the bar: clear of the frame's figures. */
const BELOW: Millimetres = 13.5
const UNITS = 4
const THICK: Millimetres = 1.1
const THIN: Millimetres = 0.25

/** A scale bar below the middle of the map face that follows the view: units drawn thick and thin in turn, so that lengths
 *  can be read at any zoom. The printed page has its own. */
export function screenScaleBar({ min, max }: GroundBox, frame: DrawingFrame): DisplayList {
  const unit = gridInterval(frame.mmPerMetre, 0)
  const length = unit * frame.mmPerMetre
  const [left, bottom] = toMm(frame, min)
  const [right] = toMm(frame, max)
  const units = Math.max(1, Math.min(UNITS, Math.floor((right - left) / length)))
  const x = (left + right) / 2 - (length * units) / 2
  const y = bottom - BELOW
  const ends = Array.from({ length: units + 1 }, (_, index) => x + index * length)
  return [
    ...ends.slice(0, -1).map((from, index): Mark => ({
      mark: 'stroke',
      path: [
        ['move', from, y],
        ['line', from + length, y],
      ],
      width: index % 2 === 0 ? THICK : THIN,
      ink: 'frame',
    })),
    ...ends.map((at): Mark => ({
      mark: 'stroke',
      path: [
        ['move', at, y - 0.9],
        ['line', at, y + 0.9],
      ],
      width: THIN,
      ink: 'frame',
    })),
    ...ends.map((at, index): Mark => ({
      mark: 'text',
      text: index === units ? inWords(unit * index) : figure(unit * index, unit),
      at: [at, y - 2.9],
      size: 2.5,
      weight: 400,
      ink: 'frame',
      align: 'middle',
    })),
  ]
}

const figure = (metres: number, unit: number): string =>
  unit >= 1000 ? String(metres / 1000) : groupThousands(metres)

const inWords = (metres: number): string =>
  metres >= 1000 ? `${metres / 1000} km` : `${groupThousands(metres)} m`
