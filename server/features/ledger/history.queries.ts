import type { EntityManager } from 'typeorm'
import type { Provenance } from '@shared/api/ledger'
import type { Item } from '@shared/items/item'
import { itemColumns, toItem, type ItemRow } from './item-row'

export interface StoredVersion {
  item: Item
  since: number
  until: number | null
  provenance: Provenance | null
}

/** Every version of one item on a sheet, newest first; empty if the item never was on it. */
export async function selectVersions(
  em: EntityManager,
  sheetId: string,
  itemId: string,
): Promise<StoredVersion[]> {
  const rows = await em.query<(ItemRow & Omit<StoredVersion, 'item'>)[]>(
    `SELECT ${itemColumns}, version.since, version.until, version.provenance FROM item_version AS version
     WHERE sheet_id = $1 AND item_id = $2 ORDER BY since DESC`,
    [sheetId, itemId],
  )
  return rows.map((row) => {
    const { since, until, provenance } = row
    return { item: toItem(row), since, until, provenance }
  })
}
