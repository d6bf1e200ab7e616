import { provide, ref, type InjectionKey, type Ref } from 'vue'

/** The legend row that Tab stops at: one of all rows, so that the legend is one stop on the way through the page. */
export const tabStopKey: InjectionKey<Readonly<Ref<string | null>>> = Symbol('tab stop of the legend')

const ROWS = '[data-legend-row]'

/** Arrow keys through the legend's rows: up and down from row to row, right to a row's menu, left back to the row.
 *  @returns handlers for the element around all rows */
export function useRowKeys() {
  const tabStop = ref<string | null>(null)
  provide(tabStopKey, tabStop)

  function onFocus(event: FocusEvent): void {
    const row = event.target instanceof HTMLElement ? event.target.closest<HTMLElement>(ROWS) : null
    if (row?.dataset['row']) tabStop.value = row.dataset['row']
  }

  function onKey(event: KeyboardEvent): void {
    const { target, currentTarget } = event
    if (!(target instanceof HTMLElement) || !(currentTarget instanceof HTMLElement) || event.altKey) return
    const next = nextStop(event.key, target, [...currentTarget.querySelectorAll<HTMLElement>(ROWS)])
    if (!next) return
    event.preventDefault()
    next.focus()
  }

  return { tabStop, onFocus, onKey }
}

function nextStop(key: string, from: HTMLElement, rows: HTMLElement[]): HTMLElement | undefined {
  const row = from.closest('li')?.querySelector<HTMLElement>(ROWS) ?? from
  const isOnRow = from.matches(ROWS)
  const isOnMenu = from.matches('.more')
  if (!isOnRow && !isOnMenu) return undefined
  const at = rows.indexOf(row)
  switch (key) {
    case 'ArrowDown':
      return rows[at + 1]
    case 'ArrowUp':
      return rows[at - 1]
    case 'Home':
      return rows[0]
    case 'End':
      return rows.at(-1)
    case 'ArrowRight':
      return isOnRow ? (row.closest('li')?.querySelector<HTMLElement>('.more') ?? undefined) : undefined
    case 'ArrowLeft':
      return isOnMenu ? row : undefined
  }
  return undefined
}
