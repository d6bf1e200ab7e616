import { kindWords, type ItemKind } from '../items/item'

/** Ledger message of an intake: took in “north shore.kml”: 41 attitudes, 3 faults. */
export function takenInMessage(file: string, byKind: readonly { kind: ItemKind; items: number }[]): string {
  const counts = byKind.map(
    ({ kind, items }) => `${items} ${items === 1 ? kindWords[kind].one : kindWords[kind].many}`,
  )
  return `took in “${file}”: ${counts.join(', ')}`
}
