import { defineStore } from 'pinia'
import { shallowRef } from 'vue'
import type { Item } from '@shared/items/item'

/** A version of an item laid over the map: `before` in slate, `after` in oxide. */
export interface InkedItem {
  item: Item
  ink: 'before' | 'after'
}

/** What lies over the map in two inks, to be compared: both sides of a conflict. Whole states have a map of their own. */
export const useComparedStore = defineStore('compared', () => {
  const inked = shallowRef<readonly InkedItem[]>([])

  const show = (items: readonly InkedItem[]): void => {
    if (items.length > 0 || inked.value.length > 0) inked.value = items
  }

  return { inked, show }
})
