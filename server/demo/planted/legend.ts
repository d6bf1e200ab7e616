import type { ItemOf } from '@shared/items/item'
import type { Bench, Planter } from './bench'

type Unit = ItemOf<'unit'>

const withUnit = (unit: Unit, changed: Partial<Unit['properties']>): Unit => ({
  ...unit,
  properties: { ...unit.properties, ...changed },
})

/** Two units that no error has touched. */
function pickTwo(bench: Bench, passes?: (a: Unit, b: Unit) => boolean): [Unit, Unit] {
  const units = bench.untouched('unit')
  for (const first of units) {
    const second = units.find((unit) => unit.id !== first.id && (passes?.(first, unit) ?? true))
    if (second) return [first, second]
  }
  throw new RangeError('The legend has no two units left into which this error can be planted.')
}

/** The same colour, its blue a little deeper: by less than the eye tells apart on a map. */
function nearly(colour: string): string {
  const blue = Number.parseInt(colour.slice(5), 16)
  const other = blue > 128 ? blue - 3 : blue + 3
  return `${colour.slice(0, 5)}${other.toString(16).padStart(2, '0')}`
}

/** One planter for each rule about the legend. */
export const legendPlanters = {
  'letters-against-age': (bench) => {
    const unit = bench.pick('unit', ({ properties }) => properties.age === 'Ordovician')
    bench.put(withUnit(unit, { label: `K${unit.properties.label.slice(1)}` }))
    return { items: [unit.id], at: null, what: 'an Ordovician unit with the letter of the Cretaceous' }
  },
  'thickness-against-legend': (bench) => {
    const unit = bench.pick('unit', ({ properties }) => /\d+ to \d+ m$/.test(properties.description))
    bench.put(
      withUnit(unit, { description: unit.properties.description.replace(/\d+ to \d+ m$/, '5 to 15 m') }),
    )
    return { items: [unit.id], at: null, what: 'a thickness far below what its outcrop shows' }
  },
  'unit-not-on-map': (bench) => {
    const unit: Unit = {
      kind: 'unit',
      id: bench.id(),
      geometry: null,
      properties: {
        label: 'Dq',
        name: 'Quern Grit',
        age: 'Devonian',
        colour: '#b07f64',
        pattern: 'none',
        description: 'millstone grit, not met on this sheet',
        rank: bench
          .all('unit')
          .reduce((rank, { properties }) => (properties.age === 'Devonian' ? properties.rank + 1 : rank), 1),
      },
    }
    bench.put(unit)
    return { items: [unit.id], at: null, what: 'a unit that no label names' }
  },
  'two-units-one-label': (bench) => {
    const [first, second] = pickTwo(bench, (a, b) => a.properties.age === b.properties.age)
    bench.put(withUnit(second, { label: first.properties.label }))
    bench.keep(first)
    return {
      items: [first.id, second.id],
      at: null,
      what: `${second.properties.name} carries the label of ${first.properties.name}`,
    }
  },
  'two-units-one-colour': (bench) => {
    const [first, second] = pickTwo(bench)
    bench.put(withUnit(second, { colour: nearly(first.properties.colour) }))
    bench.keep(first)
    return {
      items: [first.id, second.id],
      at: null,
      what: `${second.properties.name} has nearly the colour of ${first.properties.name}`,
    }
  },
  'order-against-ages': (bench) => {
    const [first, second] = pickTwo(bench, (a, b) => a.properties.age !== b.properties.age)
    bench.put(withUnit(first, { rank: second.properties.rank }))
    bench.put(withUnit(second, { rank: first.properties.rank }))
    return { items: [first.id, second.id], at: null, what: 'two units of different ages have changed places' }
  },
  'age-outside-time-scale': (bench) => {
    const unit = bench.pick('unit')
    bench.put(withUnit(unit, { age: 'Merrowian' }))
    return { items: [unit.id], at: null, what: 'an age that no time scale has' }
  },
  'unit-without-description': (bench) => {
    const unit = bench.pick('unit')
    bench.put(withUnit(unit, { description: '' }))
    return { items: [unit.id], at: null, what: 'a unit without a description' }
  },
} satisfies Record<string, Planter>
