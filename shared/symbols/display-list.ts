import type { Degrees, Millimetres, MM } from '../units'

/** Ink names; `shared/symbols/ink.ts` says their colours. Unit fills carry their own colour. */
export type Ink = 'black' | 'fold' | 'frame' | 'quiet' | 'paper' | 'selection' | `#${string}`

/** One step of a path, millimetres. Curves are cubic, absolute. */
export type PathStep =
  | readonly ['move', x: Millimetres, y: Millimetres]
  | readonly ['line', x: Millimetres, y: Millimetres]
  | readonly [
      'curve',
      x1: Millimetres,
      y1: Millimetres,
      x2: Millimetres,
      y2: Millimetres,
      x: Millimetres,
      y: Millimetres,
    ]
  | readonly ['close']
export type Path = readonly PathStep[]

/** A line; corners are rounded. */
export interface StrokeMark {
  mark: 'stroke'
  path: Path
  width: Millimetres
  ink: Ink
  cap?: 'butt' | 'round'
  /** Lengths drawn and left out in turn. The interpreter cuts them so that a line starts and ends in a dash. */
  dash?: readonly Millimetres[]
}

/** An area; the even-odd rule makes an inner ring a hole whatever its winding. */
export interface FillMark {
  mark: 'fill'
  path: Path
  ink: Ink
  /** 0–1; 1 unless given. */
  opacity?: number
}

/** A line or a filled shape of a tile, without an ink of its own. */
export type TileMark = Omit<StrokeMark, 'ink' | 'dash'> | Omit<FillMark, 'ink' | 'opacity'>

/** The repeating cell of an area pattern, in millimetres, its origin at the lower left. */
export interface Tile {
  /** Names the drawing: tiles of one id are the same. */
  id: string
  width: Millimetres
  height: Millimetres
  /** Each mark once. One that reaches over the cell's edge goes on in the next cell, and so do its repeats. */
  marks: readonly TileMark[]
}

/** An area filled with a tile, repeated in both directions; what is beneath shows between its marks. Even-odd. */
export interface PatternMark {
  mark: 'pattern'
  path: Path
  tile: Tile
  /** The one ink of all the tile's marks. */
  ink: Ink
  /** Where a corner of a cell lies: with one anchor for all areas of a sheet, a pattern runs on from one to the next. */
  anchor: MM
}

export interface TextMark {
  mark: 'text'
  text: string
  /** Anchor: the middle of the text's height, and its left edge, middle or right edge as `align` says. */
  at: MM
  /** Em size. */
  size: Millimetres
  weight: 400 | 700 | 900
  ink: Ink
  align: 'start' | 'middle' | 'end'
  /** Space added after each letter, for tracked capitals; 0 unless given. */
  tracking?: Millimetres
  /** Turn of the text's base line, degrees clockwise from the page's right; numerals keep 0. */
  turn?: Degrees
  /** Width of an outline beneath the text, so that it reads on any fill. */
  halo?: Millimetres
  /** Paper unless given. */
  haloInk?: Ink
}

/** Marks that belong together, drawn in order and, where a clip is given, only inside it (even-odd). */
export interface GroupMark {
  mark: 'group'
  /** What the group is, for surfaces that can name it: `map-face`, `linework`. */
  name: string
  clip?: Path
  marks: DisplayList
}

export type Mark = StrokeMark | FillMark | PatternMark | TextMark | GroupMark

/** What a definition turns an item and its sheet into: plain numbers in page millimetres, x right, y up. It can be
 *  cached, compared, posted to a worker and drawn by every surface. Marks are drawn in order. */
export type DisplayList = readonly Mark[]
