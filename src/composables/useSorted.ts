import { computed, ref } from 'vue'

/** Sorts rows by a column that a person chooses; again on the same column turns the order round. Numbers within texts
 *  count as numbers, so MI-9 stands before MI-14. */
export function useSorted<Row, Column extends string>(
  rows: () => readonly Row[],
  values: Record<Column, (row: Row) => string | number>,
  first: NoInfer<Column>,
) {
  const column = ref<Column>(first)
  const isDescending = ref(false)
  const order = new Intl.Collator('en', { numeric: true, sensitivity: 'base' })

  const sorted = computed(() => {
    // Vue unwraps refs of generic type into something that no longer names the column.
    const valueOf = values[column.value as Column]
    const turned = isDescending.value ? -1 : 1
    return [...rows()].sort((a, b) => turned * compare(valueOf(a), valueOf(b)))
  })

  const compare = (a: string | number, b: string | number): number =>
    typeof a === 'number' && typeof b === 'number' ? a - b : order.compare(String(a), String(b))

  function sortBy(next: Column): void {
    isDescending.value = next === column.value ? !isDescending.value : false
    column.value = next as typeof column.value
  }

  /** For aria-sort on the column's heading. */
  const sortOf = (of: Column): 'ascending' | 'descending' | undefined => {
    if (of !== column.value) return undefined
    return isDescending.value ? 'descending' : 'ascending'
  }

  return { sorted, sortBy, sortOf }
}
