import { describe, expect, it } from 'vitest'
import { itemSchema, type Item } from '@shared/items/item'
import { angleBetween, toRadians, type XY } from '@shared/units'
import {
  convergenceAt,
  dulseSound,
  fromIsland,
  gannetHead,
  makeSheet,
  merrowTruth,
  stormcrest,
  toIsland,
  type MerrowSheet,
} from '../../../../server/demo/merrow-island'
import { placeAlong } from '../../../../server/demo/truth/axial-traces'
import { itemsOf, type DemoSheet } from '../../../../server/demo/truth/generate-sheet'
import { coverAt, onGround, rockAt, sideAt } from '../../../../server/demo/truth/truth'
import { foldedLayers, levelsOf, youngerLayers } from '../../../../server/demo/truth/units'
import { slope } from '../../../../server/demo/truth/vectors'

const { island, ground } = merrowTruth
const sheets = [gannetHead, dulseSound, stormcrest].map((merrow) => ({ merrow, sheet: makeSheet(merrow) }))
const large = sheets[0]?.sheet as DemoSheet // The list above begins with it.
const named = sheets.map(({ merrow, sheet }) => [merrow.sheet.number, sheet, merrow] as const)

type WithLine = Extract<Item, { geometry: { type: 'LineString' } }>
const placesOf = (item: { geometry: { coordinates: readonly XY[] } }): XY[] =>
  item.geometry.coordinates.map(toIsland)

describe.each(named)('sheet %s of the demo', (_, sheet, { extent }: MerrowSheet) => {
  it('holds only valid items, every one with an id of its own', () => {
    const items = itemsOf(sheet)
    for (const item of items) expect(itemSchema.safeParse(item).error).toBeUndefined()
    expect(new Set(items.map((item) => item.id)).size).toBe(items.length)
  })

  it('keeps everything within the neatline', () => {
    const { origin, width, height } = extent
    for (const item of itemsOf(sheet)) {
      if (item.geometry === null) continue
      const places: readonly XY[] =
        item.geometry.type === 'Point' ? [item.geometry.coordinates] : item.geometry.coordinates
      for (const [x, y] of places.map(toIsland)) {
        const inside = Math.min(x - origin[0], y - origin[1], origin[0] + width - x, origin[1] + height - y)
        expect(inside).toBeGreaterThanOrEqual(0)
      }
    }
  })

  it('ends its contacts and faults on other lines’ vertices or on the neatline, never in the open', () => {
    const drawn: WithLine[] = [...sheet.contacts, ...sheet.coverContacts, ...sheet.faults].filter(
      (line) => line.properties.locationConfidence !== 'concealed',
    )
    const held = new Map<string, number>()
    for (const line of drawn) {
      for (const key of new Set(line.geometry.coordinates.map(String)))
        held.set(key, (held.get(key) ?? 0) + 1)
    }
    const [west, south] = fromIsland(extent.origin)
    const isOnEdge = ([x, y]: readonly number[]) =>
      x === west || y === south || x === west + extent.width || y === south + extent.height
    const loose = drawn.flatMap(({ geometry: { coordinates } }) => {
      const [first, last] = [coordinates[0] ?? [], coordinates.at(-1) ?? []]
      if (String(first) === String(last)) return []
      return [first, last].filter((end) => !isOnEdge(end) && (held.get(String(end)) ?? 0) < 2)
    })
    expect(loose).toEqual([])
  })
})

describe('the large demo sheet', () => {
  it('is the same every time', () => {
    expect(JSON.stringify(itemsOf(makeSheet(gannetHead)))).toBe(JSON.stringify(itemsOf(large)))
  }, 60_000)

  it('has enough on it to be a map', () => {
    const patterned = large.units.filter(({ properties }) => properties.pattern !== 'none')
    expect(patterned.length).toBeGreaterThanOrEqual(12)
    expect(large.attitudes.length).toBeGreaterThanOrEqual(300)
    expect(large.contacts.length).toBeGreaterThan(150)
    const confidences = new Set(large.contacts.map(({ properties }) => properties.locationConfidence))
    expect([...confidences].sort()).toEqual(['approximate', 'certain', 'concealed', 'inferred'])
    expect(new Set(large.faults.map(({ properties }) => properties.type))).toEqual(
      new Set(['normal', 'thrust']),
    )
    const planes = large.attitudes.map(({ properties }) => properties)
    expect(new Set(planes.map(({ type }) => type)).size).toBe(4)
    for (const wanted of [
      planes.filter(({ overturned }) => overturned),
      planes.filter(({ dip }) => dip === 0),
      planes.filter(({ dip, type }) => dip === 90 && type === 'bedding'),
      large.lineations,
      large.otherLines.filter(({ properties }) => properties.type === 'dike'),
      large.otherLines.filter(({ properties }) => properties.type === 'marker-bed'),
    ]) {
      expect(wanted.length).toBeGreaterThan(1)
    }
    expect(new Set(large.stations.map(({ properties }) => properties.type)).size).toBeGreaterThanOrEqual(6)
  })
})

