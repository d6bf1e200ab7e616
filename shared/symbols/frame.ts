import type { Degrees, Metres, Millimetres, MM, XY } from '../units'

/** How the ground lies on the drawing: where sheet metres fall in millimetres, and how far grid north is from true
 *  north. For print, `mmPerMetre` is 1000 / scale; on screen it follows the zoom and the size symbols are shown at. */
export interface DrawingFrame {
  /** Sheet metres at the drawing's origin. */
  origin: XY
  mmPerMetre: Millimetres
  /** Grid convergence at a place, degrees: azimuth of grid north from true north, clockwise positive. */
  convergenceAt(xy: XY): Degrees
}

/** Sheet metres → drawing millimetres. */
export const toMm = (frame: DrawingFrame, [east, north]: XY): MM => [
  (east - frame.origin[0]) * frame.mmPerMetre,
  (north - frame.origin[1]) * frame.mmPerMetre,
]

/** Scale of a printed sheet as millimetres per metre of ground. */
export const mmPerMetreAtScale = (scaleDenominator: Metres): Millimetres => 1000 / scaleDenominator
