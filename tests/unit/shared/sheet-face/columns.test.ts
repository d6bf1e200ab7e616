import { expect, it } from 'vitest'
import { heightOf, space, type Block } from '@shared/sheet-face/block'
import { fillRunningOn, fillWhole } from '@shared/sheet-face/columns'

const row = (height: number): Block => ({ height, draw: () => [] })
const heading = (height: number): Block => ({ height, draw: () => [], staysWithNext: true })

it('shares whole sections out so that the highest column is low', () => {
  const sections = [[row(50)], [row(20)], [row(30)]]
  expect(fillWhole(sections, 2, 100)?.map(heightOf)).toEqual([50, 50])
})

it('breaks a section that is too high between its rows, never after a heading', () => {
  const section = [heading(5), row(20), heading(5), row(20), heading(5), row(20)]
  const columns = fillRunningOn([section], 2, 55)
  expect(columns?.map(heightOf)).toEqual([50, 25])
  for (const column of columns ?? []) expect(column.at(-1)?.staysWithNext).toBeUndefined()
})

it('does not begin a column with white space', () => {
  const columns = fillRunningOn([[row(50), space(10), row(50)]], 2, 55)
  expect(columns?.map(heightOf)).toEqual([50, 50])
})

it('says that it does not fit rather than leave something out', () => {
  expect(fillRunningOn([[row(60)]], 3, 50)).toBeUndefined()
  expect(fillRunningOn([[row(40), row(40), row(40)]], 2, 50)).toBeUndefined()
  expect(fillWhole([[row(30), row(30)]], 2, 50)).toBeUndefined()
})
