import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { gridAzimuth } from '@shared/geometry/bearings'
import { locationConfidences } from '@shared/items/confidence'
import { itemSchema, type LineItem } from '@shared/items/item'
import { otherSide, reversedSide, type AxialTraceProperties, type FaultProperties } from '@shared/items/lines'
import { cutDashes } from '@shared/symbols/dashes'
import type { DisplayList, StrokeMark, TextMark } from '@shared/symbols/display-list'
import { drawItem, lineSymbols } from '@shared/symbols/draw-item'
import { flatten } from '@shared/symbols/paths'
import { boundsOf, inkPoints } from '@shared/symbols/place-marks'
import { normalizeAzimuth, type MM } from '@shared/units'
import { aWalk } from '../../../support/arbitrary-lines'
import { plainFrame } from '../../../support/drawn-items'

const id = '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e01'

/** A line item of each symbol, with everything said of it that its symbol may show. */
const aLineItem = (line = aWalk()): fc.Arbitrary<LineItem> =>
  fc
    .record({
      symbol: fc.constantFrom(...lineSymbols),
      coordinates: line,
      side: fc.constantFrom('left', 'right'),
      locationConfidence: fc.constantFrom(...locationConfidences),
      identity: fc.constantFrom('certain', 'questionable'),
      angle: fc.integer({ min: 1, max: 90 }),
      off: fc.oneof(fc.integer({ min: -25, max: 25 }), fc.integer({ min: 155, max: 205 })),
      doubly: fc.constantFrom('no', 'outward', 'inward'),
    })
    .map(({ symbol, coordinates, side, locationConfidence, identity, angle, off, doubly }) => {
      // Along the trace, one way or the other, or a little across it.
      const trend = normalizeAzimuth(
        gridAzimuth(coordinates[0] ?? [0, 0], coordinates.at(-1) ?? [0, 0]) + off,
      )
      const { kind, variant } = symbol
      const own = {
        contact: {},
        'other-line': { type: variant },
        fault: { type: variant, side, dip: variant === 'rotational' ? null : angle },
        'axial-trace': { form: variant, side, plunge: angle, trend, doubly },
      }[kind]
      return itemSchema.parse({
        kind,
        id,
        geometry: { type: 'LineString', coordinates: grid(coordinates) },
        properties: { locationConfidence, identity, ...own },
      }) as LineItem // lines only: the kinds above
    })

/** Sheet coordinates are kept to the millimetre. */
const grid = (line: readonly MM[]): MM[] =>
  line.map(([x, y]) => [Math.round(x * 1000) / 1000, Math.round(y * 1000) / 1000])

/** The same ground, drawn the other way. */
function turned(item: LineItem): LineItem {
  const geometry = { ...item.geometry, coordinates: item.geometry.coordinates.toReversed() }
  if (item.kind === 'fault') {
    const properties: FaultProperties = { ...item.properties, side: reversedSide(item.properties) }
    return { ...item, geometry, properties }
  }
  if (item.kind === 'axial-trace') {
    const properties: AxialTraceProperties = { ...item.properties, side: otherSide(item.properties.side) }
    return { ...item, geometry, properties }
  }
  return { ...item, geometry }
}

const textsOf = (list: DisplayList): TextMark[] => list.filter((mark) => mark.mark === 'text')
const boxOf = (list: DisplayList) => boundsOf(list) ?? { x: NaN, y: NaN, width: NaN, height: NaN }

