import type { DifferenceCount } from '@shared/api/comparisons'
import type { Restore } from '@shared/api/restores'
import { kindWords } from '@shared/items/item'

const verbs = [
  ['added', (items: string) => `bring back ${items}`],
  ['removed', (items: string) => `remove ${items}`],
  ['moved', (items: string) => `move ${items} back`],
  ['reattributed', (items: string) => `change back what is said of ${items}`],
] as const

/** What going back would do, as a sentence: "This would remove 14 attitudes and bring back 1 contact." */
export function restoreWords(counts: readonly DifferenceCount[]): string {
  const parts = verbs.flatMap(([what, words]) => {
    const items = counts
      .filter((count) => count[what] > 0)
      .map((count) => `${count[what]} ${kindWords[count.kind][count[what] === 1 ? 'one' : 'many']}`)
    return items.length > 0 ? [words(listed(items))] : []
  })
  return parts.length > 0 ? `This would ${listed(parts)}.` : 'This would change nothing.'
}

function listed(parts: readonly string[]): string {
  const last = parts.at(-1) ?? ''
  return parts.length > 1 ? `${parts.slice(0, -1).join(', ')} and ${last}` : last
}

/** What is asked, and the words of the act. */
export function askWords(restore: Restore): { ask: string; act: string } {
  switch (restore.what) {
    case 'entry':
      return { ask: `Take entry ${restore.revision} back?`, act: 'Take it back' }
    case 'item':
      return { ask: `Bring back the version of revision ${restore.revision}?`, act: 'Bring it back' }
    case 'revision':
      return { ask: `Go back to revision ${restore.revision}?`, act: `Go back to ${restore.revision}` }
  }
}
