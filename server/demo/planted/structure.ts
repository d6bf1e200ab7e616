import type { ItemOf } from '@shared/items/item'
import { normalizeAzimuth } from '@shared/units'
import { beside, copyOf, distance, middleOf, vertexOf, type Bench, type Planter } from './bench'
import { near } from './looking'

type Attitude = ItemOf<'attitude'>
type Trace = ItemOf<'axial-trace'>

const turned = (attitude: Attitude, by: number): Attitude => ({
  ...attitude,
  properties: {
    ...attitude.properties,
    strike: normalizeAzimuth((attitude.properties.strike ?? 0) + by),
    reading: null,
  },
})

/** A plainly plunging trace of some length with beds measured beside it. */
function pickTrace(bench: Bench, form: RegExp): Trace {
  const attitudes = bench.all('attitude')
  return bench.pick('axial-trace', ({ geometry, properties }) => {
    const isNear = near(middleOf(geometry.coordinates), 900)
    return (
      form.test(properties.form) &&
      properties.doubly === 'no' &&
      (properties.plunge ?? 0) >= 10 &&
      attitudes.filter(isNear).length >= 6
    )
  })
}

const isBedding = ({ properties: { type, dip, strike } }: Attitude): boolean =>
  type === 'bedding' && strike !== null && dip > 15 && dip < 75

/** One planter for each rule about structure. */
export const structurePlanters = {
  'form-against-dips': (bench) => {
    const trace = pickTrace(bench, /^anticline$/)
    bench.put({ ...trace, properties: { ...trace.properties, form: 'syncline' } })
    return {
      items: [trace.id],
      at: middleOf(trace.geometry.coordinates),
      what: 'an anticline drawn as a syncline',
    }
  },
  'plunge-against-attitudes': (bench) => {
    const trace = pickTrace(bench, /^(anticline|syncline)$/)
    const { trend } = trace.properties
    bench.put({
      ...trace,
      properties: { ...trace.properties, trend: trend === null ? null : normalizeAzimuth(trend + 180) },
    })
    return {
      items: [trace.id],
      at: middleOf(trace.geometry.coordinates),
      what: 'the plunge arrow at the wrong end',
    }
  },
  'limb-without-attitude': (bench) => {
    const trace = pickTrace(bench, /^(anticline|syncline)$/)
    const at = middleOf(trace.geometry.coordinates)
    const [first, last] = [trace.geometry.coordinates[0] ?? at, trace.geometry.coordinates.at(-1) ?? at]
    const reach = Math.max(1500, distance(first, last))
    const isRight = ({ geometry: { coordinates } }: Attitude) =>
      (last[0] - first[0]) * (coordinates[1] - first[1]) -
        (last[1] - first[1]) * (coordinates[0] - first[0]) <
      0
    for (const attitude of bench.untouched('attitude', isRight).filter(near(at, reach)))
      bench.remove(attitude)
    bench.keep(trace)
    return { items: [trace.id], at, what: 'all attitudes of one limb removed' }
  },
  'overturned-far-from-folds': (bench) => {
    const overturned = bench.all('attitude').filter(({ properties }) => properties.overturned)
    const attitude = bench.pick(
      'attitude',
      (item) =>
        isBedding(item) &&
        !item.properties.overturned &&
        overturned.every((other) => distance(other.geometry.coordinates, item.geometry.coordinates) > 2500),
    )
    bench.put({ ...attitude, properties: { ...attitude.properties, overturned: true, reading: null } })
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'an overturned bed where no fold is',
    }
  },
  'attitude-against-contact': (bench) => {
    const places = bench.all('contact').flatMap(({ geometry }) => geometry.coordinates)
    const attitude = bench.pick(
      'attitude',
      (item) => isBedding(item) && places.some((at) => distance(at, item.geometry.coordinates) < 130),
    )
    bench.put(turned(attitude, 60))
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'strike turned by 60° beside a contact',
    }
  },
  'attitude-against-neighbours': (bench) => {
    const all = bench.all('attitude')
    const attitude = bench.pick('attitude', (item) => {
      const others = all.filter(near(item.geometry.coordinates, 700)).filter(isBedding)
      return isBedding(item) && others.length >= 5 && others.every((other) => alike(item, other))
    })
    bench.put(turned(attitude, 180))
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'dip to the wrong side among beds that agree',
    }
  },
  'vertical-beside-bending-contact': (bench) => {
    const attitude = bench.pick(
      'attitude',
      ({ properties: { dip, type } }) => type === 'bedding' && dip > 0 && dip < 6,
    )
    bench.put({ ...attitude, properties: { ...attitude.properties, dip: 90, reading: null } })
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'a vertical bed where contacts follow the ground',
    }
  },
  'contact-across-fault': (bench) => {
    const fault = bench.pick(
      'fault',
      ({ properties, geometry }) =>
        properties.locationConfidence !== 'concealed' && geometry.coordinates.length > 6,
    )
    const contact = bench.pick('contact', ({ properties }) => properties.locationConfidence === 'certain')
    const middle = Math.floor(fault.geometry.coordinates.length / 2)
    const [at, next] = [
      vertexOf(fault.geometry.coordinates, middle),
      vertexOf(fault.geometry.coordinates, middle + 1),
    ]
    const across = copyOf(bench, contact)
    bench.put({
      ...across,
      geometry: {
        type: 'LineString',
        coordinates: [beside(at, next, 120), beside(at, next, 0), beside(at, next, -120)],
      },
      properties: { ...across.properties, name: '', note: '' },
    })
    bench.keep(fault)
    return {
      items: [across.id, fault.id],
      at: beside(at, next, 0),
      what: 'a contact straight across a fault',
    }
  },
  'younger-beneath-older': (bench) => {
    const [first, second] = bench
      .untouched('unit')
      .filter(({ properties: { age } }) => age === 'Devonian' || age === 'Silurian')
      .toSorted((a, b) => a.properties.rank - b.properties.rank)
    if (!first || !second) throw new RangeError('The legend lacks two units of one age.')
    bench.put({ ...first, properties: { ...first.properties, rank: second.properties.rank } })
    bench.put({ ...second, properties: { ...second.properties, rank: first.properties.rank } })
    return {
      items: [first.id, second.id],
      at: null,
      what: 'two units in turn, the lower one called the younger',
    }
  },
  'level-beside-crossing-contact': (bench) => {
    const attitude = bench.pick('attitude', (item) => isBedding(item) && item.properties.dip > 50)
    bench.put({
      ...attitude,
      properties: {
        ...attitude.properties,
        dip: 0,
        strike: null,
        overturned: false,
        topsKnown: false,
        reading: null,
      },
    })
    return {
      items: [attitude.id],
      at: attitude.geometry.coordinates,
      what: 'a level bed where contacts cross the ground',
    }
  },
} satisfies Record<string, Planter>

/** Whether two beds strike and dip nearly alike. */
function alike(a: Attitude, b: Attitude): boolean {
  const turn = Math.abs(normalizeAzimuth((a.properties.strike ?? 0) - (b.properties.strike ?? 0) + 180) - 180)
  return turn < 40 && Math.abs(a.properties.dip - b.properties.dip) < 30
}
