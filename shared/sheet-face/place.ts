import type { DisplayList, Mark, Path } from '../symbols/display-list'
import { mapPath } from '../symbols/paths'
import type { Millimetres } from '../units'

/** A display list moved on the page. */
export const place = (list: DisplayList, x: Millimetres, y: Millimetres): Mark[] =>
  list.map((mark) => moveMark(mark, x, y))

function moveMark(mark: Mark, x: Millimetres, y: Millimetres): Mark {
  switch (mark.mark) {
    case 'text':
      return { ...mark, at: [mark.at[0] + x, mark.at[1] + y] }
    case 'group':
      return {
        ...mark,
        marks: place(mark.marks, x, y),
        ...(mark.clip ? { clip: movePath(mark.clip, x, y) } : {}),
      }
    default:
      return { ...mark, path: movePath(mark.path, x, y) }
  }
}

const movePath = (path: Path, x: Millimetres, y: Millimetres): Path =>
  mapPath(path, (point) => [point[0] + x, point[1] + y])
