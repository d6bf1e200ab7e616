import { beforeEach, expect, it } from 'vitest'
import { keepSketch, readKeptSketch, type KeptSketch } from '@/stores/kept-sketch'

const rosa = { account: 'rosa', sheet: 'MI-14' }
const sketch: KeptSketch = {
  entry: 'contact.certain',
  line: [
    [284_000, 5_278_000],
    [284_100, 5_278_050],
  ],
}

beforeEach(() => sessionStorage.clear())

it('keeps an unfinished line until it is done with', () => {
  keepSketch(rosa, sketch)
  expect(readKeptSketch(rosa)).toEqual(sketch)
  keepSketch(rosa, null)
  expect(readKeptSketch(rosa)).toBeNull()
})

it('is nobody else’s, and of no other sheet', () => {
  keepSketch(rosa, sketch)
  expect(readKeptSketch({ ...rosa, account: 'tove' })).toBeNull()
  expect(readKeptSketch({ ...rosa, sheet: 'MI-13' })).toBeNull()
})

it('takes nothing for a line that is none', () => {
  for (const text of ['not JSON', '{"entry":"contact.certain","line":[]}', '{"line":[[1,"x"]]}']) {
    sessionStorage.setItem('sheetwright-sketch rosa MI-14', text)
    expect(readKeptSketch(rosa)).toBeNull()
  }
})
