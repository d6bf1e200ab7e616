import type { ItemKind } from '../items/item'

/** Kinds with a place, in the order of drawing: what must stay readable comes later. */
export const drawingOrder: readonly ItemKind[] = [
  'contact',
  'other-line',
  'fault',
  'axial-trace',
  'station',
  'attitude',
  'lineation',
  'unit-label',
]
