import { useWorkplaceStore } from '@/stores/workplace'
import type { RowAct } from './legend-acts'

/** What a person can do with any legend row: hide, isolate, select, go to.
 *  @param idsOf items of a row   @param allRows every row of the legend */
export function useRowActs(idsOf: (row: string) => string[], allRows: () => readonly string[]) {
  const workplace = useWorkplaceStore()

  function isolate(row: string): void {
    const others = allRows().filter((other) => other !== row)
    const isIsolated =
      !workplace.hiddenEntries.has(row) && others.every((other) => workplace.hiddenEntries.has(other))
    workplace.hiddenEntries = new Set(isIsolated ? [] : others)
  }

  return (row: string, count: number): RowAct[] => {
    const hidden = workplace.hiddenEntries.has(row)
    const acts: RowAct[] = [
      {
        id: 'hide',
        title: hidden ? 'Show on the map' : 'Hide on the map',
        key: 'H',
        run: () => workplace.toggleHidden(row),
      },
      { id: 'isolate', title: 'Show it alone, or all again', key: 'I', run: () => isolate(row) },
    ]
    if (count === 0) return acts
    return [
      ...acts,
      { id: 'select', title: `Select all ${count}`, key: 'A', run: () => workplace.select(idsOf(row)) },
      { id: 'zoom', title: 'Go to them', key: 'Z', run: () => workplace.zoomTo(idsOf(row)) },
    ]
  }
}
