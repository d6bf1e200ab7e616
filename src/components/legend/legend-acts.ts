/** One thing that can be done with a legend row. */
export interface RowAct {
  id: string
  title: string
  /** Key that does the same while the row has the focus, as it is printed: `H`, `F2`, `Alt ↑`. */
  key?: string
  run(): void
}

const names: Record<string, string> = { ArrowUp: '↑', ArrowDown: '↓' }

/** A key press as row acts name theirs. */
export function pressedKey(event: KeyboardEvent): string {
  const key = names[event.key] ?? (event.key.length === 1 ? event.key.toUpperCase() : event.key)
  return event.altKey ? `Alt ${key}` : key
}
