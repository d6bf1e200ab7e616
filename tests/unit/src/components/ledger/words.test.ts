import { describe, expect, it } from 'vitest'
import type { DifferenceCount } from '@shared/api/comparisons'
import { toDifference } from '@shared/changes/differences'
import type { XY } from '@shared/units'
import { differenceWords, fieldRows, groupByKind, howWords } from '@/components/ledger/compared-rows'
import { restoreWords } from '@/components/ledger/restore-words'
import { stateOptions, stateWords } from '@/components/ledger/state-words'
import { aLine, aPoint, aUnit } from '../../../../support/sheet-items'
import { rosa } from '../../../../support/ledger-rows'

const count = (kind: DifferenceCount['kind'], figures: Partial<DifferenceCount>): DifferenceCount => ({
  kind,
  added: 0,
  removed: 0,
  moved: 0,
  reattributed: 0,
  ...figures,
})

describe('what going back would do', () => {
  it('is one sentence, act by act', () => {
    const counts = [count('contact', { added: 1, moved: 2 }), count('attitude', { removed: 14, added: 3 })]
    expect(restoreWords(counts)).toBe(
      'This would bring back 1 contact and 3 attitudes, remove 14 attitudes and move 2 contacts back.',
    )
  })

  it('says so where it is nothing', () => {
    expect(restoreWords([])).toBe('This would change nothing.')
  })
})

describe('states of a sheet', () => {
  it('have words', () => {
    expect(['latest', '0', '12', 'edition-2'].map(stateWords)).toEqual([
      'the latest revision',
      'the empty sheet',
      'revision 12',
      'edition 2',
    ])
  })

  it('are offered by edition and name, and the chosen one whatever it is', () => {
    const name = { revision: 7, name: 'before the east half', note: '', by: rosa, at: '2026-03-04T15:00:00Z' }
    const known = { latest: 20, edition: 2, names: [name] }
    expect(stateOptions(known, '12').map(({ words }) => words)).toEqual([
      'Revision 12',
      'Latest, revision 20',
      'Edition 2',
      'Edition 1',
      '7, before the east half',
      'The empty sheet',
    ])
    expect(stateOptions(known, '7')).toHaveLength(5)
  })
})

describe('rows of a comparison', () => {
  const unit = aUnit({ label: 'Sv' })
  const labelOf = (id: string) => (id === unit.id ? 'Sv' : undefined)
  const contact = aLine(
    'contact',
    [
      [284_100, 5_278_200],
      [284_900, 5_278_600],
    ],
    {},
  )
  const moved = toDifference({
    before: contact,
    after: {
      ...contact,
      geometry: {
        ...contact.geometry,
        coordinates: contact.geometry.coordinates.map(([east, north]): XY => [east + 30, north]),
      },
    },
  })
  const attitude = aPoint('attitude', [284_500, 5_278_400], {
    type: 'bedding',
    strike: 40,
    dip: 35,
    station: '14',
  })
  const reread = toDifference({
    before: attitude,
    after: { ...attitude, properties: { ...attitude.properties, dip: 53 } },
  })

  it('say how far an item was moved, and which fields say something else', () => {
    expect(howWords(moved)).toBe('moved 30 m')
    expect(howWords(reread)).toBe('re-attributed')
    expect(fieldRows(reread, labelOf)).toEqual([{ field: 'dip', before: '35', after: '53' }])
    expect(howWords(toDifference({ before: null, after: contact }))).toBe('added')
  })

  it('name units by their labels and readings as they were written', () => {
    const label = aPoint('unit-label', [284_500, 5_278_400], { unit: unit.id })
    const other = { ...label, properties: { ...label.properties, unit: contact.id } }
    expect(fieldRows(toDifference({ before: label, after: other }), labelOf)).toEqual([
      { field: 'unit', before: 'Sv', after: 'a unit that is gone' },
    ])
    const reading = {
      text: '040/35',
      convention: 'strike-dip',
      northReference: 'true',
      declination: null,
    } as const
    const read = { ...attitude, properties: { ...attitude.properties, reading } }
    expect(fieldRows(toDifference({ before: attitude, after: read }), labelOf)).toEqual([
      { field: 'reading', before: 'none', after: '“040/35”' },
    ])
  })

  it('are told in one line each', () => {
    expect(differenceWords(moved, labelOf)).toBe('contact: moved 30 m')
    expect(differenceWords(reread, labelOf)).toBe('attitude 14: dip 35 → 53')
    expect(differenceWords(toDifference({ before: attitude, after: null }), labelOf)).toBe(
      'attitude 14: removed',
    )
  })

  it('stand under their kinds with the counts of the whole', () => {
    const counts = [count('attitude', { reattributed: 1 }), count('contact', { moved: 1, removed: 4000 })]
    expect(
      groupByKind([reread, moved], counts).map(({ words, differences }) => [words, differences]),
    ).toEqual([
      ['contacts: 4000 removed, 1 moved', [moved]],
      ['attitude: 1 re-attributed', [reread]],
    ])
  })
})
