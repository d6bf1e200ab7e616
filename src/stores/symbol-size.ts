import { ref, watch, type Ref } from 'vue'

/** How symbols are shown when one zooms in beyond 100 %: they grow with the sheet (print size), or stay as they are at
 *  100 % (screen size). */
export type SymbolSize = 'print' | 'screen'

const keyOf = (person: string): string => `sheetwright-symbol-size ${person}`

/** The choice of the person at work, kept in this browser for each of them.
 *  @param person who is signed in; undefined where nobody is, and nothing is kept */
export function useSymbolSize(person: () => string | undefined): Ref<SymbolSize> {
  const size = ref<SymbolSize>('print')
  watch(person, (who) => (size.value = who === undefined ? 'print' : read(who)), { immediate: true })
  watch(size, (chosen) => {
    const who = person()
    if (who !== undefined) keep(who, chosen)
  })
  return size
}

function read(person: string): SymbolSize {
  try {
    return localStorage.getItem(keyOf(person)) === 'screen' ? 'screen' : 'print'
  } catch {
    return 'print'
  }
}

function keep(person: string, size: SymbolSize): void {
  try {
    localStorage.setItem(keyOf(person), size)
  } catch {
    // A browser that keeps nothing still shows the choice until the page is closed.
  }
}
