import { toDegrees, type Degrees, type Metres, type XY } from '@shared/units'
import type { Vector3 } from './fold-belt'
import { planeOfGradient } from './planes'
import type { Random } from './random'
import { shuffled } from './random'
import type { Raster } from './raster'
import { rockAt, type Rock, type Truth } from './truth'

/** A place where something was measured or found, with the rock there. */
export interface Station {
  at: XY
  rock: Rock
}

/** What is measured at a station. */
export type Measured = 'bedding' | 'foliation' | 'cleavage' | 'joint'

/** Free places of a sheet: rock at the surface, clear of all lines. One place is given away once. */
export class FreePlaces {
  private readonly cells: readonly number[]
  private readonly taken = new Map<number, XY[]>()

  /** @param near cells beside lines or labels   @param clear distance from the edges of areas */
  constructor(
    private readonly truth: Truth,
    private readonly raster: Raster,
    near: Uint8Array,
    clear: Metres,
    random: Random,
    private readonly apart: Metres,
  ) {
    const { codes, depths, areas, cell } = raster
    const free: number[] = []
    for (let index = 0; index < codes.length; index++) {
      const isRock = areas[codes[index] ?? 0]?.isCover === false
      if (isRock && near[index] === 0 && (depths[index] ?? 0) * cell >= clear) free.push(index)
    }
    this.cells = shuffled(free, random)
  }

  /** Up to `wanted` places, apart from one another and from all given away before.
   *  @param units labels of the units in which they lie, if not in any   @param apart the usual distance, or less */
  take(wanted: number, { units, passes = () => true, apart = this.apart }: Wish = {}): Station[] {
    const { codes, areas, centreOf } = this.raster
    const found: Station[] = []
    for (const cell of this.cells) {
      if (found.length >= wanted) break
      if (units && !units.includes(areas[codes[cell] ?? 0]?.shows ?? '')) continue
      const at = centreOf(cell)
      if (this.isCrowded(at, apart)) continue
      const station = { at, rock: rockAt(this.truth, at) }
      if (!passes(station)) continue
      found.push(station)
      this.occupy(at)
    }
    return found
  }

  /** Keeps others away from a place. */
  occupy(at: XY): void {
    const [column, row] = this.squareOf(at)
    const key = keyOf(column, row)
    const others = this.taken.get(key)
    if (others) others.push(at)
    else this.taken.set(key, [at])
  }

  private isCrowded(at: XY, apart: Metres): boolean {
    const [column, row] = this.squareOf(at)
    for (const right of [-1, 0, 1]) {
      for (const up of [-1, 0, 1]) {
        const others = this.taken.get(keyOf(column + right, row + up))
        if (others?.some(([x, y]) => Math.hypot(x - at[0], y - at[1]) < apart)) return true
      }
    }
    return false
  }

  /** The square, as wide as places lie apart, that holds a place. */
  private squareOf([x, y]: XY): [column: number, row: number] {
    return [Math.floor(x / this.apart), Math.floor(y / this.apart)]
  }
}

/** What a station shall be like. */
export interface Wish {
  units?: readonly string[]
  passes?: (station: Station) => boolean
  apart?: Metres
}

/** One number for a square: rows are far fewer than a million. */
const keyOf = (column: number, row: number): number => column * 1_000_000 + row

/** Gradient of the layers at a station: the upward or downward normal of the bedding, toward the younger side. */
export const beddingNormal = ({ ground }: Truth, { at, rock }: Station): Vector3 =>
  rock.field.gradient(at, ground(at))

/** Normal of what is measured, and whether it has a younger side. Cleavage follows the axial surfaces, foliation the
 *  layers; joints stand across the fold axis. */
export function normalOf(truth: Truth, station: Station, measured: Measured): Vector3 {
  const { at, rock } = station
  const bedding = beddingNormal(truth, station)
  if (measured === 'bedding' || measured === 'foliation' || rock.series === 'younger') return bedding
  const across = truth.island.belt(rock.series, rock.side).across.gradient(at, truth.ground(at))
  return measured === 'cleavage' ? across : crossProduct(bedding, across)
}

/** Direction of the fold axis at a station: in the layer and in the axial surface; undefined in the younger beds. */
export function axisDirection(truth: Truth, { at, rock }: Station): Vector3 | undefined {
  if (rock.series === 'younger') return undefined
  const z = truth.ground(at)
  const belt = truth.island.belt(rock.series, rock.side)
  return crossProduct(belt.height.gradient(at, z), belt.across.gradient(at, z))
}

const crossProduct = ([a, b, c]: Vector3, [p, q, r]: Vector3): Vector3 => [
  b * r - c * q,
  c * p - a * r,
  a * q - b * p,
]

/** A direction as trend from grid north of its down-going end, and plunge, degrees. */
export function lineOf([east, north, up]: Vector3): { gridTrend: Degrees; plunge: Degrees } {
  const down = up > 0 ? -1 : 1
  return {
    gridTrend: toDegrees(Math.atan2(east * down, north * down)),
    plunge: toDegrees(Math.atan2(Math.abs(up), Math.hypot(east, north))),
  }
}

export const dipAt = (truth: Truth, station: Station): Degrees =>
  planeOfGradient(beddingNormal(truth, station)).dip
