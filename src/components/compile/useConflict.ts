import { computed, ref, watch } from 'vue'
import { useComparedStore } from '@/stores/compared'
import { useSheetStore } from '@/stores/sheet'
import { combine, conflictsOf, rowKey, rowsOf, type Conflict, type ConflictRow, type Side } from './conflicts'
import { itemTitle } from './item-words'
import { useWords } from './useWords'

/** The items that two people changed, the choice made for each of their rows, and how it is settled. While there is a
 *  conflict both sides lie over each other on the map, in two inks. */
export function useConflict() {
  const sheet = useSheetStore()
  const compared = useComparedStore()
  const { context } = useWords()

  const problem = computed(() => sheet.saved.problem)
  const conflicts = computed(() => {
    // Follows what either side does to its items meanwhile.
    void sheet.itemsVersion
    return conflictsOf(problem.value, { theirs: sheet.confirmed, mine: sheet.get })
  })
  const items = computed(() =>
    conflicts.value.map((conflict) => ({ ...conflict, title: titleOf(conflict), rows: rowsOf(conflict) })),
  )
  const chosen = ref<Record<string, Side>>({})
  /** Why the combination cannot be, where the two sides do not go together. */
  const refusals = ref<string[]>([])

  function titleOf({ theirs, mine, base }: Conflict): string {
    const item = mine ?? theirs ?? base
    return item ? itemTitle(item, context) : ''
  }

  const keyOf = (id: string, row: ConflictRow): string => `${id} ${rowKey(row)}`
  /** What only one side changed is taken from it unless somebody chooses otherwise; where both did, mine stands first. */
  const sideOf = (id: string, row: ConflictRow): Side =>
    chosen.value[keyOf(id, row)] ?? row.changedBy ?? 'mine'
  const choose = (id: string, row: ConflictRow, side: Side): void => {
    chosen.value = { ...chosen.value, [keyOf(id, row)]: side }
  }
  function chooseAll(side: Side): void {
    chosen.value = Object.fromEntries(
      items.value.flatMap(({ id, rows }) => rows.map((row) => [keyOf(id, row), side])),
    )
  }

  async function settle(): Promise<void> {
    const decided = new Map(
      conflicts.value.map((conflict) => [conflict.id, combine(conflict, (row) => sideOf(conflict.id, row))]),
    )
    const outcome = await sheet.settleConflict(decided)
    refusals.value = outcome.outcome === 'refused' ? outcome.errors.map((error) => error.detail) : []
    if (outcome.outcome === 'done') chosen.value = {}
  }

  watch(
    conflicts,
    (now) =>
      compared.show(
        now.flatMap(({ theirs, mine }) => [
          ...(theirs ? [{ item: theirs, ink: 'before' as const }] : []),
          ...(mine ? [{ item: mine, ink: 'after' as const }] : []),
        ]),
      ),
    { immediate: true },
  )

  return { problem, items, sideOf, choose, chooseAll, settle, refusals }
}
