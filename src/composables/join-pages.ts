import type { LedgerRow } from '@shared/api/ledger'

/** Entries of a ledger, newest first, and where to go on; null where nothing is older. */
export interface LedgerPage {
  entries: readonly LedgerRow[]
  next: number | null
}

/** A page that was read anew laid over the entries that are known: a later page goes on below them; the newest page comes
 *  on top, and what is known below it stays, where the two meet. */
export function joinPages(known: LedgerPage, page: LedgerPage): LedgerPage {
  const newest = page.entries[0]?.revision
  const oldest = page.entries.at(-1)?.revision
  if (newest === undefined || oldest === undefined) return { entries: known.entries, next: page.next }
  const above = known.entries.filter((entry) => entry.revision > newest)
  const below = known.entries.filter((entry) => entry.revision < oldest)
  // Without an entry in common there may be others between the page and those below.
  const meets = known.entries.length === 0 || (known.entries[0]?.revision ?? 0) >= oldest
  return below.length > 0 && meets
    ? { entries: [...above, ...page.entries, ...below], next: known.next }
    : { entries: [...above, ...page.entries], next: page.next }
}
