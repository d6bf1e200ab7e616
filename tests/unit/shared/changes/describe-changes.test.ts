import { describe, expect, it } from 'vitest'
import { describeChanges } from '@shared/changes/describe-changes'
import { itemSchema, type Item } from '@shared/items/item'

let count = 0
const nextId = () => `5d0a1f6e-3f0b-4c43-9a51-${String((count += 1)).padStart(12, '0')}`
const line = (kind: string, coordinates: number[][], properties = {}, id = nextId()): Item =>
  itemSchema.parse({ kind, id, geometry: { type: 'LineString', coordinates }, properties })
const attitude = (properties: object, coordinates = [5, 5], id = nextId()): Item =>
  itemSchema.parse({
    kind: 'attitude',
    id,
    geometry: { type: 'Point', coordinates },
    properties: { strike: 45, dip: 35, ...properties },
  })
const path = [
  [0, 0],
  [10, 0],
  [20, 5],
]
const drawn = (after: Item) => ({ before: null, after })
const gone = (before: Item) => ({ before, after: null })

describe('describeChanges', () => {
  it('says what was drawn, placed or removed', () => {
    expect(describeChanges([drawn(line('contact', path))])).toBe('drew 1 contact')
    expect(describeChanges([drawn(attitude({ station: 'GH-031' }))])).toBe('placed 1 attitude GH-031')
    expect(describeChanges([gone(line('fault', path, { name: 'Cormorant fault' }))])).toBe(
      'removed 1 fault Cormorant fault',
    )
    expect(describeChanges([drawn(line('contact', path)), drawn(line('contact', path))])).toBe(
      'drew 2 contacts',
    )
  })

  it('counts changes of several kinds', () => {
    const contact = line('contact', path)
    expect(
      describeChanges([
        drawn(attitude({})),
        drawn(attitude({})),
        { before: contact, after: { ...contact, properties: { ...contact.properties } } as Item },
        gone(line('fault', path)),
      ]),
    ).toBe('2 attitudes added, 1 contact changed, 1 fault removed')
  })

  it('names a field that changed, before and after', () => {
    const id = nextId()
    const before = attitude({ dip: 35 }, [5, 5], id)
    expect(describeChanges([{ before, after: attitude({ dip: 53 }, [5, 5], id) }])).toBe(
      'dip of attitude: 35 → 53',
    )
    const from = line('contact', path, { locationConfidence: 'certain' }, id)
    const to = line('contact', path, { locationConfidence: 'inferred' }, id)
    expect(describeChanges([{ before: from, after: to }])).toBe(
      'location confidence of contact: certain → inferred',
    )
  })

  it('does not repeat a reading beside the figures that it gave', () => {
    const id = nextId()
    const reading = (text: string) => ({
      text,
      convention: 'strike-dip',
      northReference: 'true',
      declination: null,
    })
    const before = attitude({ dip: 35, reading: reading('045/35') }, [5, 5], id)
    const after = attitude({ dip: 53, reading: reading('045/53') }, [5, 5], id)
    expect(describeChanges([{ before, after }])).toBe('dip of attitude: 35 → 53')
  })

  it('tells moving vertices, reshaping and reversing apart', () => {
    const id = nextId()
    const before = line('contact', path, {}, id)
    const to = (coordinates: number[][]) =>
      describeChanges([{ before, after: line('contact', coordinates, {}, id) }])
    expect(to([path[0] ?? [], [10, 3], path[2] ?? []])).toBe('moved 1 vertex of contact')
    expect(to([[1, 1], [10, 3], path[2] ?? []])).toBe('moved 2 vertices of contact')
    expect(to([...path, [30, 5]])).toBe('reshaped contact')
    expect(to(path.toReversed())).toBe('reversed contact')
  })

  it('says when a point has moved', () => {
    const id = nextId()
    expect(describeChanges([{ before: attitude({}, [5, 5], id), after: attitude({}, [6, 5], id) }])).toBe(
      'moved attitude',
    )
  })

  it('stays short however much changed', () => {
    const id = nextId()
    const before = attitude({ note: 'a' }, [5, 5], id)
    const after = attitude(
      { note: 'b', strike: 1, dip: 2, station: 'x'.repeat(100), type: 'joint' },
      [5, 5],
      id,
    )
    const words = describeChanges([{ before, after }])
    expect(words.length).toBeLessThanOrEqual(300)
    expect(words).toContain('2 more fields')
  })
})
