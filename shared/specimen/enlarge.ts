import type { DisplayList, Mark } from '../symbols/display-list'
import { mapPath } from '../symbols/paths'
import type { MM } from '../units'

/** A drawing enlarged and moved, strokes, dashes, letters and all: as under a magnifier. */
export function enlarge(list: DisplayList, factor: number, [dx, dy]: MM): DisplayList {
  const place = ([x, y]: MM): MM => [x * factor + dx, y * factor + dy]
  return list.map((mark): Mark => {
    switch (mark.mark) {
      case 'stroke':
        return {
          ...mark,
          path: mapPath(mark.path, place),
          width: mark.width * factor,
          ...(mark.dash ? { dash: mark.dash.map((length) => length * factor) } : {}),
        }
      case 'fill':
        return { ...mark, path: mapPath(mark.path, place) }
      case 'pattern':
        return {
          ...mark,
          path: mapPath(mark.path, place),
          anchor: place(mark.anchor),
          tile: enlargedTile(mark.tile, factor),
        }
      case 'text':
        return {
          ...mark,
          at: place(mark.at),
          size: mark.size * factor,
          ...(mark.halo === undefined ? {} : { halo: mark.halo * factor }),
          ...(mark.tracking === undefined ? {} : { tracking: mark.tracking * factor }),
        }
      case 'group':
        return {
          ...mark,
          ...(mark.clip ? { clip: mapPath(mark.clip, place) } : {}),
          marks: enlarge(mark.marks, factor, [dx, dy]),
        }
    }
  })
}

type Tile = Extract<Mark, { mark: 'pattern' }>['tile']

const enlargedTile = (tile: Tile, factor: number): Tile =>
  factor === 1
    ? tile
    : {
        id: `${tile.id}-${factor}`,
        width: tile.width * factor,
        height: tile.height * factor,
        marks: tile.marks.map((mark) => {
          const path = mapPath(mark.path, ([x, y]) => [x * factor, y * factor])
          return mark.mark === 'stroke' ? { ...mark, path, width: mark.width * factor } : { ...mark, path }
        }),
      }
