import { computed } from 'vue'
import type { Item, ItemOf } from '@shared/items/item'
import { groupByAge } from '@shared/legend/group-by-age'
import { legendEntries, legendEntryOf } from '@shared/symbols/legend-entries'
import { marksInUse } from '@shared/symbols/line-marks'
import { useSheetStore } from '@/stores/sheet'

/** Items never change in place, so what they are shown as in the legend is worked out once for each. */
const entryIds = new WeakMap<Item, string>()

/** Id of the legend row that an item belongs to: its unit for a unit label, else its legend entry; undefined for what
 *  has no place on the map. */
export function legendRowOf(item: Item): string | undefined {
  if (item.kind === 'unit-label') return item.properties.unit
  const known = entryIds.get(item)
  if (known !== undefined) return known
  const id = legendEntryOf(item)?.id
  if (id !== undefined) entryIds.set(item, id)
  return id
}

/** The legend of the open sheet: units under their ages, entries and marks in use, and how many items each row stands for. */
export function useLegend() {
  const sheet = useSheetStore()

  const units = computed<ItemOf<'unit'>[]>(() => (void sheet.itemsVersion, sheet.ofKind('unit')))
  const groups = computed(() => groupByAge(units.value))
  const counts = computed<ReadonlyMap<string, number>>(() => {
    void sheet.itemsVersion
    const found = new Map<string, number>()
    for (const item of sheet.all()) {
      const row = legendRowOf(item)
      if (row !== undefined) found.set(row, (found.get(row) ?? 0) + 1)
    }
    return found
  })
  const used = computed(() => legendEntries.filter((entry) => counts.value.has(entry.id)))

  const marks = computed(() => (void sheet.itemsVersion, marksInUse(sheet.all())))

  const countOf = (row: string): number => counts.value.get(row) ?? 0
  /** Ids of the items that a row stands for. */
  const idsOf = (row: string): string[] =>
    sheet.all().flatMap((item) => (legendRowOf(item) === row ? [item.id] : []))

  return { units, groups, used, marks, countOf, idsOf }
}
