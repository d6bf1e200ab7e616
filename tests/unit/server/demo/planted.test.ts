import { describe, expect, it, vi } from 'vitest'
import { itemSchema, type Item, type ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { gannetHead, makeSheet } from '../../../../server/demo/merrow-island'
import { plantedRules, plantErrors, type PlantedRule } from '../../../../server/demo/planted/plant'
import { itemsOf } from '../../../../server/demo/truth/generate-sheet'

// Areas of the whole sheet are found for some rules.
vi.setConfig({ testTimeout: 60_000 })

const items: Item[] = itemsOf(makeSheet(gannetHead))
const before = new Map(items.map((item) => [item.id, item]))

/** Ids of items that were changed, added or taken away. */
function changedBy(after: readonly Item[]): string[] {
  const now = new Map(after.map((item) => [item.id, item]))
  const changed = after.filter((item) => JSON.stringify(before.get(item.id)) !== JSON.stringify(item))
  return [...changed.map(({ id }) => id), ...items.filter(({ id }) => !now.has(id)).map(({ id }) => id)]
}

const planted = (rule: PlantedRule) => {
  const { items: after, planted: told } = plantErrors(items, [rule])
  const [first] = told
  if (!first) throw new RangeError('Nothing was planted.')
  const named = after.filter(({ id }) => first.items.includes(id))
  return { after, told: first, named }
}
const lineOf = (item: Item | undefined): XY[] =>
  item?.geometry?.type === 'LineString' ? item.geometry.coordinates : []
/** Distance of a place from the nearest piece of any line but one. */
function fromLines(all: readonly Item[], own: string, [x, y]: XY): number {
  const bounding = all.filter(
    (item): item is ItemOf<'contact'> =>
      (item.kind === 'contact' || item.kind === 'fault') &&
      item.id !== own &&
      item.properties.locationConfidence !== 'concealed',
  )
  return Math.min(
    ...bounding.flatMap(({ geometry: { coordinates } }) =>
      coordinates.slice(1).map(([x2, y2], index) => {
        const [x1, y1] = coordinates[index] ?? [x2, y2]
        const [dx, dy] = [x2 - x1, y2 - y1]
        const share = Math.max(0, Math.min(1, ((x - x1) * dx + (y - y1) * dy) / (dx * dx + dy * dy || 1)))
        return Math.hypot(x - x1 - dx * share, y - y1 - dy * share)
      }),
    ),
  )
}

describe('planted errors', () => {
  it.each(plantedRules)('%s: a valid sheet, with a change to few items that are told', (rule) => {
    const { after, told, named } = planted(rule)
    for (const item of named) expect(itemSchema.safeParse(item).error).toBeUndefined()
    expect(named).toHaveLength(told.items.length)
    const changed = changedBy(after)
    expect(changed.length).toBeGreaterThan(0)
    expect(
      told.items.length === 0 ||
        told.items.some((id) => changed.includes(id)) ||
        rule === 'limb-without-attitude',
    ).toBe(true)
    expect(told.what).not.toBe('')
    if (rule !== 'limb-without-attitude') expect(changed.length).toBeLessThanOrEqual(2)
    // The same again: tests of findings must be able to count on it.
    expect(plantErrors(items, [rule]).planted).toEqual([told])
  })

  it('are planted all together, none upon another', () => {
    const { items: after, planted: told } = plantErrors(items, plantedRules)
    expect(told.map(({ rule }) => rule)).toEqual(plantedRules)
    const named = told.flatMap((error) => error.items)
    expect(new Set(named).size).toBe(named.length)
    for (const item of after) expect(itemSchema.safeParse(item).error).toBeUndefined()
  })

  it('leave an end 12 m from the nearest line, and push another 9 m beyond one', () => {
    const short = planted('line-end-reaches-nothing')
    const end = lineOf(short.named[0]).at(-1) ?? [0, 0]
    expect(end.map(Math.round)).toEqual(short.told.at?.map(Math.round))
    expect(fromLines(short.after, short.told.items[0] ?? '', end)).toBeGreaterThan(0.5)
    const long = planted('overshoot')
    const [met, beyond] = lineOf(long.named[0]).slice(-2)
    expect(met && fromLines(long.after, long.told.items[0] ?? '', met)).toBeLessThan(0.01)
    expect(met && beyond && Math.hypot(met[0] - beyond[0], met[1] - beyond[1])).toBeCloseTo(9, 2)
  })

  it('draw a duplicate that is the same, vertex by vertex, and a near one two metres away', () => {
    const [first, second] = planted('duplicate-line').named.map(lineOf)
    expect(second).toEqual(first)
    const [one, other] = planted('near-duplicate-line').named.map(lineOf)
    const apart = (one ?? []).map(([x, y], index) =>
      Math.hypot(x - (other?.[index]?.[0] ?? 0), y - (other?.[index]?.[1] ?? 0)),
    )
    expect(Math.max(...apart)).toBeCloseTo(2, 2)
    expect(apart[0]).toBe(0)
  })

  it('take away a label, put another beside one, and keep all others', () => {
    const labels = (all: readonly Item[]) => all.filter(({ kind }) => kind === 'unit-label').length
    expect(labels(planted('face-without-label').after)).toBe(labels(items) - 1)
    expect(labels(planted('labels-disagree').after)).toBe(labels(items) + 1)
  })
})
