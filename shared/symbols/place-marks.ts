import type { Box } from '../geometry/box'
import type { Millimetres, MM } from '../units'
import type { DisplayList, Mark } from './display-list'
import { flatten, mapPath } from './paths'
import { textCorners } from './text-box'

/** Marks drawn in a symbol's own frame, put in their place on the drawing. Text keeps upright: only its anchor moves. */
export const placeMarks = (marks: readonly Mark[], map: (point: MM) => MM): Mark[] =>
  marks.map((mark): Mark => {
    switch (mark.mark) {
      case 'stroke':
      case 'fill':
        return { ...mark, path: mapPath(mark.path, map) }
      case 'pattern':
        return { ...mark, path: mapPath(mark.path, map), anchor: map(mark.anchor) }
      case 'text':
        return { ...mark, at: map(mark.at) }
      case 'group':
        return {
          ...mark,
          ...(mark.clip ? { clip: mapPath(mark.clip, map) } : {}),
          marks: placeMarks(mark.marks, map),
        }
    }
  })

/** From a frame with x along a direction and y to its left to the drawing.
 *  @param direction unit vector on the drawing */
export const alongDirection =
  ([dx, dy]: MM, [x, y]: MM) =>
  ([along, left]: MM): MM => [x + along * dx - left * dy, y + along * dy + left * dx]

/** Outline points of all ink of a list, strokes by their middle line. */
export const inkPoints = (list: DisplayList): { points: MM[]; halfWidth: Millimetres }[] =>
  list.flatMap((mark) => {
    switch (mark.mark) {
      case 'stroke':
        return flatten(mark.path).map((points) => ({ points, halfWidth: mark.width / 2 }))
      case 'fill':
      case 'pattern':
        return flatten(mark.path).map((points) => ({ points, halfWidth: 0 }))
      case 'text': {
        const corners = textCorners(mark)
        return [{ points: [...corners, corners[0]], halfWidth: mark.halo ?? 0 }]
      }
      case 'group':
        return inkPoints(mark.marks)
    }
  })

/** The box that a list's ink fills, millimetres; undefined for an empty list. Clips are not counted. */
export function boundsOf(list: DisplayList): Box | undefined {
  let [left, bottom, right, top] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const { points, halfWidth } of inkPoints(list)) {
    for (const [x, y] of points) {
      left = Math.min(left, x - halfWidth)
      right = Math.max(right, x + halfWidth)
      bottom = Math.min(bottom, y - halfWidth)
      top = Math.max(top, y + halfWidth)
    }
  }
  return left > right ? undefined : { x: left, y: bottom, width: right - left, height: top - bottom }
}
