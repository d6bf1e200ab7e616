import { parseNumber } from './numbers'
import { hasLines, hasPoints, valueText, type IntakeRecord } from './records'
import { MAX_LISTED_VALUES, type IntakeColumn } from './report'

/** Most columns that can be mapped; attributes in others are kept with their records. */
export const MAX_COLUMNS = 500

const MAX_SAMPLES = 5
/** Longest text shown as a sample or a value. */
const MAX_SHOWN = 200

interface Tally {
  count: number
  points: number
  lines: number
}

interface ColumnCount {
  filled: number
  samples: Set<string>
  /** Null once there are too many different values to list. */
  values: Map<string, Tally> | null
  numbers: { count: number; least: number; greatest: number } | null
}

/** The columns of a file in the order in which they first appear, with what is in them; at most MAX_COLUMNS. */
export function summarizeColumns(records: readonly IntakeRecord[]): IntakeColumn[] {
  const counts = new Map<string, ColumnCount>()
  const total: Tally = { count: 0, points: 0, lines: 0 }
  for (const record of records) {
    const weight = { count: 1, points: hasPoints(record) ? 1 : 0, lines: hasLines(record) ? 1 : 0 }
    add(total, weight)
    for (const [name, value] of Object.entries(record.attributes)) {
      const count = countOf(counts, name)
      if (count) countValue(count, valueText(value), weight)
    }
  }
  return [...counts].map(([name, count]) => toColumn(name, count, total))
}

function countOf(counts: Map<string, ColumnCount>, name: string): ColumnCount | undefined {
  const known = counts.get(name)
  if (known || counts.size >= MAX_COLUMNS) return known
  const fresh: ColumnCount = { filled: 0, samples: new Set(), values: new Map(), numbers: null }
  counts.set(name, fresh)
  return fresh
}

function countValue(column: ColumnCount, text: string, weight: Tally): void {
  if (text === '') return
  column.filled += 1
  if (column.samples.size < MAX_SAMPLES) column.samples.add(shown(text))
  countNumber(column, text)
  if (!column.values) return
  const tally = column.values.get(text)
  if (tally) add(tally, weight)
  else if (column.values.size < MAX_LISTED_VALUES && text.length <= MAX_SHOWN)
    column.values.set(text, { ...weight })
  else column.values = null
}

function countNumber(column: ColumnCount, text: string): void {
  const number = parseNumber(text)
  if (number === undefined) return
  column.numbers ??= { count: 0, least: number, greatest: number }
  column.numbers.count += 1
  column.numbers.least = Math.min(column.numbers.least, number)
  column.numbers.greatest = Math.max(column.numbers.greatest, number)
}

function toColumn(name: string, column: ColumnCount, total: Tally): IntakeColumn {
  const values = [...(column.values ?? [])].map(([value, tally]) => ({ value, ...tally }))
  const sum = (key: keyof Tally) => values.reduce((all, tally) => all + tally[key], 0)
  if (column.values && column.filled < total.count) {
    const none = (key: keyof Tally) => total[key] - sum(key)
    values.push({ value: '', count: none('count'), points: none('points'), lines: none('lines') })
  }
  values.sort((a, b) => b.count - a.count)
  return { name, samples: [...column.samples], values, filled: column.filled, numbers: column.numbers }
}

function add(tally: Tally, weight: Tally): void {
  tally.count += weight.count
  tally.points += weight.points
  tally.lines += weight.lines
}

const shown = (text: string): string => (text.length <= MAX_SHOWN ? text : `${text.slice(0, MAX_SHOWN - 1)}…`)
