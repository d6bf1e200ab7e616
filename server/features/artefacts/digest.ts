import { createHash } from 'node:crypto'
import type { Sheet } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'
import { canonicalJson } from '../../platform/canonical-json'

/** SHA-256 of what a release of a revision would print and publish: the sheet's identity and every item, by id. */
export function revisionDigest(
  sheet: Pick<Sheet, 'number' | 'title' | 'scale' | 'crs' | 'neatline' | 'page'>,
  revision: number,
  items: readonly Item[],
): string {
  const { number, title, scale, crs, neatline, page } = sheet
  const hash = createHash('sha256')
  hash.update(canonicalJson({ number, title, scale, srid: crs.srid, neatline, page, revision }))
  for (const item of items.toSorted((a, b) => (a.id < b.id ? -1 : 1))) hash.update(`\n${canonicalJson(item)}`)
  return hash.digest('hex')
}
