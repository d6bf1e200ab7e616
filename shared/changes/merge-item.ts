import type { Item } from '../items/item'
import { isSame } from './same-value'

/** What of an item two people change without being in each other's way. Properties are one part: strike and dip, plunge
 *  and trend, type and side say one thing together. */
export const itemParts = ['geometry', 'properties'] as const
export type ItemPart = (typeof itemParts)[number]

export type Merge =
  | { outcome: 'merged'; item: Item }
  /** Both changed these parts, to different ends. */
  | { outcome: 'conflict'; parts: ItemPart[] }

/** Lays what two people made of one item over each other: each part as whoever changed it has it.
 *  @param base the item as both found it   @param theirs as it is now   @param yours as it is to be */
export function mergeItem(base: Item, theirs: Item, yours: Item): Merge {
  const parts = itemParts.filter(
    (part) =>
      !isSame(theirs[part], yours[part]) &&
      !isSame(base[part], theirs[part]) &&
      !isSame(base[part], yours[part]),
  )
  if (parts.length > 0) return { outcome: 'conflict', parts }
  const partOf = (part: ItemPart) => (isSame(base[part], yours[part]) ? theirs : yours)[part]
  // Versions of one item are of one kind, so that geometry and properties fit each other.
  return {
    outcome: 'merged',
    item: { ...yours, geometry: partOf('geometry'), properties: partOf('properties') } as Item,
  }
}
