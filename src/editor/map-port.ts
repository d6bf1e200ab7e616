import type { Metres, XY } from '@shared/units'

/** Something that a gesture can snap to. `id` is null for the neatline, which is no item. */
export interface SnapLine {
  id: string | null
  line: readonly XY[]
}

export type SnapTarget = 'end' | 'vertex' | 'line' | 'point'

/** What a gesture shows while it goes on; all in sheet metres. */
export interface Sketch {
  /** Line being drawn or moved. */
  line?: readonly XY[]
  /** Part that follows the pointer, dashed. */
  preview?: readonly XY[]
  vertices?: readonly { at: XY; active: boolean }[]
  snap?: { at: XY; to: SnapTarget }
  /** Words beside a place, for example a length. */
  label?: { at: XY; text: string }
}

export type CursorShape = 'default' | 'pointer' | 'crosshair' | 'move' | 'grabbing'

/** All that a gesture sees of the map. */
export interface MapPort {
  /** Ground length of one screen pixel, metres. */
  metresPerPx(): Metres
  /** Lines that come within a distance of a place, the neatline among them. */
  linesNear(at: XY, radius: Metres): readonly SnapLine[]
  /** Points within a distance of a place. */
  pointsNear(at: XY, radius: Metres): readonly { id: string; at: XY }[]
  /** Ids of the items at a place, the likeliest first. */
  pick(at: XY): readonly string[]
  show(sketch: Sketch | null): void
  cursor(shape: CursorShape): void
}
