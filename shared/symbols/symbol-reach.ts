import type { Millimetres } from '../units'

/** No ink of a symbol of a point lies further from its place: what is drawn round a view, and how far a margin must be. */
export const SYMBOL_REACH: Millimetres = 12
