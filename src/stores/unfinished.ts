import { defineStore } from 'pinia'
import { ref } from 'vue'
import type { NorthReference } from '@shared/items/points'

/** What was typed but could not be taken yet, by item, so that looking at another item loses nothing; and how the last
 *  reading was referred to north, so that a notebook full of readings is told it once. Kept while the page is open. */
export const useUnfinishedStore = defineStore('unfinished', () => {
  const texts = ref<Record<string, string>>({})
  const northReference = ref<NorthReference>('true')
  /** As typed, degrees, east positive. */
  const declination = ref('')

  /** @param key item and field, for example `<id>/reading` */
  function keep(key: string, text: string): void {
    texts.value[key] = text
  }

  function take(key: string): string | undefined {
    const text = texts.value[key]
    delete texts.value[key]
    return text
  }

  return { texts, northReference, declination, keep, take }
})