describe('attitudes of the demo', () => {
  const measured = large.attitudes.map(({ geometry, properties }) => ({
    at: toIsland(geometry.coordinates),
    convergence: convergenceAt(geometry.coordinates),
    ...properties,
  }))

  /** Change of stratigraphic height along a direction, as a sine of the angle to the layer; by a step, not a formula. */
  function offLayer(at: XY, direction: readonly [number, number, number]): number {
    const z = ground(at)
    const { field } = rockAt(merrowTruth, at)
    const step = 0.01
    const [east, north, up] = direction.map((part) => part * step) as [number, number, number] // Three stay three.
    const change =
      field.value([at[0] + east, at[1] + north], z + up) - field.value([at[0] - east, at[1] - north], z - up)
    return change / (2 * step * Math.hypot(...field.gradient(at, z)))
  }
  // Strike and dip are each rounded to a degree: half a degree off in both is 0.71°.
  const tolerance = Math.sin(toRadians(0.72))

  it('lie in the layer: strike line and line of dip keep its height, against true north', () => {
    for (const { at, strike, dip, type, convergence } of measured) {
      if (type !== 'bedding') continue
      const grid = toRadians((strike ?? 0) - convergence)
      const [sin, cos] = [Math.sin(grid), Math.cos(grid)]
      expect(Math.abs(offLayer(at, [sin, cos, 0]))).toBeLessThan(tolerance)
      // Down the dip is to the right of strike: its azimuth is strike + 90°.
      const [level, down] = [Math.cos(toRadians(dip)), Math.sin(toRadians(dip))]
      expect(Math.abs(offLayer(at, [cos * level, -sin * level, -down]))).toBeLessThan(tolerance)
    }
  })

  it('are overturned exactly where older rock lies above younger', () => {
    for (const { at, overturned, type, dip } of measured) {
      if (type === 'bedding' && dip > 0 && dip < 90) expect(offLayer(at, [0, 0, 1]) < 0).toBe(overturned)
    }
  })

  it('stand on rock that is seen, never on cover', () => {
    for (const { at } of measured) expect(coverAt(merrowTruth, at)).toBeUndefined()
  })
})

describe('contacts of the demo', () => {
  /** Distance on the ground from the nearest level between two layers, or from the base of the younger beds. */
  function fromLevel(at: XY): number {
    const distances = (['west', 'east'] as const).flatMap((side) =>
      (['lower', 'upper', 'younger'] as const).map((series) => {
        const surface = onGround(island.height(series, side), ground)
        const levels = series === 'younger' ? [0, ...levelsOf(youngerLayers)] : levelsOf(foldedLayers)
        const value = surface(at)
        return Math.min(...levels.map((level) => Math.abs(value - level))) / Math.hypot(...slope(surface, at))
      }),
    )
    return Math.min(...distances)
  }

  it('lie on a level on the ground: at their vertices to a millimetre, between them to 0.04 mm on the sheet', () => {
    for (const contact of large.contacts) {
      const line = placesOf(contact)
      line.forEach((at, index) => {
        // Snapping to the 1 mm grid moves a vertex by up to 0.7 mm.
        expect(fromLevel(at)).toBeLessThan(0.001)
        const before = line[index - 1]
        // Thinned to 0.6 m, from pieces that bend by less than 0.25 m: 0.85 m are 0.035 mm at 1:24 000.
        if (before) expect(fromLevel([(at[0] + before[0]) / 2, (at[1] + before[1]) / 2])).toBeLessThan(0.96)
      })
    }
  })

  it('are concealed exactly where cover lies on them', () => {
    for (const contact of large.contacts) {
      const line = placesOf(contact)
      const middle = line.length > 2 ? line[Math.floor(line.length / 2)] : undefined
      if (!middle) continue
      const isHidden = coverAt(merrowTruth, middle) !== undefined
      expect(isHidden).toBe(contact.properties.locationConfidence === 'concealed')
    }
  })
})

