import { describe, expect, it } from 'vitest'
import { itemSchema } from '@shared/items/item'
import { toRadians, type XY } from '@shared/units'
import { gannetHeadOptions, makeGannetHead } from '../../../../server/demo/gannet-head'
import { unitAt } from '../../../../server/demo/truth/labels'
import { contactHeights } from '../../../../server/demo/truth/units'
import { slope } from '../../../../server/demo/truth/vectors'

const sheet = makeGannetHead()
const { truth } = sheet
const { origin, width, height, convergenceAt } = gannetHeadOptions
const fromCorner = ([east, north]: readonly number[]): XY => [
  (east ?? NaN) - origin[0],
  (north ?? NaN) - origin[1],
]
const vertices = (items: readonly { geometry: { coordinates: [number, number][] } }[]): XY[] =>
  items.flatMap((item) => item.geometry.coordinates.map(fromCorner))
const everything = [
  ...sheet.units,
  ...sheet.contacts,
  ...sheet.coverContacts,
  ...sheet.faults,
  ...sheet.markerBeds,
  ...sheet.traces,
  ...sheet.attitudes,
  ...sheet.labels,
]

describe('the demo sheet', () => {
  it('holds only valid items, every one with an id of its own', () => {
    for (const item of everything) expect(itemSchema.safeParse(item).error).toBeUndefined()
    expect(new Set(everything.map((item) => item.id)).size).toBe(everything.length)
  })

  it('is the same every time', () => {
    expect(JSON.stringify(makeGannetHead().contacts)).toBe(JSON.stringify(sheet.contacts))
  })

  it('has enough on it to be a map', () => {
    expect(sheet.units).toHaveLength(12)
    expect(sheet.contacts.length).toBeGreaterThan(60)
    expect(sheet.attitudes.length).toBeGreaterThanOrEqual(60)
    const confidences = new Set(sheet.contacts.map((contact) => contact.properties.locationConfidence))
    expect([...confidences].sort()).toEqual(['approximate', 'certain', 'concealed', 'inferred'])
    expect(sheet.attitudes.some((attitude) => attitude.properties.overturned)).toBe(true)
  })

  it('keeps every line within the neatline', () => {
    for (const [x, y] of vertices([
      ...sheet.contacts,
      ...sheet.coverContacts,
      ...sheet.faults,
      ...sheet.traces,
    ])) {
      expect(Math.min(x, y, width - x, height - y)).toBeGreaterThanOrEqual(0)
    }
  })
})

describe('attitudes of the demo', () => {
  /** Change of stratigraphic height per metre along a direction, as a sine of the angle to the layer. */
  function offLayer(at: XY, direction: [number, number, number]): number {
    const z = truth.ground(at)
    const block = truth.onGround.blockAt(at)
    const gradient = truth.field.gradient(at, z, block)
    const step = 0.5
    const [east, north, up] = direction.map((part) => part * step)
    const moved: XY = [at[0] + (east ?? 0), at[1] + (north ?? 0)]
    const change = truth.field.height(moved, z + (up ?? 0), block) - truth.field.height(at, z, block)
    return change / (step * Math.hypot(...gradient))
  }
  // Strike and dip are each rounded to a degree: half a degree off in both is 0.71°. The half metre adds a curvature.
  const tolerance = Math.sin(toRadians(0.8))

  it('lie in the layer: strike line and line of dip keep its height, against true north', () => {
    for (const { geometry, properties } of sheet.attitudes) {
      const at = fromCorner(geometry.coordinates)
      const grid = toRadians((properties.strike ?? NaN) - convergenceAt(geometry.coordinates))
      const dip = toRadians(properties.dip)
      const [sin, cos] = [Math.sin(grid), Math.cos(grid)]
      expect(Math.abs(offLayer(at, [sin, cos, 0]))).toBeLessThan(tolerance)
      // Down the dip is to the right of strike: its azimuth is strike + 90°.
      const down: [number, number, number] = [cos * Math.cos(dip), -sin * Math.cos(dip), -Math.sin(dip)]
      expect(Math.abs(offLayer(at, down))).toBeLessThan(tolerance)
    }
  })

  it('are overturned exactly where older rock lies above younger', () => {
    for (const { geometry, properties } of sheet.attitudes) {
      const at = fromCorner(geometry.coordinates)
      expect(offLayer(at, [0, 0, 1]) < 0).toBe(properties.overturned)
    }
  })
})

