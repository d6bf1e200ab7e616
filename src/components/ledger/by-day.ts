import type { Person } from '@shared/api/common'
import type { LedgerRow } from '@shared/api/ledger'
import { dayWords } from '@/composables/time-words'

/** Entries that one person wrote with nobody in between. */
export interface PersonsEntries {
  author: Person
  entries: LedgerRow[]
}

/** The entries of one day. */
export interface LedgerDay {
  day: string
  people: PersonsEntries[]
}

/** Entries under their days, and under whoever wrote them, in the order given: a person who comes again after another
 *  stands there again. Days are those of where the reader is. */
export function byDay(entries: readonly LedgerRow[]): LedgerDay[] {
  const days: LedgerDay[] = []
  for (const entry of entries) {
    const day = dayWords(entry.at)
    if (days.at(-1)?.day !== day) days.push({ day, people: [] })
    const people = days.at(-1)?.people
    const last = people?.at(-1)
    if (last?.author.id === entry.author.id) last.entries.push(entry)
    else people?.push({ author: entry.author, entries: [entry] })
  }
  return days
}
