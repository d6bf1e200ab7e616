import { describe, expect, it } from 'vitest'
import { byRank, placeForAge, rankBetween, ranksAfterMove } from '@shared/legend/rank'

const unit = (id: string, rank: number, age = '') => ({ id, properties: { rank, age } })
const order = (units: ReturnType<typeof unit>[], moves: { id: string; rank: number }[]) => {
  const ranks = new Map(moves.map((move) => [move.id, move.rank]))
  const moved = units.map((each) => unit(each.id, ranks.get(each.id) ?? each.properties.rank))
  return byRank(moved).map((each) => each.id)
}

describe('moving a unit in the legend', () => {
  const units = [unit('a', 10), unit('b', 20), unit('c', 30), unit('d', 40)]

  it.each([
    ['a', 3, ['b', 'c', 'd', 'a']],
    ['d', 0, ['d', 'a', 'b', 'c']],
    ['a', 1, ['b', 'a', 'c', 'd']],
    ['c', 1, ['a', 'c', 'b', 'd']],
  ])('puts %s at place %i by changing its own rank alone', (id, place, expected) => {
    const moves = ranksAfterMove(units, id, place)
    expect(moves.map((move) => move.id)).toEqual([id])
    expect(order(units, moves)).toEqual(expected)
  })

  it('changes nothing where the unit stands there already', () => {
    expect(ranksAfterMove(units, 'b', 1)).toEqual([])
  })

  it('gives all units new ranks where two share one and nothing fits between', () => {
    const crowded = [unit('a', 1), unit('b', 1), unit('c', 5)]
    expect(order(crowded, ranksAfterMove(crowded, 'c', 1))).toEqual(['a', 'c', 'b'])
  })

  it('finds no rank between neighbours whose middle is one of them', () => {
    expect(rankBetween(1, 1 + Number.EPSILON)).toBeUndefined()
  })
})

describe('the place of a new unit', () => {
  const legend = ['Quaternary', 'Devonian', 'Devonian', 'Cambrian'].map((age, index) => ({
    age,
    rank: index,
  }))

  it.each([
    ['Devonian', 3],
    ['devonian ', 3],
    ['Carboniferous', 1],
    ['Upper Silurian', 3],
    ['Precambrian', 4],
    ['Neogene', 1],
    ['of unknown age', 4],
  ])('for %s is %i', (age, place) => {
    expect(placeForAge(age, legend)).toBe(place)
  })
})
