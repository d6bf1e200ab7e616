import type { LedgerEntry } from '@shared/api/sheets'
import { dayWords } from '@/composables/time-words'

/** The entries of one day. */
export interface LedgerDay {
  day: string
  entries: LedgerEntry[]
}

/** Entries under their days, in the order given; days are those of where the reader is. */
export function byDay(entries: readonly LedgerEntry[]): LedgerDay[] {
  const days: LedgerDay[] = []
  for (const entry of entries) {
    const day = dayWords(entry.at)
    const last = days.at(-1)
    if (last?.day === day) last.entries.push(entry)
    else days.push({ day, entries: [entry] })
  }
  return days
}
