import type { Item, ItemKind } from '@shared/items/item'

/** An item as SQL gives it: geometry as GeoJSON text. */
export interface ItemRow {
  id: string
  kind: ItemKind
  geometry: string | null
  properties: unknown
}

/** Columns that make an ItemRow from `item_version AS version`: three decimals are the 1 mm grid, and option 0 leaves out
 *  the `crs` member that PostGIS adds for systems other than WGS 84. */
export const itemColumns = `version.item_id AS id, version.kind, ST_AsGeoJSON(version.geometry, 3, 0) AS geometry,
  version.properties`

/** Every row was checked by the item schema before it was stored, so it is an item. */
export const toItem = ({ id, kind, geometry, properties }: ItemRow): Item =>
  ({ kind, id, geometry: geometry === null ? null : JSON.parse(geometry), properties }) as Item
