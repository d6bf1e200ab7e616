import { describe, expect, it } from 'vitest'
import { sheetProjection } from '@shared/geometry/projection'
import { drawSheetFrame, FRAME_GAP } from '@shared/sheet-face/graticule'
import { faceSize } from '@shared/sheet-face/page-layout'
import { sheetArea } from '@shared/sheets/sheet-area'
import type { DisplayList, Path } from '@shared/symbols/display-list'
import type { MM, XY } from '@shared/units'
import { utmConvergence, utmDefinition } from '../../../reference/geodesy'
import { rectangleRing, textsOf } from '../../../support/printed-sheet'

const UTM_26N = utmDefinition('26')

function frameOf(neatline: XY[], definition: string, scale: number): DisplayList {
  const projection = sheetProjection(definition)
  const origin = neatline[0] ?? [0, 0]
  return drawSheetFrame({ neatline }, projection, {
    origin,
    mmPerMetre: 1000 / scale,
    convergenceAt: projection.convergenceAt,
  })
}

const strokes = (list: DisplayList): Path[] =>
  list.flatMap((mark) => (mark.mark === 'stroke' ? [mark.path] : []))

const pointsOf = (path: Path): MM[] =>
  path.flatMap((step) => (step[0] === 'move' || step[0] === 'line' ? [[step[1], step[2]] as MM] : []))

/** Middles of the crosses: two strokes of one path, four points. */
const crossesOf = (list: DisplayList): MM[] =>
  strokes(list)
    .filter((path) => path.map((step) => step[0]).join() === 'move,line,move,line')
    .map((path) => {
      const [west, east] = pointsOf(path)
      return [((west?.[0] ?? 0) + (east?.[0] ?? 0)) / 2, west?.[1] ?? 0]
    })

describe('a rectangle on the grid', () => {
  const list = frameOf(rectangleRing(284_000, 5_278_000, 294_000, 5_289_000), UTM_26N, 24_000)

  it('sets a tick and its figure at exact millimetres: 1 km is 41.667 mm at 1:24 000', () => {
    const figure = textsOf(list).find((text) => text.text === '285')
    expect(figure?.at[0]).toBeCloseTo(41.667, 2)
    const ticks = strokes(list).filter((path) => Math.abs((pointsOf(path)[0]?.[0] ?? 0) - 41.667) < 0.01)
    expect(ticks).toHaveLength(2)
  })

  it('writes kilometres at top and left, the first with its direction', () => {
    const texts = textsOf(list).map((text) => text.text.replaceAll('\u00a0', ' '))
    expect(texts).toContain('284 km E')
    expect(texts).toContain('294')
    expect(texts).toContain('5278 km N')
    expect(texts).toContain('5289')
  })

  it('names latitude and longitude at the four corners', () => {
    const corners = textsOf(list).filter((text) => text.weight === 700)
    expect(corners).toHaveLength(8)
  })
})

describe('the graticule', () => {
  // Round latitudes and longitudes of the reference list, at 1:50 000 with crosses at multiples of 2.5 or 5 minutes.
  it.each(utmConvergence.filter(({ lat, lon }) => lat % 0.5 === 0 && lon % 0.5 === 0))(
    'crosses at $lat, $lon where PROJ has it',
    ({ zone, east, north }) => {
      const neatline = rectangleRing(
        Math.floor(east / 1000) * 1000 - 5000,
        Math.floor(north / 1000) * 1000 - 5000,
        Math.floor(east / 1000) * 1000 + 6000,
        Math.floor(north / 1000) * 1000 + 6000,
      )
      const [west, south] = neatline[0] ?? [0, 0]
      const expected: MM = [(east - west) / 50, (north - south) / 50]
      const distances = crossesOf(frameOf(neatline, utmDefinition(zone), 50_000)).map(([x, y]) =>
        Math.hypot(x - expected[0], y - expected[1]),
      )
      // A hundredth of a millimetre at 1:50 000 is half a metre; PROJ's values are given to a tenth of a millimetre.
      expect(Math.min(...distances)).toBeLessThan(0.0001)
    },
  )
})

describe('a sheet of degrees', () => {
  const projection = sheetProjection(utmDefinition('13'))
  const area = sheetArea(
    { by: 'degrees', west: -105.25, south: 40, east: -105.125, north: 40.125 },
    projection,
    utmDefinition('13'),
    24_000,
  )
  if (area.outcome === 'refused') throw new Error(area.reason)
  const { neatline } = area
  const list = frameOf(neatline, utmDefinition('13'), 24_000)

  it('has the size of a 7.5-minute sheet at latitude 40', () => {
    // Source: reference/geodesy.md section 5, meridian and parallel arcs on the ellipsoid. The grid's own scale (0.9996 to
    // 1.0001) and its turn (0.07° here) change a side by less than 0.2 %.
    const { width, height } = faceSize(neatline, 24_000)
    expect(Math.abs(height / 578.31 - 1)).toBeLessThan(0.002)
    expect(Math.abs(width / 444.76 - 1)).toBeLessThan(0.002)
  })

  it('names its own round corners', () => {
    const texts = textsOf(list).map((text) => text.text.replaceAll('\u00a0', ' '))
    for (const figure of [`40°00'00" N`, `40°07'30" N`, `105°15'00" W`, `105°07'30" W`]) {
      expect(texts.filter((text) => text === figure)).toHaveLength(2)
    }
  })

  it('draws the outer line of the frame at one distance all the way round', () => {
    const [inner, outer] = strokes(list)
      .filter((path) => path.at(-1)?.[0] === 'close')
      .map(pointsOf)
    if (!inner || !outer) throw new Error('The frame has two lines.')
    for (const point of outer) expect(distanceToRing(point, inner)).toBeGreaterThan(FRAME_GAP - 1e-6)
    const middles = outer.map((point, index): MM => {
      const next = outer[(index + 1) % outer.length] ?? point
      return [(point[0] + next[0]) / 2, (point[1] + next[1]) / 2]
    })
    for (const point of middles) expect(distanceToRing(point, inner)).toBeCloseTo(FRAME_GAP, 3)
  })

  it('ticks grid lines only where they meet the frame', () => {
    const ring = neatline.map(([east, north]): MM => {
      const origin = neatline[0] ?? [0, 0]
      return [(east - origin[0]) / 24, (north - origin[1]) / 24]
    })
    const figures = textsOf(list).filter((text) => /^\d{3,4}(\.\d+)?$/.test(text.text))
    expect(figures.length).toBeGreaterThan(15)
    for (const figure of figures) expect(distanceToRing(figure.at, ring)).toBeLessThan(6)
  })
})

function distanceToRing([x, y]: MM, ring: readonly MM[]): number {
  return Math.min(
    ...ring.map(([ax, ay], index) => {
      const [bx, by] = ring[(index + 1) % ring.length] ?? [ax, ay]
      const length = (bx - ax) ** 2 + (by - ay) ** 2
      const share =
        length === 0 ? 0 : Math.max(0, Math.min(1, ((x - ax) * (bx - ax) + (y - ay) * (by - ay)) / length))
      return Math.hypot(x - ax - share * (bx - ax), y - ay - share * (by - ay))
    }),
  )
}
