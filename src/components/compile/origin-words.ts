import { isLineItem } from '@shared/items/item'
import type { ItemVersion } from '@/composables/useItemHistory'

/** How an item came onto the sheet, from its first version: `drawn by RK, 12 min ago`, `taken in by TO from ridge.kml, 2 d ago`.
 *  @param ago how long ago, in words */
export function originWords({ entry, item, provenance }: ItemVersion, ago: string): string {
  const who = entry.author.initials
  if (provenance) return `taken in by ${who} from ${provenance.file}, ${ago}`
  if (entry.kind === 'intake') return `taken in by ${who}, ${ago}`
  return `${isLineItem(item) ? 'drawn' : 'placed'} by ${who}, ${ago}`
}
