import { describe, expect, it } from 'vitest'
import { itemsWord } from '@/editor/commands/item-words'
import { aLine, aPoint, aUnit } from '../../../../support/sheet-items'

const axis = aLine(
  'axial-trace',
  [
    [0, 0],
    [0, 5],
  ],
  { form: 'anticline', name: 'Gannet' },
)
const label = aPoint('unit-label', [0, 0], { unit: axis.id })
const station = aPoint('station', [0, 0], {})

describe('items in a sentence', () => {
  it.each([
    [[axis], 'an anticline “Gannet”'],
    [[label], 'a unit label'],
    [[aUnit({})], 'unit Dr'],
    [[station, station], '2 stations'],
    [[station, axis], '2 items'],
  ])('are called by kind, form and name', (items, words) => {
    expect(itemsWord(items)).toBe(words)
  })
})
