import { describe, expect, it } from 'vitest'
import type { FaultProperties } from '@shared/items/lines'
import { drawItem } from '@shared/symbols/draw-item'
import type { DisplayList, Mark } from '@shared/symbols/display-list'
import { cutDashes } from '@shared/symbols/dashes'
import { flatten } from '@shared/symbols/paths'
import { inkPoints } from '@shared/symbols/place-marks'
import type { MM, XY } from '@shared/units'
import { aDrawnContact, aDrawnFault, plainFrame, straight, waving } from '../../../support/drawn-items'

const azimuths = Array.from({ length: 72 }, (_, index) => index * 5)

const draw = (line: XY[], properties: Partial<FaultProperties>) =>
  drawItem(aDrawnFault(line, properties), plainFrame())

/** Marks other than the line itself, which comes first. */
const decorationsOf = (list: DisplayList): Mark[] => list.slice(1).filter((mark) => mark.mark !== 'text')

/** Mean of a mark's points, each place counted once: outlines come back to where they began. */
const centre = (mark: Mark): MM => {
  const all = inkPoints([mark]).flatMap(({ points }) => points)
  const points = [
    ...new Map(all.map((point) => [point.map((value) => value.toFixed(9)).join(), point])).values(),
  ]
  const sum = points.reduce(([x, y], [px, py]): MM => [x + px, y + py], [0, 0])
  return [sum[0] / points.length, sum[1] / points.length]
}

/** How far left of a straight line through the origin a place is. */
const leftOf = ([x, y]: MM, azimuth: number): number => {
  const turn = (azimuth * Math.PI) / 180
  return -x * Math.cos(turn) + y * Math.sin(turn)
}

describe.each(['normal', 'reverse', 'thrust'] as const)('the decoration of a %s fault', (type) => {
  it('stands on the stated side, all round the compass', () => {
    for (const azimuth of azimuths) {
      for (const side of ['left', 'right'] as const) {
        const marks = decorationsOf(draw(straight(azimuth, 40), { type, side }))
        expect(marks.length).toBeGreaterThan(0)
        for (const mark of marks) {
          const left = leftOf(centre(mark), azimuth)
          expect(side === 'left' ? left : -left).toBeGreaterThan(0.3)
        }
      }
    }
  })

  it('stays where it is on the ground when the line is reversed and its side swapped', () => {
    for (const azimuth of azimuths) {
      const line = waving(azimuth, 80)
      const places = (list: DisplayList) =>
        decorationsOf(list)
          .map(centre)
          .map(([x, y]) => `${(x + 1e-12).toFixed(6)} ${(y + 1e-12).toFixed(6)}`)
          .toSorted()
      expect(places(draw(line.toReversed(), { type, side: 'left' }))).toEqual(
        places(draw(line, { type, side: 'right' })),
      )
    }
  })
})

describe('a thrust', () => {
  it('points its teeth away from the line', () => {
    for (const mark of decorationsOf(draw(straight(0, 40), { type: 'thrust', side: 'right' }))) {
      const xs = inkPoints([mark]).flatMap(({ points }) => points.map(([x]) => x))
      // On a line to the north the right side is east: the foot lies at the line, one point beyond.
      expect(new Set(xs.filter((x) => x > 0.3)).size).toBe(1)
      expect(Math.max(...xs)).toBeGreaterThan(1.5)
    }
  })
})

describe('a lateral fault', () => {
  /** East component of the arrow head's way, by side of a line to the east, from the solid heads. */
  const heads = (type: 'left-lateral' | 'right-lateral', line: XY[]) => {
    const marks = draw(line, { type }).filter((mark) => mark.mark === 'fill')
    return Object.fromEntries(
      marks.map((mark) => {
        const points = inkPoints([mark])[0]?.points ?? []
        const way = (points[0]?.[0] ?? 0) - (points[1]?.[0] ?? 0)
        return [centre(mark)[1] > 0 ? 'north' : 'south', Math.sign(way)]
      }),
    )
  }

  it('moves its far side to the left or to the right of whoever looks across it', () => {
    const east = straight(90, 30)
    // Looking north across the fault, the far side is the northern one; right is east.
    expect(heads('right-lateral', east)).toEqual({ north: 1, south: -1 })
    expect(heads('left-lateral', east)).toEqual({ north: -1, south: 1 })
  })

  it('keeps its sense when the line is reversed', () => {
    const west = straight(90, 30).toReversed()
    expect(heads('right-lateral', west)).toEqual({ north: 1, south: -1 })
    expect(heads('left-lateral', west)).toEqual({ north: -1, south: 1 })
  })
})

describe.each(['approximate', 'inferred'] as const)('a dashed line located %s', (locationConfidence) => {
  it('carries each decoration on a dash, never over a gap', () => {
    for (let length = 20; length < 90; length += 3) {
      const list = draw(straight(90, length), { type: 'normal', locationConfidence })
      const [stroke, ...bars] = list.filter((mark) => mark.mark === 'stroke')
      const dashes = stroke?.dash ? flatten(cutDashes(stroke.path, stroke.dash)) : []
      expect(bars.length).toBeGreaterThan(0)
      for (const bar of bars) {
        const [foot = 0] = inkPoints([bar])[0]?.points[0] ?? []
        const carries = dashes.some(
          (dash) => (dash[0]?.[0] ?? 0) < foot - 0.5 && (dash.at(-1)?.[0] ?? 0) > foot + 0.5,
        )
        expect(carries, `a line of ${length} mm`).toBe(true)
      }
    }
  })
})

describe('questioned identity', () => {
  const queries = (list: DisplayList) => list.filter((mark) => mark.mark === 'text' && mark.text === '?')

  it('shows a query in the line, in a gap of its own, at intervals', () => {
    const list = drawItem(aDrawnContact(straight(90, 60), { identity: 'questionable' }), plainFrame())
    expect(queries(list).length).toBe(3)
    const [line] = inkPointsOfStroke(list)
    for (const mark of queries(list)) {
      const at = centre(mark)
      expect(
        line?.some(
          ({ points }) => points[0] && points[1] && points[0][0] < at[0] + 0.6 && points[1][0] > at[0] - 0.6,
        ),
      ).toBe(false)
    }
    expect(queries(drawItem(aDrawnContact(straight(90, 60)), plainFrame()))).toEqual([])
  })

  it('is never lost to decorations, however short the line', () => {
    for (let length = 3; length < 40; length++) {
      expect(
        queries(draw(straight(20, length), { type: 'thrust', identity: 'questionable' })).length,
      ).toBeGreaterThan(0)
    }
  })
})

describe('long lines', () => {
  it('are drawn in time proportional to their vertices', () => {
    const line = Array.from({ length: 100_000 }, (_, index): XY => [index / 100, Math.sin(index / 300)])
    const start = performance.now()
    draw(line, { type: 'thrust', locationConfidence: 'inferred', identity: 'questionable' })
    // Measured 30–60 ms; a time quadratic in the vertices would be minutes.
    expect(performance.now() - start).toBeLessThan(2000)
  })

  it('without length are not drawn', () => {
    expect(
      draw(
        [
          [1, 1],
          [1, 1],
        ],
        { type: 'normal' },
      ),
    ).toEqual([])
  })
})

const inkPointsOfStroke = (list: DisplayList) =>
  list.filter((mark) => mark.mark === 'stroke').map((mark) => inkPoints([mark]))
