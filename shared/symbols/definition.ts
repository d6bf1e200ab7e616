import type { LocationConfidence } from '../items/confidence'
import type { LineItem } from '../items/item'
import type { AttitudeProperties } from '../items/points'
import type { Millimetres } from '../units'
import type { Ink, Mark } from './display-list'

/** A published standard's number for the same symbol, where it was looked up and found; the drawing is our own. */
export interface Published {
  standard: 'FGDC-STD-013-2006'
  number: string
}

/** How the line itself is drawn at one location confidence. */
export interface LineStroke {
  width: Millimetres
  /** Lengths drawn and left out in turn; a whole line where there is none. */
  dash?: readonly Millimetres[]
  cap?: 'round'
}

/** What decorations need to know of the item they stand on. */
export interface LineAttributes {
  /** +1: the stated side is left of the line, seen along it; −1: right. */
  side: 1 | -1
}

/** A small drawing repeated along a line, in its own frame: x along the line, y to its left, origin on the line. */
export interface Decoration {
  /** Room it takes along the line. */
  size: Millimetres
  /** From one to the next, about: the line is shared out evenly. */
  interval: Millimetres
  /** Stretch of line over which its direction is taken. */
  bearingOver: Millimetres
  marks(attributes: LineAttributes): readonly Mark[]
}

/** A line symbol: data, in millimetres on the printed sheet. */
export interface LineSymbol {
  kind: LineItem['kind']
  /** The item's type or form; empty where the kind has only one. */
  variant: string
  title: string
  ink: Ink
  strokes: Record<LocationConfidence, LineStroke>
  /** Drawn along the middle of the stroke: makes the line a double one. */
  core?: { width: Millimetres; ink: Ink }
  decoration?: Decoration
  published?: Partial<Record<LocationConfidence, Published>>
}

/** The cases of a plane's attitude that have a drawing of their own. */
export const attitudeCases = ['inclined', 'horizontal', 'vertical', 'overturned'] as const
export type AttitudeCase = (typeof attitudeCases)[number]

/** A plane symbol: one drawing per case, in a frame with y up the strike and x down dip, origin at the place. */
export interface AttitudeSymbol {
  type: AttitudeProperties['type']
  title: string
  /** Without `overturned`, planes that have no top. */
  cases: Partial<Record<AttitudeCase, readonly Mark[]>> &
    Record<Exclude<AttitudeCase, 'overturned'>, readonly Mark[]>
}

/** Sizes of a dashed line's four location confidences. */
export interface ConfidenceSizes {
  width: Millimetres
  long: readonly [drawn: Millimetres, left: Millimetres]
  short: readonly [drawn: Millimetres, left: Millimetres]
  dot: { size: Millimetres; apart: Millimetres }
}

/** Length of a dot's dash: its round caps make the dot. Some surfaces leave out a dash of no length. */
const DOT_DASH: Millimetres = 0.02

/** The trade's four steps: solid, long dashes, short dashes, dots. Source: symbolization.md section 2. */
export const confidenceStrokes = (sizes: ConfidenceSizes): Record<LocationConfidence, LineStroke> => ({
  certain: { width: sizes.width },
  approximate: { width: sizes.width, dash: sizes.long },
  inferred: { width: sizes.width, dash: sizes.short },
  concealed: { width: sizes.dot.size, dash: [DOT_DASH, sizes.dot.apart - DOT_DASH], cap: 'round' },
})
