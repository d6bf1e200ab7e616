import type { LocationConfidence } from '../items/confidence'
import type { LineItem } from '../items/item'
import type { AttitudeProperties, LineationProperties, StationType } from '../items/points'
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

export type LineEnd = 'start' | 'end'

/** +1 left of a line, seen along it; −1 right. */
export type SideSign = 1 | -1

/** What decorations need to know of the item they stand on. */
export interface LineAttributes {
  /** The stated side. */
  side: SideSign
}

/** How the line lies beneath a decoration. */
export interface Beneath {
  /** The end of the line that is nearer. */
  end: LineEnd
  /** How far the line bows out of the decoration's own x axis, to its left and to its right: what is drawn beside the line
   *  keeps clear by as much. */
  bow: { left: Millimetres; right: Millimetres }
}

/** A small drawing on a line, in its own frame: x along the line, y to its left, origin on the line. */
export interface Decoration {
  /** Room it takes along the line. */
  size: Millimetres
  /** Repeated: from one to the next, about, as the line is shared out evenly. Or once near each end: from there to its middle. */
  placed: { every: Millimetres } | { fromEnds: Millimetres }
  /** Stretch of line over which its direction is taken. */
  bearingOver: Millimetres
  /** Whether it bends with the line beneath it, as a tooth's foot does. */
  follows?: true
  marks(attributes: LineAttributes, beneath: Beneath): readonly Mark[]
}

/** A line symbol: data, in millimetres on the printed sheet. */
export interface LineSymbol {
  /** Stable name, for example `fault.normal`. */
  id: string
  kind: LineItem['kind']
  /** The item's type or form; empty where the kind has only one. */
  variant: string
  /** What it means, as the legend says it. */
  title: string
  /** What its decoration tells the reader of the map, for example which side the ball stands on. */
  explains?: string
  /** Names of the item's attributes that the drawing follows, beside the type or form that picks the symbol. */
  drivenBy: readonly string[]
  ink: Ink
  strokes: Record<LocationConfidence, LineStroke>
  /** Drawn along the middle of the stroke: makes the line a double one. */
  core?: { width: Millimetres; ink: Ink }
  decoration?: Decoration
  published?: Partial<Record<LocationConfidence, Published>>
  /** The same with queries in the line. */
  publishedQueried?: Partial<Record<LocationConfidence, Published>>
}

/** What a point symbol says of itself beside its drawing. */
export interface PointFacts {
  /** What it means, as the legend says it. */
  title: string
  /** Attributes of the item that the drawing follows, as words: `strike`, `dip`. */
  drivenBy: readonly string[]
  published?: Published
}

/** The cases of a plane's attitude that have a drawing of their own. */
export const attitudeCases = ['inclined', 'horizontal', 'vertical', 'overturned'] as const
export type AttitudeCase = (typeof attitudeCases)[number]

/** One drawing per case of an attitude; none for `overturned` where planes have no top. */
export type AttitudeDrawings = Partial<Record<AttitudeCase, readonly Mark[]>> &
  Record<Exclude<AttitudeCase, 'overturned'>, readonly Mark[]>

/** A plane symbol, in a frame with y up the strike and x down dip, origin at the place. */
export interface AttitudeSymbol extends PointFacts {
  type: AttitudeProperties['type']
  cases: AttitudeDrawings
  /** The same planes where they undulate; missing where that is not said of them. */
  undulating?: AttitudeDrawings
  /** Added where the top of the bed is known; of a vertical bed, where its top lies on the side of x. */
  topsKnown?: Partial<Record<AttitudeCase, readonly Mark[]>>
}

/** The cases of a line's attitude that have a drawing of their own. */
export const lineationCases = ['plunging', 'horizontal', 'vertical'] as const
export type LineationCase = (typeof lineationCases)[number]

/** A symbol of a lineation, in a frame with y along its trend, origin at the place. */
export interface LineationSymbol extends PointFacts {
  type: LineationProperties['type']
  cases: Record<LineationCase, readonly Mark[]>
}

/** A symbol of a place, origin at the place: as it stands on the page or, where the item has an azimuth to show, with y
 *  along it. */
export interface PlaceSymbol extends PointFacts {
  type: StationType
  marks: readonly Mark[]
  /** What the azimuth of such an item is, as a field's name; missing where it has none. */
  azimuth?: string
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
