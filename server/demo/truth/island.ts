import { toRadians, type Degrees, type Metres, type XY } from '@shared/units'
import {
  asymmetricalWaves,
  bumpCurve,
  constant,
  levelledAt,
  sumOf,
  troughCurve,
  waveCurve,
  type Curve,
} from './curves'
import { foldAxes, foldBelt, type FoldAxes, type FoldBelt, type SpaceField, type Vector3 } from './fold-belt'

/** Which side of the Cormorant fault: the block that stayed, or the one that went down. */
export type Side = 'west' | 'east'
/** What a place belongs to: the folded rock below or above the thrust, or the younger beds on both. */
export type Series = 'lower' | 'upper' | 'younger'

/** The rocks of the island, known everywhere. Places are metres from the island's origin. Heights are stratigraphic: metres
 *  above a datum in the pile of layers, so that younger rock is higher; a contact is a surface of one height. */
export interface Island {
  axes: FoldAxes
  /** Stratigraphic height of a series on one side of the fault; of the younger beds, above their base. */
  height(series: Series, side: Side): SpaceField
  /** Hinges of a folded series on one side of the fault. */
  belt(series: 'lower' | 'upper', side: Side): FoldBelt
  /** Positive in the hanging wall of the normal fault, which is its east side. */
  fault: SpaceField
  /** Positive above the thrust, in its upper plate. */
  thrust(side: Side): SpaceField
  /** Upright surfaces that dikes fill: zero on the dike. */
  dikes: readonly Dike[]
}

export interface Dike {
  name: string
  surface: SpaceField
  /** Positive along the part that is filled. */
  extent(xy: XY): number
}

/** Middle of the sheet MI-14, about which the folds are laid out. */
const MIDDLE: XY = [5000, 5500]
/** The fault goes down the dip of its plane: heave to the east, throw downward. */
const THROW: Metres = 330
const FAULT_DIP: Degrees = 68
/** Dip of the thrust, degrees. */
const THRUST_DIP: Degrees = 31

/** A field moved by a displacement: what is at p came from p − displacement. */
const moved = (field: SpaceField, [east, north, up]: Vector3): SpaceField => ({
  value: ([x, y], z) => field.value([x - east, y - north], z - up),
  gradient: ([x, y], z) => field.gradient([x - east, y - north], z - up),
})

/** The axes plunge to both sides of a culmination in the south, and a little unevenly. */
const plunge = (): Curve =>
  levelledAt(sumOf(troughCurve(Math.tan(toRadians(18)), -9000, 3500), waveCurve(52, 7100, 0.5)), 0)

/** Folds below the thrust: open, wider toward the coast. */
function lowerBelt(axes: FoldAxes): FoldBelt {
  const height = sumOf(constant(470), waveCurve(70, 7700, 2.2), bumpCurve(150, -3300, 1500))
  return foldBelt({
    axes,
    profile: asymmetricalWaves(3650, 0.35, 0.1, height),
    strength: sumOf(constant(1), waveCurve(0.2, 8300, 1.1)),
    plunge: plunge(),
    wander: sumOf(waveCurve(210, 8700, 0.6), waveCurve(60, 3900)),
    lean: constant(0.14),
    offset: 0,
    reach: [-120_000, 6000],
  })
}

/** Where the front of the upper plate is overturned, metres across. */
const OVERTURNED_AT: Metres = -1900

/** Folds above the thrust: closer, the foremost one pushed over, the others leaning less and less. */
function upperBelt(axes: FoldAxes): FoldBelt {
  const height = sumOf(constant(520), waveCurve(85, 7400, 1), bumpCurve(310, OVERTURNED_AT, 1050))
  return foldBelt({
    axes,
    profile: asymmetricalWaves(3250, 3.4, 0.13, height),
    strength: sumOf(constant(1), waveCurve(0.12, 7900, 2.6)),
    plunge: plunge(),
    wander: sumOf(waveCurve(190, 9000, 1.3), waveCurve(55, 4100)),
    lean: sumOf(constant(0.1), bumpCurve(0.76, OVERTURNED_AT, 1150)),
    offset: -720,
    reach: [-9000, 120_000],
  })
}

