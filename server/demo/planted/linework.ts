import type { ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import {
  beside,
  copyOf,
  distance,
  middleOf,
  toward,
  vertexOf,
  withEnd,
  type Bench,
  type Planter,
} from './bench'
import { endsInside, lengthOf, neatlineBox, singleLabels } from './looking'

type Contact = ItemOf<'contact'>

/** A drawn contact with room for an error at its end: its last piece is long, and it ends on another line. */
const pickEnding = (bench: Bench): { contact: Contact; last: XY; before: XY } => {
  const isOpen = endsInside(bench)
  const contact = bench.pick('contact', ({ geometry: { coordinates }, properties }) => {
    const [before, last] = coordinates.slice(-2)
    return (
      properties.locationConfidence === 'certain' &&
      lengthOf(coordinates) > 400 &&
      before !== undefined &&
      last !== undefined &&
      distance(before, last) > 30 &&
      isOpen(coordinates)
    )
  })
  const [before, last] = contact.geometry.coordinates.slice(-2)
  if (!before || !last) throw new RangeError('A line has two places.')
  return { contact, last, before }
}

const withLine = (contact: Contact, coordinates: XY[]): Contact => ({
  ...contact,
  geometry: { type: 'LineString', coordinates },
})

/** A long drawn contact. */
const pickLong = (bench: Bench): Contact =>
  bench.pick(
    'contact',
    ({ geometry: { coordinates }, properties }) =>
      properties.locationConfidence === 'certain' && coordinates.length > 12 && lengthOf(coordinates) > 700,
  )

/** One planter for each rule about linework and faces. */
export const lineworkPlanters = {
  'line-end-reaches-nothing': (bench) => {
    const { contact, last, before } = pickEnding(bench)
    const end = toward(last, before, 12)
    bench.put(withLine(contact, withEnd(contact.geometry.coordinates, end)))
    return { items: [contact.id], at: end, what: 'ends 12 m short of the line that it met' }
  },
  overshoot: (bench) => {
    const { contact, last, before } = pickEnding(bench)
    const end = toward(last, before, -9)
    bench.put(withLine(contact, [...contact.geometry.coordinates, end]))
    return { items: [contact.id], at: end, what: 'runs 9 m beyond the line that it met' }
  },
  'crossing-without-vertex': (bench) => {
    const contact = pickLong(bench)
    const at = middleOf(contact.geometry.coordinates)
    const next = contact.geometry.coordinates[Math.floor(contact.geometry.coordinates.length / 2) + 1] ?? at
    const across = copyOf(bench, contact)
    bench.put(withLine(across, [beside(at, next, 180), beside(at, next, -180)]))
    bench.keep(contact)
    return {
      items: [contact.id, across.id],
      at: [(at[0] + next[0]) / 2, (at[1] + next[1]) / 2],
      what: 'a short contact lies across a long one',
    }
  },
  'duplicate-line': (bench) => {
    const contact = pickLong(bench)
    const twin = copyOf(bench, contact)
    bench.put(twin)
    bench.keep(contact)
    return {
      items: [contact.id, twin.id],
      at: middleOf(contact.geometry.coordinates),
      what: 'the same line twice',
    }
  },
  'near-duplicate-line': (bench) => {
    const contact = pickLong(bench)
    const twin = copyOf(bench, contact)
    const moved = contact.geometry.coordinates.map(([x, y], index, line): XY =>
      index === 0 || index === line.length - 1 ? [x, y] : [x + 1.6, y - 1.2],
    )
    bench.put(withLine(twin, moved))
    bench.keep(contact)
    return {
      items: [contact.id, twin.id],
      at: middleOf(contact.geometry.coordinates),
      what: 'a second line two metres beside the first',
    }
  },
  'self-crossing-line': (bench) => {
    const contact = pickLong(bench)
    const line = contact.geometry.coordinates
    const middle = Math.floor(line.length / 2)
    const [at, next] = [vertexOf(line, middle), vertexOf(line, middle + 1)]
    const loop: XY[] = [beside(at, next, 40), toward(beside(at, next, 40), at, -30), beside(at, next, -25)]
    bench.put(withLine(contact, [...line.slice(0, middle + 1), ...loop, ...line.slice(middle + 1)]))
    return { items: [contact.id], at, what: 'a loop in the middle of the line' }
  },
  'repeated-vertex': (bench) => {
    const contact = pickLong(bench)
    const line = contact.geometry.coordinates
    const middle = Math.floor(line.length / 2)
    const at = vertexOf(line, middle)
    bench.put(
      withLine(contact, [...line.slice(0, middle + 1), [at[0] + 0.001, at[1]], ...line.slice(middle + 1)]),
    )
    return { items: [contact.id], at, what: 'a vertex set twice, a millimetre apart' }
  },
  sliver: (bench) => {
    const contact = pickLong(bench)
    const line = contact.geometry.coordinates
    const [from, to] = [vertexOf(line, 4), vertexOf(line, 8)]
    const thread = copyOf(bench, contact)
    const bowed = line
      .slice(4, 9)
      .map(([x, y], index): XY => (index === 0 || index === 4 ? [x, y] : [x + 3, y + 2]))
    bench.put(withLine(thread, bowed))
    bench.keep(contact)
    return {
      items: [contact.id, thread.id],
      at: toward(from, to, distance(from, to) / 2),
      what: 'a thread of an area between two lines',
    }
  },
  'face-without-label': (bench) => {
    const [label] = singleLabels(bench)
    if (!label) throw new RangeError('Every area has two labels.')
    bench.remove(label)
    return { items: [], at: label.geometry.coordinates, what: 'the only label of an area removed' }
  },
  'labels-disagree': (bench) => {
    const [label] = singleLabels(bench)
    if (!label) throw new RangeError('Every area has two labels.')
    const other = bench.all('unit').find(({ id }) => id !== label.properties.unit)
    if (!other) throw new RangeError('The legend has one unit.')
    const second = copyOf(bench, label)
    const [x, y] = label.geometry.coordinates
    bench.put({
      ...second,
      geometry: { type: 'Point', coordinates: [x + 1, y] },
      properties: { ...second.properties, unit: other.id },
    })
    bench.keep(label)
    return {
      items: [label.id, second.id],
      at: [x, y],
      what: `a second label, ${other.properties.label}, beside the first`,
    }
  },
  'gap-to-neatline': (bench) => {
    const box = neatlineBox(bench)
    const isOn = ([x, y]: XY) => x === box[0] || y === box[1] || x === box[2] || y === box[3]
    const contact = bench.pick('contact', ({ geometry: { coordinates }, properties }) => {
      const [before, last] = coordinates.slice(-2)
      return (
        properties.locationConfidence === 'certain' &&
        before !== undefined &&
        last !== undefined &&
        isOn(last) &&
        distance(before, last) > 12
      )
    })
    const [before, last] = contact.geometry.coordinates.slice(-2)
    if (!before || !last) throw new RangeError('A line has two places.')
    const end = toward(last, before, 8)
    bench.put(withLine(contact, withEnd(contact.geometry.coordinates, end)))
    return { items: [contact.id], at: end, what: 'ends 8 m short of the neatline' }
  },
  'outside-neatline': (bench) => {
    const [west, , , north] = neatlineBox(bench)
    const attitude = bench.pick('attitude')
    const at: XY = [west - 400, north - 2000]
    bench.put({ ...attitude, geometry: { type: 'Point', coordinates: at } })
    return { items: [attitude.id], at, what: 'a station 400 m west of the neatline' }
  },
  'too-small-to-show': (bench) => {
    const [label] = singleLabels(bench)
    const contact = bench.pick('contact', ({ properties }) => properties.locationConfidence === 'certain')
    if (!label) throw new RangeError('Every area has two labels.')
    const [x, y] = label.geometry.coordinates
    const centre: XY = [x + 40, y]
    const ring = Array.from({ length: 9 }, (_, index): XY => {
      const turn = ((index % 8) * Math.PI) / 4
      return [centre[0] + 6 * Math.cos(turn), centre[1] + 6 * Math.sin(turn)]
    })
    const tiny = withLine(copyOf(bench, contact), ring)
    const other = bench.all('unit').find(({ id }) => id !== label.properties.unit)
    const inside = copyOf(bench, label)
    bench.put(tiny)
    bench.put({
      ...inside,
      geometry: { type: 'Point', coordinates: centre },
      properties: { ...inside.properties, unit: other?.id ?? label.properties.unit },
    })
    return {
      items: [tiny.id],
      at: centre,
      what: 'an area twelve metres across, half a millimetre on the sheet',
    }
  },
  'finer-than-scale': (bench) => {
    const contact = pickLong(bench)
    const fine = contact.geometry.coordinates.flatMap((at, index, line): XY[] => {
      const next = line[index + 1]
      if (!next || index > 3) return [at]
      const steps = Math.floor(distance(at, next))
      return [at, ...Array.from({ length: Math.max(0, steps - 1) }, (_, step) => toward(at, next, step + 1))]
    })
    bench.put(withLine(contact, fine))
    return {
      items: [contact.id],
      at: contact.geometry.coordinates[1] ?? null,
      what: 'vertices a metre apart along four pieces',
    }
  },
  'decoration-on-wrong-side': (bench) => {
    const fault = bench.pick('fault', ({ properties }) => properties.type === 'thrust')
    bench.put({ ...fault, properties: { ...fault.properties, side: 'left' } })
    return {
      items: [fault.id],
      at: middleOf(fault.geometry.coordinates),
      what: 'teeth of a thrust on its lower plate',
    }
  },
} satisfies Record<string, Planter>
