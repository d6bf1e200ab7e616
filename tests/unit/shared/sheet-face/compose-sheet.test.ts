import { describe, expect, it } from 'vitest'
import type { Face } from '@shared/api/faces'
import { itemSchema, type Item } from '@shared/items/item'
import { composeSheet } from '@shared/sheet-face/compose-sheet'
import type { DisplayList, Mark, PatternMark } from '@shared/symbols/display-list'
import { aPrintedSheet, mapItems, rectangleRing, released, unitItems } from '../../../support/printed-sheet'

const sheet = aPrintedSheet()

/** A sheet of two units, one with a pattern, that meet in the middle. */
function composed(printing: 'colour' | 'one-ink'): Mark[] {
  const [first, second] = unitItems(2)
  if (first?.kind !== 'unit' || second?.kind !== 'unit') throw new Error('There are no units.')
  const patterned: Item = { ...first, properties: { ...first.properties, pattern: 'limestone' } }
  const sheetFace = itemSchema.parse({
    kind: 'sheet-face',
    id: '00000000-0000-4000-8000-000000999999',
    geometry: null,
    properties: { printing },
  })
  const faces: Face[] = [
    { unit: first.id, rings: [rectangleRing(284_000, 5_278_000, 289_000, 5_289_000)] },
    { unit: second.id, rings: [rectangleRing(289_000, 5_278_000, 292_000, 5_289_000)] },
    { unit: first.id, rings: [rectangleRing(292_000, 5_278_000, 294_000, 5_289_000)] },
  ]
  const outcome = composeSheet({
    sheet,
    items: [patterned, second, sheetFace, ...mapItems()],
    faces,
    edition: released,
  })
  if (outcome.outcome !== 'composed') throw new Error(outcome.reason)
  return outcome.parts.flatMap((part) => flat(part.draw()))
}

const flat = (list: DisplayList): Mark[] =>
  list.flatMap((mark) => (mark.mark === 'group' ? flat(mark.marks) : [mark]))
const inksOf = (marks: readonly Mark[]): string[] =>
  marks.flatMap((mark) => ('ink' in mark ? [mark.ink] : []))
const patternsOf = (marks: readonly Mark[]): PatternMark[] => marks.filter((mark) => mark.mark === 'pattern')

describe('a sheet with patterns', () => {
  it('hangs them on one place for all areas, and shows them in the legend', () => {
    const [first, second, ...legend] = patternsOf(composed('colour'))
    expect(first?.tile.id).toBe('limestone')
    expect(second?.anchor).toEqual(first?.anchor)
    expect(legend.map(({ tile }) => tile.id)).toEqual(['limestone'])
  })
})

describe('a sheet in one ink', () => {
  it('has no colour anywhere: map, frame, legend and statements are black, white and grey', () => {
    const inks = new Set(inksOf(composed('one-ink')))
    expect([...inks].filter((ink) => !/^#(..)\1\1$/.test(ink))).toEqual([])
    expect(inks).toContain('#000000')
  })

  it('draws the same marks otherwise, but for the grounds of units', () => {
    const count = (marks: readonly Mark[], kind: Mark['mark']) =>
      marks.filter(({ mark }) => mark === kind).length
    const [colour, oneInk] = [composed('colour'), composed('one-ink')]
    for (const kind of ['stroke', 'text', 'pattern'] as const)
      expect(count(oneInk, kind)).toBe(count(colour, kind))
    expect(count(oneInk, 'fill')).toBeLessThan(count(colour, 'fill'))
  })
})
