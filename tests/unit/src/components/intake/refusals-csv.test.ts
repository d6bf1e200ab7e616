import { expect, it } from 'vitest'
import { refusalsCsv } from '@/components/intake/refusals-csv'

const rowOf = (value: string, reason = 'No.') =>
  refusalsCsv([{ record: 7, field: 'dip', value, reason }]).split('\r\n')[1]

it('begins with a byte order mark and a line of names, and ends each line as RFC 4180 has it', () => {
  expect(refusalsCsv([])).toBe('\ufeffrecord,field,value,reason\r\n')
  expect(rowOf('95')).toBe('7,dip,95,No.')
})

it('quotes what holds commas, quotes or line ends', () => {
  expect(rowOf('12, 45')).toBe('7,dip,"12, 45",No.')
  expect(rowOf('5" bed')).toBe('7,dip,"5"" bed",No.')
  expect(refusalsCsv([{ record: 1, field: 'a', value: 'x\ny', reason: '' }])).toContain('"x\ny"')
})

// Common practice: a cell that begins with one of these is run as a formula by spreadsheets.
it.each(['=1+1', '+cmd', '@sum', '-x', '\t=1'])('keeps %j from being run as a formula', (value) => {
  expect(rowOf(value)?.split(',')[2]).toMatch(/^"?'/)
})

it('leaves negative numbers numbers', () => {
  expect(rowOf('-3')).toBe('7,dip,-3,No.')
})
