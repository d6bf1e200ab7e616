import { snapItem } from '@shared/items/snap-item'
import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { randomId, shuffled, type Random } from '../truth/random'

/** An error that was planted: which rule of the findings speaks of it, of which items, where. */
export interface Planted<Rule extends string = string> {
  rule: Rule
  /** Ids of the items that a finding of this rule would name. */
  items: string[]
  /** Place of the error, sheet metres; null where it has none. */
  at: XY | null
  /** What was done, in words. */
  what: string
}

/** What a planter tells of its work. */
export type Sown = Omit<Planted, 'rule'>

/** The items of a sheet while errors are planted into them. No item is touched by two errors. */
export class Bench {
  private readonly byId: Map<string, Item>
  private readonly touched = new Set<string>()

  constructor(
    items: readonly Item[],
    readonly random: Random,
  ) {
    this.byId = new Map(items.map((item) => [item.id, item]))
  }

  get items(): Item[] {
    return [...this.byId.values()]
  }

  /** Items of a kind that no error has touched and that pass, in an order that the seed decides. */
  untouched<K extends ItemKind>(kind: K, passes: (item: ItemOf<K>) => boolean = () => true): ItemOf<K>[] {
    const found = this.items.filter(
      (item): item is ItemOf<K> =>
        item.kind === kind && !this.touched.has(item.id) && passes(item as ItemOf<K>), // Its kind was just asked.
    )
    return shuffled(found, this.random)
  }

  /** The first of them. */
  pick<K extends ItemKind>(kind: K, passes?: (item: ItemOf<K>) => boolean): ItemOf<K> {
    const [first] = this.untouched(kind, passes)
    if (!first) throw new RangeError(`The sheet has no ${kind} left into which this error can be planted.`)
    return first
  }

  /** All items of a kind, touched or not. */
  all<K extends ItemKind>(kind: K): ItemOf<K>[] {
    return this.items.filter((item): item is ItemOf<K> => item.kind === kind)
  }

  /** Puts an item in the place of the one with its id, or adds it. */
  put(item: Item): void {
    const snapped = snapItem(item)
    if (!snapped) throw new RangeError(`Item ${item.id} would be a line without length.`)
    this.byId.set(item.id, snapped)
    this.touched.add(item.id)
  }

  remove(item: Item): void {
    this.byId.delete(item.id)
    this.touched.add(item.id)
  }

  /** Keeps later errors away from an item. */
  keep(item: Item): void {
    this.touched.add(item.id)
  }

  id(): string {
    return randomId(this.random)
  }
}

export type Planter = (bench: Bench) => Sown

/** A new item like another, with an id of its own. */
export const copyOf = <I extends Item>(bench: Bench, item: I): I => ({
  ...structuredClone(item),
  id: bench.id(),
})

export const distance = (a: XY, b: XY): number => Math.hypot(a[0] - b[0], a[1] - b[1])

/** A place moved from one toward another by so many metres; away from it if negative. */
export function toward(from: XY, to: XY, metres: number): XY {
  const length = distance(from, to)
  return [from[0] + ((to[0] - from[0]) / length) * metres, from[1] + ((to[1] - from[1]) / length) * metres]
}

/** The line with its last place replaced. */
export const withEnd = (line: readonly XY[], end: XY): XY[] => [...line.slice(0, -1), end]

/** A place beside the middle of a line's piece, to its left, by so many metres. */
export function beside([fromX, fromY]: XY, [toX, toY]: XY, metres: number): XY {
  const length = Math.hypot(toX - fromX, toY - fromY)
  return [
    (fromX + toX) / 2 - ((toY - fromY) / length) * metres,
    (fromY + toY) / 2 + ((toX - fromX) / length) * metres,
  ]
}

/** A vertex of a line by its index; there must be one. */
export function vertexOf(line: readonly XY[], index: number): XY {
  const vertex = line.at(index)
  if (!vertex) throw new RangeError(`A line of ${line.length} vertices has none at ${index}.`)
  return vertex
}

export const middleOf = (line: readonly XY[]): XY => vertexOf(line, Math.floor(line.length / 2))
