import type { Mark } from '../symbols/display-list'
import { polyline } from '../symbols/paths'
import type { Millimetres, MM } from '../units'
import type { TextStyle } from './text-block'

/** How far a section's line is drawn into the map at each end, and how long the bar across its end is. */
const REACH: Millimetres = 7
const BAR: Millimetres = 3
const LETTER: TextStyle = { size: 3.4, weight: 900, ink: 'black', leading: 1.2 }
/** From the end of the line to the middle of its letter. */
const LETTER_AWAY: Millimetres = 3.4

/** Where a cross-section runs: at each end a short piece of its line with a bar across, and its letter beyond it, upright.
 *  The line between the ends is left out, so that it does not read as a contact. Source: common practice.
 *  @param from, to ends of the section on the drawing, millimetres   @param name letter of the section: A gives A and A′ */
export function sectionTicks(from: MM, to: MM, name: string): Mark[] {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1])
  if (length === 0) return []
  const along: MM = [(to[0] - from[0]) / length, (to[1] - from[1]) / length]
  const reach = Math.min(REACH, length / 2)
  // Lato has no prime: an apostrophe stands for it in print.
  return [...endMarks(from, along, reach, name), ...endMarks(to, [-along[0], -along[1]], reach, `${name}'`)]
}

/** @param inward unit vector from the end into the section */
function endMarks([x, y]: MM, [dx, dy]: MM, reach: Millimetres, letter: string): Mark[] {
  return [
    {
      mark: 'stroke',
      path: [
        ...polyline([
          [x, y],
          [x + dx * reach, y + dy * reach],
        ]),
        ...polyline([
          [x - (dy * BAR) / 2, y + (dx * BAR) / 2],
          [x + (dy * BAR) / 2, y - (dx * BAR) / 2],
        ]),
      ],
      width: 0.3,
      ink: 'black',
    },
    {
      mark: 'text',
      text: letter,
      at: [x - dx * LETTER_AWAY, y - dy * LETTER_AWAY],
      size: LETTER.size,
      weight: LETTER.weight,
      ink: LETTER.ink,
      align: 'middle',
      halo: 0.4,
    },
  ]
}
