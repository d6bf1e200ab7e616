import type { Degrees } from '../units'
import { cutDashes } from './dashes'
import type { DisplayList, Mark, Path, PatternMark, TextMark } from './display-list'
import { inkColour } from './ink'
import { mapPath } from './paths'
import { baselineStart } from './text-box'
import { marksOverCells } from './tile'

/** How a path is painted. Lengths are in the surface's unit, colours `#rrggbb`. */
export type Paint =
  /** Joins are always round. */
  | { paint: 'stroke'; width: number; colour: string; cap: 'butt' | 'round' }
  /** Even-odd. */
  | { paint: 'fill'; colour: string; opacity: number }

/** A run of Lato, anchored at the left end of its base line. */
export interface TextRun {
  text: string
  x: number
  y: number
  /** Em size, in the surface's unit. */
  size: number
  weight: TextMark['weight']
  colour: string
  /** Turn about (x, y), degrees clockwise as seen. */
  turn: Degrees
  /** Space added between letters, in the surface's unit. */
  tracking: number
  /** Outline painted beneath the letters, round joins; width is that of the whole stroke. */
  halo?: { width: number; colour: string }
}

/** A tile as a surface repeats it, in the surface's unit and axes. */
export interface Tiling {
  /** Names the drawing of the cell: one name, size and colour, one picture. */
  name: string
  colour: string
  /** Size of a cell, and from one to the next. */
  width: number
  height: number
  /** A cell's corner of smallest x and y. */
  x: number
  y: number
  /** Draws a block of cells with its corner of smallest x and y at (0, 0). Marks that reach into it from outside are drawn
   *  too, each once: a surface cuts the block at its edges, and copies of it meet without a seam. */
  draw(to: Pick<Surface, 'path'>, columns?: number, rows?: number): void
}

/** What draws. A surface is told finished things in its own unit: no dashes, no ink names, no anchors, no attributes. */
export interface Surface {
  path(path: Path, paint: Paint): void
  /** Fills a path (even-odd) with a repeated cell. */
  tile(path: Path, tiling: Tiling): void
  text(run: TextRun): void
  /** Limits what follows to a path (even-odd), until the end of the group it stands in. */
  clip(path: Path): void
  /** Draws several things as one; whatever `draw` sets ends with it. */
  group(name: string, draw: () => void): void
}

/** From a list's millimetres to a surface: x′ = x + scale · mm, and y′ likewise, or downward where the surface's y runs
 *  down (canvas, SVG, PDF). */
export interface Transform {
  /** Surface units per millimetre. */
  scale: number
  x: number
  y: number
  flipY: boolean
}

const IDENTITY: Transform = { scale: 1, x: 0, y: 0, flipY: false }

/** Draws a display list on a surface: resolves the transform, cuts dashes, names colours and anchors text. The only reader
 *  of display lists, so that all surfaces show the same. */
export function replay(list: DisplayList, surface: Surface, transform: Transform = IDENTITY): void {
  for (const mark of list) replayMark(mark, surface, transform)
}

function replayMark(mark: Mark, surface: Surface, transform: Transform): void {
  switch (mark.mark) {
    case 'stroke': {
      const path = mark.dash ? cutDashes(mark.path, mark.dash) : mark.path
      const width = mark.width * transform.scale
      surface.path(placed(path, transform), {
        paint: 'stroke',
        width,
        colour: inkColour(mark.ink),
        cap: mark.cap ?? 'butt',
      })
      return
    }
    case 'fill':
      surface.path(placed(mark.path, transform), {
        paint: 'fill',
        colour: inkColour(mark.ink),
        opacity: mark.opacity ?? 1,
      })
      return
    case 'pattern':
      surface.tile(placed(mark.path, transform), tilingOf(mark, transform))
      return
    case 'text':
      surface.text(textRun(mark, transform))
      return
    case 'group':
      surface.group(mark.name, () => {
        if (mark.clip) surface.clip(placed(mark.clip, transform))
        replay(mark.marks, surface, transform)
      })
  }
}

function placed(path: Path, { scale, x, y, flipY }: Transform): Path {
  const down = flipY ? -scale : scale
  return mapPath(path, (point) => [x + point[0] * scale, y + point[1] * down])
}

function tilingOf({ tile, ink, anchor }: PatternMark, transform: Transform): Tiling {
  const { scale, flipY } = transform
  const [width, height] = [tile.width * scale, tile.height * scale]
  const colour = inkColour(ink)
  const x = transform.x + anchor[0] * scale
  const y = transform.y + anchor[1] * (flipY ? -scale : scale)
  return {
    name: tile.id,
    colour,
    width,
    height,
    x,
    y: flipY ? y - height : y,
    draw(to, columns = 1, rows = 1) {
      const block = { scale, x: 0, y: flipY ? rows * height : 0, flipY }
      for (const mark of marksOverCells(tile, columns, rows)) {
        const paint: Paint =
          mark.mark === 'stroke'
            ? { paint: 'stroke', width: mark.width * scale, colour, cap: mark.cap ?? 'butt' }
            : { paint: 'fill', colour, opacity: 1 }
        to.path(placed(mark.path, block), paint)
      }
    },
  }
}

function textRun(mark: TextMark, { scale, x, y, flipY }: Transform): TextRun {
  const start = baselineStart(mark)
  const run: TextRun = {
    text: mark.text,
    x: x + start[0] * scale,
    y: y + start[1] * (flipY ? -scale : scale),
    size: mark.size * scale,
    weight: mark.weight,
    colour: inkColour(mark.ink),
    turn: mark.turn ?? 0,
    tracking: (mark.tracking ?? 0) * scale,
  }
  if (!mark.halo) return run
  return { ...run, halo: { width: mark.halo * 2 * scale, colour: inkColour(mark.haloInk ?? 'paper') } }
}
