import type { StationType } from '@shared/items/points'
import type { Extent } from './lattice'
import type { Vector3 } from './fold-belt'
import { seededRandom } from './random'
import { axisDirection, beddingNormal, dipAt, type FreePlaces, type Measured, type Station } from './stations'
import type { Truth } from './truth'

/** What is measured on a sheet, and where. */
export interface Measurements {
  planes: { station: Station; type: Measured }[]
  lines: { station: Station; direction: Vector3; onPlane: boolean }[]
}

/** Units with a cleavage or foliation of their own, and what share of their stations measured it. */
const fabrics: Record<string, { type: Measured; share: number }> = {
  Ot: { type: 'cleavage', share: 0.4 },
  Dm: { type: 'cleavage', share: 0.25 },
  Ms: { type: 'cleavage', share: 0.2 },
  Zs: { type: 'foliation', share: 0.75 },
}
const JOINT_SHARE = 0.07

/** Level and upright beds, which are rare, before all others; then whatever there is, in the order of traverses. */
export function takeMeasured(
  truth: Truth,
  places: FreePlaces,
  { seed, attitudes, lineations }: { seed: number; attitudes: number; lineations: number },
): Measurements {
  const random = seededRandom(seed + 2)
  const rare = Math.min(5, Math.floor(attitudes / 40))
  const isFolded = ({ rock }: Station) => rock.series !== 'younger'
  const upright = places.take(rare, {
    passes: (station) => isFolded(station) && dipAt(truth, station) > 89.5,
  })
  const overturned = places.take(rare * 3, {
    passes: (station) => beddingNormal(truth, station)[2] < 0,
  })
  const level = places.take(rare, {
    passes: (station) => !isFolded(station) && dipAt(truth, station) < 0.5,
  })
  const lines = places.take(lineations, { passes: isFolded }).flatMap((station) => {
    const direction = axisDirection(truth, station)
    return direction ? [{ station, direction, onPlane: random() < 0.5 }] : []
  })
  const others = places
    .take(attitudes - upright.length - overturned.length - level.length)
    .map((station) => ({
      station,
      type: typeOf(station, random()),
    }))
  const bedding = [...upright, ...overturned, ...level].map((station) => ({
    station,
    type: 'bedding' as const,
  }))
  return { planes: inTraverses([...bedding, ...others]), lines }
}

function typeOf({ rock }: Station, chance: number): Measured {
  const fabric = fabrics[rock.layer.label]
  if (fabric) return chance < fabric.share ? fabric.type : 'bedding'
  return chance < JOINT_SHARE && rock.series !== 'younger' ? 'joint' : 'bedding'
}

/** As traverses go: in strips from west to east, each from south to north. */
const inTraverses = <T extends { station: Station }>(members: readonly T[]): T[] =>
  members.toSorted(
    ({ station: { at: a } }, { station: { at: b } }) =>
      Math.floor(a[0] / 2500) - Math.floor(b[0] / 2500) || a[1] - b[1],
  )

/** What is found on the island, and in which units. */
const finds: readonly {
  type: StationType
  units: readonly string[]
  per100Km2: number
  name: string
  note: string
}[] = [
  { type: 'sample', units: ['Ov', 'Oe', 'Sr', 'Df', 'Zs'], per100Km2: 7, name: 'S', note: 'thin section' },
  {
    type: 'fossil-locality',
    units: ['Sd', 'Dl', 'Jm', 'Kl'],
    per100Km2: 4,
    name: 'F',
    note: 'corals and shells',
  },
  { type: 'quarry', units: ['Dl', 'Op', 'Df'], per100Km2: 3, name: 'Q', note: 'disused' },
  { type: 'spring', units: ['Jm', 'Trt', 'Dm', 'Sc'], per100Km2: 4, name: 'W', note: '' },
  { type: 'borehole', units: ['Js', 'Sr', 'Oe'], per100Km2: 2, name: 'B', note: 'water, 60 m' },
  { type: 'mine-adit', units: ['Ms', 'Sc', 'Ov'], per100Km2: 1, name: 'A', note: 'abandoned, blocked' },
  { type: 'tops-direction', units: ['Df', 'Oe', 'Op'], per100Km2: 5, name: '', note: 'graded beds' },
]

export function takeFinds(places: FreePlaces, { width, height }: Extent) {
  const area = (width * height) / 1e8
  return finds.flatMap(({ type, units, per100Km2, name, note }) =>
    places
      .take(Math.round(per100Km2 * area), { units })
      .map((station, index) => ({ station, type, name: name && `${name}${index + 1}`, note })),
  )
}
