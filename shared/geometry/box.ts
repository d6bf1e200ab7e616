import type { Millimetres } from '../units'

/** A rectangle on a drawing, millimetres from its lower left corner, y up. */
export interface Box {
  x: Millimetres
  y: Millimetres
  width: Millimetres
  height: Millimetres
}
