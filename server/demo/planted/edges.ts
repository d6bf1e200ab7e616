import type { ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import type { Bench, Planter } from './bench'
import { neatlineBox } from './looking'

/** A drawn contact that ends on the west edge, which two demo sheets share, its end last. */
function pickAtEdge(bench: Bench): { contact: ItemOf<'contact'>; line: XY[]; end: XY } {
  const [west, south, , north] = neatlineBox(bench)
  const isOn = (at: XY | undefined) => at?.[0] === west && at[1] > south + 200 && at[1] < north - 200
  const contact = bench.pick(
    'contact',
    ({ geometry: { coordinates }, properties }) =>
      properties.locationConfidence === 'certain' && (isOn(coordinates[0]) || isOn(coordinates.at(-1))),
  )
  const { coordinates } = contact.geometry
  const line = isOn(coordinates.at(-1)) ? coordinates : coordinates.toReversed()
  return { contact, line, end: line.at(-1) ?? [west, south] }
}

/** One planter for each rule about edges shared with other sheets: planted into one sheet, they show beside the other. */
export const edgePlanters = {
  'edge-lines-apart': (bench) => {
    const { contact, line, end } = pickAtEdge(bench)
    const moved: XY = [end[0], end[1] + 15]
    bench.put({ ...contact, geometry: { type: 'LineString', coordinates: [...line.slice(0, -1), moved] } })
    return { items: [contact.id], at: moved, what: 'meets the edge 15 m north of the line on the next sheet' }
  },
  'edge-confidence-differs': (bench) => {
    const { contact, end } = pickAtEdge(bench)
    bench.put({ ...contact, properties: { ...contact.properties, locationConfidence: 'inferred' } })
    return { items: [contact.id], at: end, what: 'inferred here, certain on the next sheet' }
  },
  'edge-unit-renamed': (bench) => {
    const unit = bench.pick('unit')
    const name = `${unit.properties.name}, upper part`
    bench.put({ ...unit, properties: { ...unit.properties, name } })
    return { items: [unit.id], at: null, what: 'a unit that has another name on the next sheet' }
  },
} satisfies Record<string, Planter>
