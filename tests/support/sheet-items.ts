import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import { itemSchema } from '@shared/items/item'
import type { XY } from '@shared/units'

let made = 0
/** A new id, the same in every run of a test file. */
export const anId = (): string => `00000000-0000-4000-8000-${String(++made).padStart(12, '0')}`

/** An item with what the schema fills in; throws where the test asks for one that cannot be. */
function item<K extends ItemKind>(kind: K, geometry: unknown, properties: object): ItemOf<K> {
  const parsed: Item = itemSchema.parse({ id: anId(), kind, geometry, properties })
  // The schema keeps the kind that it was given.
  return parsed as ItemOf<K>
}

export const aLine = <K extends 'contact' | 'fault' | 'axial-trace' | 'other-line'>(
  kind: K,
  coordinates: XY[],
  properties: Partial<ItemOf<K>['properties']>,
): ItemOf<K> => item(kind, { type: 'LineString', coordinates }, properties)

export const aPoint = <K extends 'attitude' | 'lineation' | 'station' | 'unit-label'>(
  kind: K,
  coordinates: XY,
  properties: Partial<ItemOf<K>['properties']>,
): ItemOf<K> => item(kind, { type: 'Point', coordinates }, properties)

export const aUnit = (properties: Partial<ItemOf<'unit'>['properties']>): ItemOf<'unit'> =>
  item('unit', null, { label: 'Dr', name: 'Rill Sandstone', colour: '#cf9d88', rank: 10, ...properties })

export const aSheetFace = (
  properties: Partial<ItemOf<'sheet-face'>['properties']> = {},
): ItemOf<'sheet-face'> => item('sheet-face', null, properties)