describe('every line symbol', () => {
  it('looks the same on the ground when its line is turned round', () => {
    fc.assert(
      fc.property(aLineItem(aWalk({ turn: 25 })), (item) => {
        const [one, other] = [drawItem(item, plainFrame()), drawItem(turned(item), plainFrame())]
        const [box, turnedBox] = [boxOf(one), boxOf(other)]
        expect(other.length).toBe(one.length)
        for (const side of ['x', 'y', 'width', 'height'] as const) {
          expect(turnedBox[side]).toBeCloseTo(box[side], 4)
        }
        for (const mark of textsOf(one)) {
          const same = textsOf(other).some(
            ({ text, at }) => text === mark.text && Math.hypot(at[0] - mark.at[0], at[1] - mark.at[1]) < 1e-4,
          )
          expect(same, mark.text).toBe(true)
        }
      }),
    )
  })

  it('follows from the line and not from where the drawing begins: the same in every view, tile and print', () => {
    fc.assert(
      fc.property(aLineItem(), fc.integer({ min: -5e6, max: 5e6 }), (item, moved) => {
        const [here, there] = [plainFrame(), { ...plainFrame(), origin: [moved, -moved] as MM }]
        const [ink, inkThere] = [drawItem(item, here), drawItem(item, there)].map((list) =>
          list.flatMap((mark) => inkPoints([mark]).flatMap(({ points }) => points)),
        )
        expect(inkThere?.length).toBe(ink?.length)
        inkThere?.forEach(([x, y], index) => {
          expect(Math.abs(x + moved - (ink?.[index]?.[0] ?? NaN))).toBeLessThan(1e-6)
          expect(Math.abs(y - moved - (ink?.[index]?.[1] ?? NaN))).toBeLessThan(1e-6)
        })
      }),
    )
  })

  it('keeps its figures and question marks upright', () => {
    fc.assert(
      fc.property(aLineItem(), (item) => {
        for (const mark of drawItem(item, plainFrame())) {
          if (mark.mark === 'text') expect(mark.turn ?? 0).toBe(0)
        }
      }),
    )
  })

  it('begins and ends in a dash, whole where its dash is, and starts anew in a dash beside every question mark', () => {
    fc.assert(
      fc.property(aLineItem(aWalk({ steps: [10, 40], step: [1, 4], turn: 20 })), (item) => {
        const [stroke] = drawItem(item, plainFrame()).filter(
          (mark): mark is StrokeMark => mark.mark === 'stroke',
        )
        if (!stroke?.dash) return
        const [drawn = 0] = stroke.dash
        const runs = flatten(stroke.path)
        const dashes = flatten(cutDashes(stroke.path, stroke.dash))
        const isSame = (a: MM | undefined, b: MM | undefined): boolean =>
          a !== undefined && b !== undefined && Math.hypot(a[0] - b[0], a[1] - b[1]) < 1e-6
        for (const run of runs) {
          expect(dashes.some((dash) => isSame(dash[0], run[0]))).toBe(true)
          expect(dashes.some((dash) => isSame(dash.at(-1), run.at(-1)))).toBe(true)
        }
        const lengths = dashes.map((points) =>
          points
            .slice(1)
            .reduce(
              (sum, [x, y], at) => sum + Math.hypot(x - (points[at]?.[0] ?? x), y - (points[at]?.[1] ?? y)),
              0,
            ),
        )
        // Patterns are stretched or shrunk to fit, to half at the least; beside a question mark a dash may be shorter, no stub.
        expect(Math.min(...lengths)).toBeGreaterThan(Math.min(drawn / 2, 1) - 1e-9)
      }),
    )
  })
})

describe('symbol definitions', () => {
  const propertiesOf = {
    contact: ['locationConfidence', 'identity'],
    fault: ['locationConfidence', 'identity', 'side', 'dip'],
    'axial-trace': ['locationConfidence', 'identity', 'side', 'plunge', 'trend', 'doubly', 'otherPlunge'],
    'other-line': ['locationConfidence', 'identity'],
  }

  it('have one name each, and name the attributes that drive them', () => {
    expect(new Set(lineSymbols.map((symbol) => symbol.id)).size).toBe(lineSymbols.length)
    for (const symbol of lineSymbols) {
      expect(symbol.drivenBy.filter((name) => !propertiesOf[symbol.kind].includes(name))).toEqual([])
    }
  })

  it('refer to the published standard only where the number was read there', () => {
    // Source: symbolization.md section 2, the entries of FGDC-STD-013-2006 that were seen.
    const read = ['1.1.1', '1.1.2', '1.1.3', '1.1.4', '2.1.7', '2.2.1']
    const given = lineSymbols.flatMap(({ published = {} }) =>
      Object.values(published).map(({ number }) => number),
    )
    expect(given.filter((number) => !read.includes(number))).toEqual([])
    expect(given.length).toBeGreaterThan(0)
  })
})
