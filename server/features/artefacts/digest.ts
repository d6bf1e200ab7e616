import { createHash } from 'node:crypto'
import type { Sheet } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'

/** JSON with the keys of every object in order, so that equal content is equal text. Keys without a value are left out. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`
  if (value === null || typeof value !== 'object') return JSON.stringify(value) ?? 'null'
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .toSorted(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`)
  return `{${members.join(',')}}`
}

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
