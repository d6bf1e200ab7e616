import type { Millimetres, MM } from '../../units'
import type { PlaceSymbol } from '../definition'
import type { Mark, Path, PathStep } from '../display-list'
import { circle, polyline } from '../paths'

const STROKE: Millimetres = 0.34

const line = (path: Path, width = STROKE): Mark => ({ mark: 'stroke', path, width, ink: 'black' })
const round = (path: Path, width = STROKE): Mark => ({ ...line(path, width), cap: 'round' }) as Mark
const solid = (path: Path): Mark => ({ mark: 'fill', path, ink: 'black' })

/** A spiral about the place, from its heart outward. Source: Archimedes' spiral, r grows with the turn. */
function spiral(turns: number, radius: Millimetres): PathStep[] {
  const steps = Math.round(turns * 16)
  return polyline(
    Array.from({ length: steps + 1 }, (_, step): MM => {
      const [share, turn] = [step / steps, (step / 16) * 2 * Math.PI]
      return [share * radius * Math.cos(turn), share * radius * Math.sin(turn)]
    }),
  )
}

const BOREHOLE: Millimetres = 1.15
/** A quarter of a disc, between two axes. */
const quarter = (x: 1 | -1, y: 1 | -1): PathStep[] => {
  const h = BOREHOLE * (4 / 3) * (Math.SQRT2 - 1)
  return [
    ['move', 0, 0],
    ['line', x * BOREHOLE, 0],
    ['curve', x * BOREHOLE, y * h, x * h, y * BOREHOLE, 0, y * BOREHOLE],
    ['close'],
  ]
}

/** A pick: a shaft, and across its upper end a head bent a little. @param side toward which it leans */
const pick = (side: 1 | -1): Mark[] => [
  round(
    polyline([
      [-side * 1.35, -1.45],
      [side * 1.1, 1],
    ]),
  ),
  round(
    [
      ['move', side * 0.35, 1.5],
      ['curve', side * 0.8, 1.45, side * 1.55, 0.7, side * 1.6, 0.25],
    ],
    0.5,
  ),
]

/** Symbols of places. */
export const places: readonly PlaceSymbol[] = [
  {
    type: 'station',
    title: 'Station',
    drivenBy: [],
    marks: [line(circle([0, 0], 0.8), 0.24), solid(circle([0, 0], 0.26))],
  },
  {
    type: 'sample',
    title: 'Sample',
    drivenBy: [],
    marks: [
      solid(
        polyline(
          [
            [0, 1.25],
            [1.1, -0.7],
            [-1.1, -0.7],
          ],
          true,
        ),
      ),
    ],
  },
  {
    type: 'fossil-locality',
    title: 'Fossil locality',
    drivenBy: [],
    marks: [round(spiral(2.25, 1.5))],
  },
  {
    type: 'borehole',
    title: 'Borehole',
    drivenBy: [],
    marks: [line(circle([0, 0], BOREHOLE)), solid(quarter(1, 1)), solid(quarter(-1, -1))],
  },
  {
    type: 'spring',
    title: 'Spring',
    drivenBy: [],
    marks: [
      solid(circle([0, 0], 0.7)),
      round([
        ['move', 0.5, -0.3],
        ['curve', 1.2, -1.5, 1.4, 0.5, 2.1, -0.7],
        ['curve', 2.7, -1.8, 2.9, 0.1, 3.5, -1.1],
      ]),
    ],
  },
  { type: 'quarry', title: 'Quarry', drivenBy: [], marks: [...pick(1), ...pick(-1)] },
  {
    type: 'mine-adit',
    title: 'Mine adit',
    drivenBy: ['azimuth'],
    azimuth: 'Goes in toward',
    marks: [
      line([
        ...polyline([
          [0, 0],
          [0, 2.8],
        ]),
        ...polyline([
          [-1.25, -1.45],
          [0, 0],
          [1.25, -1.45],
        ]),
      ]),
    ],
  },
  {
    type: 'tops-direction',
    title: 'Tops direction',
    drivenBy: ['azimuth'],
    azimuth: 'Beds get younger toward',
    marks: [
      line([
        ...polyline([
          [-1.5, -0.7],
          [1.5, -0.7],
        ]),
        ...polyline([
          [-1.5, 0],
          [1.5, 0],
        ]),
        ...polyline([
          [0, 0],
          [0, 2.2],
        ]),
      ]),
      solid(
        polyline(
          [
            [0, 3.3],
            [0.75, 1.9],
            [-0.75, 1.9],
          ],
          true,
        ),
      ),
    ],
  },
]

/** How a missing azimuth is shown: the symbol upright, with this beside it. */
export const missingAzimuth = { text: '?', size: 2.3, weight: 700, gap: 0.45 } as const

/** How a unit's letters are set inside its areas: nine points, heavy, with paper round them on any fill. */
export const unitLabelType = { size: 3.2, weight: 900, halo: 0.4 } as const
