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
    ).toBe('placed 2 attitudes, changed 1 contact, removed 1 fault')
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
    // Its side is renamed so that it names the same ground: nothing that a person did.
    const fault = (side: string, coordinates: number[][]) =>
      line('fault', coordinates, { type: 'normal', side }, id)
    const turned = (side: string) =>
      describeChanges([{ before: fault('left', path), after: fault(side, path.toReversed()) }])
    expect(turned('right')).toBe('reversed fault')
    expect(turned('left')).toBe('reversed fault; side of fault: right → left')
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

  it('tells many together, and the values of the few that changed a field', () => {
    const shift = (item: Item): Item =>
      line(item.kind, [[1, 1], [11, 1], ...path.slice(2)], item.properties, item.id)
    const contacts = [line('contact', path), line('contact', path), line('contact', path)]
    const dip = (from: number, to: number, station: string) => {
      const before = attitude({ dip: from, station })
      return { before, after: attitude({ dip: to, station }, [5, 5], before.id) }
    }
    const moved = contacts.map((before) => ({ before, after: shift(before) }))
    expect(describeChanges([...moved, dip(35, 53, '14')])).toBe(
      'moved 3 contacts, dip of attitude 14: 35 → 53',
    )
    expect(describeChanges([dip(35, 53, '14'), dip(40, 42, '15'), dip(41, 42, '16')])).toBe(
      'changed dip of 3 attitudes',
    )
    const [first] = contacts
    if (!first) throw new Error('There is no contact.')
    const both = line('contact', [[1, 1], ...path.slice(1)], { locationConfidence: 'inferred' }, first.id)
    expect(describeChanges([{ before: first, after: both }, dip(1, 2, '9'), gone(line('fault', path))])).toBe(
      'moved and changed 1 contact, dip of attitude 9: 1 → 2, removed 1 fault',
    )
  })

  it('does not take a property that an older version lacks for changed', () => {
    const after = attitude({})
    const older = Object.fromEntries(Object.entries(after.properties).filter(([key]) => key !== 'undulating'))
    const before = { ...after, properties: older } as Item // As it was stored before the property existed.
    expect(describeChanges([{ before, after }])).toBe('changed 1 attitude')
  })
})
