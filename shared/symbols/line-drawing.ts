import type { Identity, LocationConfidence } from '../items/confidence'
import type { Degrees } from '../units'
import type { LineAttributes, LineEnd } from './definition'

/** One arrowhead of an axis on its trace. */
export interface PlungeHead {
  /** The end of the line that it stands at. */
  end: LineEnd
  /** Out of the line, as at the down-plunge end, or into it, as where an axis goes down toward its middle. */
  points: 'out' | 'in'
  /** Its figure; null where none is stated or wanted. */
  degrees: Degrees | null
}

/** Everything about a line item that its drawing depends on. */
export interface LineDrawing {
  locationConfidence: LocationConfidence
  identity: Identity
  attributes: LineAttributes
  /** Arrowheads of an axis that plunges; at most one at each end. */
  plunge?: readonly PlungeHead[]
  /** Dip of a fault plane toward the stated side. */
  dip?: { degrees: Degrees; figure: boolean }
}