describe('contacts of the demo', () => {
  const fromLevel = (at: XY): number =>
    Math.min(
      ...(['west', 'east'] as const).flatMap((block) => {
        const surface = truth.onGround.height(block)
        const steepness = Math.hypot(...slope(surface, at))
        return contactHeights.map((level) => Math.abs(surface(at) - level) / steepness)
      }),
    )

  it('lie on the level between two layers: at their vertices to the millimetre, between them to a pen’s width', () => {
    for (const { geometry } of sheet.contacts) {
      const line = geometry.coordinates.map(fromCorner)
      line.forEach((at, index) => {
        // Snapping to the 1 mm grid moves a vertex by up to 0.7 mm.
        expect(fromLevel(at)).toBeLessThan(0.001)
        const before = line[index - 1]
        // Thinned to 0.6 m, from pieces that bend by less than 0.25 m.
        if (before) expect(fromLevel([(at[0] + before[0]) / 2, (at[1] + before[1]) / 2])).toBeLessThan(0.86)
      })
    }
  })

  it('end on another line’s vertex or on the neatline, never in the open', () => {
    const key = (at: XY) => at.join(' ')
    const others = [...sheet.faults, ...sheet.coverContacts].flatMap((item) => vertices([item]))
    const held = new Map<string, number>()
    const ends = sheet.contacts.flatMap(({ geometry }) =>
      [geometry.coordinates[0], geometry.coordinates.at(-1)].map((end) => fromCorner(end ?? [])),
    )
    for (const at of [...others, ...ends]) held.set(key(at), (held.get(key(at)) ?? 0) + 1)
    const loose = ends.filter((at) => {
      const [x, y] = at
      const onEdge = x === 0 || y === 0 || x === width || y === height
      return !onEdge && (held.get(key(at)) ?? 0) < 2
    })
    expect(loose).toEqual([])
  })

  it('are concealed exactly where cover lies on them', () => {
    for (const { geometry, properties } of sheet.contacts) {
      const line = geometry.coordinates.map(fromCorner)
      const middle = line.length > 2 ? line[Math.floor(line.length / 2)] : undefined
      if (!middle) continue
      expect(typeof unitAt(truth, middle) === 'string').toBe(properties.locationConfidence === 'concealed')
    }
  })
})

describe('folds of the demo', () => {
  const withAxis = sheet.traces.flatMap(({ geometry, properties }) => {
    const line = geometry.coordinates.map(fromCorner)
    const middle = line[Math.floor(line.length / 2)]
    return middle && properties.plunge !== null && properties.trend !== null
      ? [{ ...properties, plunge: properties.plunge, trend: properties.trend, line, middle }]
      : []
  })
  const heightAt = (at: XY) => truth.onGround.height(truth.onGround.blockAt(at))(at)

  it('are several anticlines and synclines that plunge gently north-north-east', () => {
    expect(withAxis.filter((axis) => axis.form === 'anticline').length).toBeGreaterThanOrEqual(3)
    expect(withAxis.filter((axis) => axis.form === 'syncline').length).toBeGreaterThanOrEqual(3)
    for (const { plunge, trend } of withAxis) {
      expect(plunge).toBeGreaterThanOrEqual(14)
      expect(plunge).toBeLessThanOrEqual(22)
      expect(trend).toBeGreaterThan(15)
      expect(trend).toBeLessThan(50)
    }
  })

  it('have their oldest rock in the cores of anticlines and their youngest in the cores of synclines', () => {
    const [east, north] = truth.field.along
    for (const { form, middle } of withAxis) {
      const sides = [-450, 450].map((across) =>
        heightAt([middle[0] + north * across, middle[1] - east * across]),
      )
      const core = heightAt(middle)
      if (form === 'anticline') expect(core).toBeLessThan(Math.min(...sides))
      else expect(core).toBeGreaterThan(Math.max(...sides))
    }
  })

  it('close down-plunge: along every axis, younger rock follows in the direction of its trend', () => {
    for (const { line } of withAxis) {
      const [up, down] = [line[0], line.at(-1)]
      expect(up && down && heightAt(down) > heightAt(up)).toBe(true)
    }
  })

  it('have axes along which layer and hinge surface both keep their value', () => {
    for (const { middle, trend, plunge } of withAxis) {
      const grid = toRadians(trend - convergenceAt([middle[0] + origin[0], middle[1] + origin[1]]))
      const block = truth.onGround.blockAt(middle)
      const z = truth.ground(middle)
      const level = Math.cos(toRadians(plunge))
      const moved: XY = [middle[0] + Math.sin(grid) * level, middle[1] + Math.cos(grid) * level]
      const down = z - Math.sin(toRadians(plunge))
      const change = truth.field.height(moved, down, block) - truth.field.height(middle, z, block)
      const gradient = Math.hypot(...truth.field.gradient(middle, z, block))
      expect(Math.abs(change) / gradient).toBeLessThan(Math.sin(toRadians(0.8)))
    }
  })
})

describe('the fault of the demo', () => {
  it('has younger rock on its right, the down-thrown side', () => {
    for (const { geometry, properties } of sheet.faults) {
      expect(properties.side).toBe('right')
      const line = geometry.coordinates.map(fromCorner)
      const [from, to] = [line[0], line[1]]
      if (!from || !to) throw new RangeError('A fault has two vertices.')
      const length = Math.hypot(to[0] - from[0], to[1] - from[1])
      const right: XY = [(to[1] - from[1]) / length, -(to[0] - from[0]) / length]
      const middle: XY = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
      const beside = (metres: number): number => {
        const at: XY = [middle[0] + right[0] * metres, middle[1] + right[1] * metres]
        return truth.onGround.height(truth.onGround.blockAt(at))(at)
      }
      expect(beside(5) - beside(-5)).toBeGreaterThan(300)
    }
  })
})
