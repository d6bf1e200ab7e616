import { toRadians, type Millimetres, type MM } from '../units'
import type { TextMark } from './display-list'
import { capHeight, measureText } from './text-metrics'

/** Width of a text mark with its tracking. Tracking follows every letter but the last. */
export const textMarkWidth = (mark: TextMark): Millimetres =>
  measureText(mark.text, mark.size, mark.weight) +
  (mark.tracking ?? 0) * Math.max(0, [...mark.text].length - 1)

/** Left end of the base line of a text mark, millimetres: where every surface begins to set it. */
export function baselineStart(mark: TextMark): MM {
  const share = mark.align === 'start' ? 0 : mark.align === 'middle' ? 0.5 : 1
  const back = share * textMarkWidth(mark)
  const down = capHeight(mark.size, mark.weight) / 2
  const turn = toRadians(mark.turn ?? 0)
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)]
  return [mark.at[0] - back * cos - down * sin, mark.at[1] + back * sin - down * cos]
}

/** The four corners of the letters' box, from base line to the height of capitals, starting lower left, counterclockwise. */
export function textCorners(mark: TextMark): [MM, MM, MM, MM] {
  const [x, y] = baselineStart(mark)
  const [width, height] = [textMarkWidth(mark), capHeight(mark.size, mark.weight)]
  const turn = toRadians(mark.turn ?? 0)
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)]
  const corner = (along: number, up: number): MM => [x + along * cos + up * sin, y - along * sin + up * cos]
  return [corner(0, 0), corner(width, 0), corner(width, height), corner(0, height)]
}