describe('folds of the demo', () => {
  const withAxis = sheets.flatMap(({ sheet }) =>
    sheet.traces.flatMap((trace) => {
      const line = placesOf(trace)
      const middle = placeAlong(line, 0.5)
      const { plunge, trend } = trace.properties
      return plunge !== null && trend !== null ? [{ ...trace.properties, plunge, trend, line, middle }] : []
    }),
  )
  const plain = withAxis.filter(({ doubly }) => doubly === 'no')
  const heightAt = (at: XY) => rockAt(merrowTruth, at).field.value(at, ground(at))

  it('are anticlines and synclines, upright and overturned, plunging one way and both', () => {
    const forms = new Set(withAxis.map(({ form }) => form))
    expect(forms).toEqual(new Set(['anticline', 'syncline', 'overturned-anticline', 'overturned-syncline']))
    expect(withAxis.some(({ doubly }) => doubly === 'outward')).toBe(true)
    expect(withAxis.filter(({ plunge }) => plunge >= 10).length).toBeGreaterThan(15)
  })

  it('have older rock in the cores of anticlines and younger rock in the cores of synclines', () => {
    const [east, north] = island.axes.along
    for (const { form, middle } of withAxis) {
      const { series, side } = rockAt(merrowTruth, middle)
      if (series === 'younger') continue
      const field = island.height(series, side)
      // At the level of the middle, so that hills do not count; 60 m to each side, well within every fold.
      const beside = (metres: number): number =>
        field.value([middle[0] + north * metres, middle[1] - east * metres], ground(middle))
      const bend = beside(60) + beside(-60) - 2 * beside(0)
      expect(Math.sign(bend)).toBe(form.endsWith('anticline') ? 1 : -1)
    }
  })

  it('close the right way: along an axis that plunges, younger rock follows in the direction of its trend', () => {
    for (const { line, trend, plunge } of plain) {
      if (plunge < 8) continue
      const [first, last] = [line[0], line.at(-1)]
      if (!first || !last) throw new RangeError('A trace has two ends.')
      const bearing = (Math.atan2(last[0] - first[0], last[1] - first[1]) * 180) / Math.PI
      const down = angleBetween(trend, bearing) < 90
      expect(heightAt(last) > heightAt(first)).toBe(down)
    }
  })

  it('have axes along which layer and hinge surface both keep their value', () => {
    for (const { middle, trend, plunge } of plain) {
      const grid = toRadians(trend - convergenceAt(fromIsland(middle)))
      const z = ground(middle)
      const side = sideAt(merrowTruth, middle, z)
      const { series } = rockAt(merrowTruth, middle)
      if (series === 'younger') continue
      const belt = island.belt(series, side)
      const level = Math.cos(toRadians(plunge))
      for (const field of [belt.height, belt.across]) {
        const step = 0.01
        const [east, north, up] = [
          Math.sin(grid) * level,
          Math.cos(grid) * level,
          -Math.sin(toRadians(plunge)),
        ]
        const change =
          field.value([middle[0] + east * step, middle[1] + north * step], z + up * step) -
          field.value(middle, z)
        expect(Math.abs(change) / step / Math.hypot(...field.gradient(middle, z))).toBeLessThan(
          Math.sin(toRadians(0.8)),
        )
      }
    }
  })
})

describe('faults of the demo', () => {
  it('have the hanging wall on their right: younger rock beside the normal fault, the upper plate beside the thrust', () => {
    for (const fault of large.faults) {
      const { side, type } = fault.properties
      expect(side).toBe('right')
      const line = placesOf(fault)
      const [from, to] = [line[0], line[1]]
      if (!from || !to) throw new RangeError('A fault has two vertices.')
      const length = Math.hypot(to[0] - from[0], to[1] - from[1])
      const right: XY = [(to[1] - from[1]) / length, -(to[0] - from[0]) / length]
      const middle: XY = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
      const beside = (metres: number) => {
        const at: XY = [middle[0] + right[0] * metres, middle[1] + right[1] * metres]
        return rockAt(merrowTruth, at)
      }
      if (type === 'thrust') expect([beside(5).series, beside(-5).series]).toEqual(['upper', 'lower'])
      else expect([beside(5).side, beside(-5).side]).toEqual(['east', 'west'])
    }
  })

  it('state the dips of their planes', () => {
    const dips = large.faults.flatMap(({ properties: { dip, type } }) =>
      dip === null ? [] : [{ dip, type }],
    )
    expect(dips.some(({ type }) => type === 'thrust')).toBe(true)
    for (const { dip, type } of dips)
      expect(Math.abs(dip - (type === 'thrust' ? 31 : 68))).toBeLessThanOrEqual(2)
  })
})

describe('sheets that adjoin', () => {
  /** What meets an edge: place, kind and location confidence of each line that ends there. */
  const atEdge = (sheet: DemoSheet, isOn: (at: readonly number[]) => boolean): string[] =>
    [...sheet.contacts, ...sheet.coverContacts, ...sheet.faults, ...sheet.traces]
      .flatMap((line) =>
        [line.geometry.coordinates[0], line.geometry.coordinates.at(-1)].flatMap((end) =>
          end && isOn(end)
            ? [`${line.kind} ${line.properties.locationConfidence} ${line.properties.name} ${end.join(' ')}`]
            : [],
        ),
      )
      .sort()

  it.each([
    ['MI-13 in the west', sheets[1]?.sheet, (at: readonly number[]) => at[0] === 284_000],
    ['MI-18 in the south', sheets[2]?.sheet, (at: readonly number[]) => at[1] === 5_278_000],
  ])('meet on the millimetre, with the same kind, name and confidence: %s', (_, other, isOn) => {
    if (!other) throw new RangeError('There are three sheets.')
    const mine = atEdge(large, isOn)
    expect(mine.length).toBeGreaterThan(8)
    expect(atEdge(other, isOn)).toEqual(mine)
  })

  it('describe the same units alike, and list those that they show', () => {
    const known = new Map(large.units.map(({ properties }) => [properties.label, properties]))
    for (const { sheet } of sheets) {
      const shown = new Set(sheet.labels.map(({ properties }) => properties.unit))
      expect(new Set(sheet.units.map(({ id }) => id))).toEqual(shown)
      for (const { properties } of sheet.units) {
        expect(known.get(properties.label) ?? properties).toEqual(properties)
      }
    }
  })
})