/** The younger beds rest on a worn surface that dips north-east, less and less, into a shallow trough. */
function youngerBeds(): SpaceField {
  const [east, north] = [Math.SQRT1_2, Math.SQRT1_2]
  const [startX, startY, startZ] = [8300, 6100, 440]
  const down = ([x, y]: XY): Metres => (x - startX) * east + (y - startY) * north
  const [steepness, flattening] = [0.075, 1 / 46_000]
  return {
    value(xy, z) {
      const from = down(xy)
      return z - startZ + steepness * from - 0.5 * flattening * from * from
    },
    gradient(xy) {
      const slope = steepness - flattening * down(xy)
      return [slope * east, slope * north, 1]
    },
  }
}

/** A surface that dips to one side of a bent trace: value = distance beyond the trace − (level − z) / tan dip, scaled to
 *  metres of height. */
function dippingSurface(axes: FoldAxes, trace: Curve, dip: Degrees, level: Metres): SpaceField {
  const steepness = Math.tan(toRadians(dip))
  const [sin, cos] = axes.along
  return {
    value(xy, z) {
      const [along, across] = axes.toOwn(xy)
      return z - level + (across - trace.value(along)) * steepness
    },
    gradient(xy) {
      const [along] = axes.toOwn(xy)
      const bend = trace.slope(along)
      return [(cos - bend * sin) * steepness, (-sin - bend * cos) * steepness, 1]
    },
  }
}

/** The normal fault, in axes that run along it: north by a little west. */
function normalFault(): { surface: SpaceField; displacement: Vector3 } {
  const strike = toRadians(-14)
  const axes = foldAxes([7650, 5500], strike)
  const trace = sumOf(waveCurve(230, 9400, 0.9), waveCurve(55, 3100, 1))
  const surface = dippingSurface(axes, trace, FAULT_DIP, 250)
  const heave = THROW / Math.tan(toRadians(FAULT_DIP))
  return { surface, displacement: [heave * Math.cos(strike), -heave * Math.sin(strike), -THROW] }
}

/** A dike along a straight, upright plane, from one end to the other. */
function dike(name: string, from: XY, to: XY): Dike {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1])
  const [east, north] = [(to[0] - from[0]) / length, (to[1] - from[1]) / length]
  const along = ([x, y]: XY): Metres => (x - from[0]) * east + (y - from[1]) * north
  const bend = waveCurve(34, 2600, 0.7)
  return {
    name,
    extent: (xy) => Math.min(along(xy), length - along(xy)),
    surface: {
      value: (xy) => (xy[0] - from[0]) * north - (xy[1] - from[1]) * east - bend.value(along(xy)),
      gradient(xy) {
        const turn = bend.slope(along(xy))
        return [north - turn * east, -east - turn * north, 0]
      },
    },
  }
}

/** Merrow Island. @param gridTrend trend of the fold axes, degrees from grid north */
export function merrowIsland(gridTrend: Degrees): Island {
  const axes = foldAxes(MIDDLE, toRadians(gridTrend))
  const belts = { lower: lowerBelt(axes), upper: upperBelt(axes) }
  const younger = youngerBeds()
  const { surface: fault, displacement } = normalFault()
  const thrust = dippingSurface(
    axes,
    sumOf(constant(-2900), waveCurve(190, 8100, 2.3), waveCurve(70, 3700)),
    THRUST_DIP,
    200,
  )
  const onSide = (field: SpaceField, side: Side): SpaceField =>
    side === 'east' ? moved(field, displacement) : field
  return {
    axes,
    height: (series, side) => onSide(series === 'younger' ? younger : belts[series].height, side),
    belt: (series, side) => ({
      ...belts[series],
      height: onSide(belts[series].height, side),
      across: onSide(belts[series].across, side),
    }),
    fault,
    thrust: (side) => onSide(thrust, side),
    dikes: [
      dike('Lantern dike', [1250, 6650], [6600, 3350]),
      dike('Samphire dike', [-3900, 3300], [-300, 900]),
      dike('Dulse dike', [3300, -1300], [7900, -4200]),
    ],
  }
}
