import Papa from 'papaparse'
import { columnNames, placeColumns } from './csv-columns'
import { csvPosition } from './csv-position'
import type { IntakeRecord, RecordPart } from '@shared/intake/records'
import { cleanAttributes } from './clean-attributes'
import { unreadable, type ReadOutcome } from './read-outcome'
import { lineAndColumn } from './text-position'

/** Reads a table with a header: each row below it is a record with a point at its longitude and latitude. Separators are
 *  told from the text; lines that begin with `#` are passed over. Source: RFC 4180 by way of papaparse. */
export function readCsv(text: string): ReadOutcome {
  const { data, errors } = Papa.parse<string[]>(text, { comments: '#', skipEmptyLines: 'greedy' })
  const broken = errors.find(({ type }) => type === 'Quotes')
  if (broken) {
    const { line } = lineAndColumn(text, broken.index ?? 0)
    return unreadable(`The table is not whole: a quoted text near line ${line} does not end.`)
  }
  const [header, ...rows] = data
  if (!header || rows.length === 0) return unreadable('The table has no rows under its header.')
  const names = columnNames(header)
  const places = placeColumns(names)
  if (places.outcome === 'unreadable') return places
  const records = rows.map((cells, index): IntakeRecord => {
    const part = partOf(cells, names.length, () =>
      csvPosition(cells[places.lon]?.trim() ?? '', cells[places.lat]?.trim() ?? ''),
    )
    const attributes = Object.fromEntries(names.map((name, at) => [name, cells[at]?.trim() ?? '']))
    return { number: index + 1, parts: [part], attributes: cleanAttributes(attributes) }
  })
  const notes = [
    'Records are numbered from the first row under the header.',
    ...(/^#/m.test(text) ? ['Lines that begin with # were passed over.'] : []),
  ]
  return { outcome: 'read', reader: 'csv', records, notes }
}

/** A row with more cells than the header has columns is not read: which cell is which cannot be told. */
function partOf(cells: readonly string[], columns: number, position: () => RecordPart): RecordPart {
  const beyond = cells.slice(columns).some((cell) => cell.trim() !== '')
  if (!beyond) return position()
  const reason = `The row has ${cells.length} cells, but the header names ${columns} columns.`
  return { form: 'unreadable', reason }
}
