import type { DisplayList, Mark, Path } from '../symbols/display-list'
import { mapPath } from '../symbols/paths'
import type { Millimetres } from '../units'

/** A display list moved on the page and, if asked, drawn larger or smaller about its origin: lines and letters too. */
export const place = (list: DisplayList, x: Millimetres, y: Millimetres, scale = 1): Mark[] =>
  list.map((mark) => placeMark(mark, x, y, scale))

function placeMark(mark: Mark, x: Millimetres, y: Millimetres, scale: number): Mark {
  const path = (given: Path): Path => mapPath(given, (point) => [x + point[0] * scale, y + point[1] * scale])
  switch (mark.mark) {
    case 'stroke':
      return {
        ...mark,
        path: path(mark.path),
        width: mark.width * scale,
        ...(mark.dash ? { dash: mark.dash.map((length) => length * scale) } : {}),
      }
    case 'fill':
      return { ...mark, path: path(mark.path) }
    case 'pattern':
      // A pattern keeps its size, so that a large swatch shows what stands on the map.
      return {
        ...mark,
        path: path(mark.path),
        anchor: [x + mark.anchor[0] * scale, y + mark.anchor[1] * scale],
      }
    case 'text':
      return {
        ...mark,
        at: [x + mark.at[0] * scale, y + mark.at[1] * scale],
        size: mark.size * scale,
        ...(mark.tracking === undefined ? {} : { tracking: mark.tracking * scale }),
        ...(mark.halo === undefined ? {} : { halo: mark.halo * scale }),
      }
    case 'group':
      return {
        ...mark,
        marks: place(mark.marks, x, y, scale),
        ...(mark.clip ? { clip: path(mark.clip) } : {}),
      }
  }
}
