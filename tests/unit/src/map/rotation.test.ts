import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { sheetProjection } from '@shared/geometry/projection'
import { composeFace } from '@shared/sheet-face/compose-face'
import type { DisplayList, Path } from '@shared/symbols/display-list'
import { angleBetween, toDegrees, type Degrees, type XY } from '@shared/units'
import { Scene } from '@/map/scene'
import { utmConvergence, utmDefinition } from '../../../reference/geodesy'
import { aPrintedSheet, rectangleRing } from '../../../support/printed-sheet'
import { aPoint } from '../../../support/sheet-items'

/** A browser's path that remembers how it was drawn; happy-dom has none. */
class NotedPath {
  readonly steps: [number, number][] = []
  moveTo(x: number, y: number): void {
    this.steps.push([x, y])
  }
  lineTo(x: number, y: number): void {
    this.steps.push([x, y])
  }
  bezierCurveTo(): void {}
  closePath(): void {}
}

const globals = globalThis as { Path2D?: unknown }
const before = globals.Path2D
beforeAll(() => {
  globals.Path2D = NotedPath
})
afterAll(() => {
  globals.Path2D = before
})

const azimuthOf = ([a, b]: readonly (readonly [number, number])[]): Degrees =>
  a && b ? toDegrees(Math.atan2(b[0] - a[0], b[1] - a[1])) : NaN

/** The first stroke of a vertical bed's symbol is its strike line, drawn up the strike. */
const firstStroke = (list: DisplayList): Path | undefined => {
  for (const mark of list) {
    if (mark.mark === 'stroke') return mark.path
    if (mark.mark === 'group') return firstStroke(mark.marks)
  }
  return undefined
}
const pointsOf = (path: Path): [number, number][] =>
  path.flatMap((step) => (step[0] === 'move' || step[0] === 'line' ? [[step[1], step[2]]] : []))

/** Places where grid north is more than 2° from true north. Source: PROJ and GeographicLib, see reference/geodesy.ts. */
const places = utmConvergence.filter(({ convergence }) => Math.abs(convergence) > 2)

describe.each(places)('symbols at $lat°, $lon°, where convergence is $convergence°', (place) => {
  const { east, north, convergence } = place
  const proj4 = utmDefinition(place.zone)
  const sheet = aPrintedSheet({
    crs: { srid: 32631, name: 'WGS 84 / UTM zone 31N', proj4 },
    neatline: rectangleRing(east - 4000, north - 4000, east + 4000, north + 4000),
  })
  const bed = (strike: Degrees) => aPoint('attitude', [east, north] as XY, { strike, dip: 90 })

  it.each([0, 45, 137, 200, 359])(
    'are turned by strike minus convergence on the map, strike %i°',
    (strike) => {
      const item = bed(strike)
      const scene = new Scene(sheet, sheetProjection(proj4))
      scene.setItems([item])
      const [step] = scene.drawingOf(item, 0).steps
      const path = step?.step === 'paint' ? (step.path as unknown as NotedPath) : undefined
      // 3e-6°: convergence is taken over a short chord, see projection.ts.
      expect(angleBetween(azimuthOf(path?.steps ?? []), strike - convergence)).toBeLessThan(3e-6)
    },
  )

  it.each([0, 45, 137, 200, 359])('and in the same way in print, strike %i°', (strike) => {
    const part = composeFace(sheet, [bed(strike)], [], 'colour').find(({ words }) => words === 'attitudes')
    const path = firstStroke(part?.draw() ?? [])
    expect(angleBetween(azimuthOf(pointsOf(path ?? [])), strike - convergence)).toBeLessThan(3e-6)
  })
})
