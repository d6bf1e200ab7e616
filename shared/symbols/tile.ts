import type { Millimetres } from '../units'
import type { Tile, TileMark } from './display-list'
import { mapPath } from './paths'
import { boundsOf } from './place-marks'

/** The marks of a block of cells, its corner at (0, 0): every repeat of every mark that reaches into the block, once. */
export function marksOverCells(tile: Tile, columns: number, rows: number): TileMark[] {
  return tile.marks.flatMap((mark) => {
    const box = boundsOf([{ ...mark, ink: 'black' }])
    if (!box) return []
    const across = repeats(box.x, box.width, tile.width, columns)
    const up = repeats(box.y, box.height, tile.height, rows)
    return up.flatMap((row) => across.map((column) => shifted(mark, column * tile.width, row * tile.height)))
  })
}

/** By how many cells a mark may be moved so that it still touches the block, along one direction. */
function repeats(from: Millimetres, length: Millimetres, cell: Millimetres, count: number): number[] {
  const first = Math.ceil(-(from + length) / cell)
  const last = Math.floor(count - from / cell)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => first + index)
}

function shifted(mark: TileMark, dx: Millimetres, dy: Millimetres): TileMark {
  return dx === 0 && dy === 0 ? mark : { ...mark, path: mapPath(mark.path, ([x, y]) => [x + dx, y + dy]) }
}
