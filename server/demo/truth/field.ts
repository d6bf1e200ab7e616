import { toDegrees, toRadians, type Degrees, type Metres, type XY } from '@shared/units'
import { bisect, slope, type Surface } from './vectors'

/** Which side of the fault: the block that stayed, or the one that went down. */
export type Block = 'west' | 'east'

/** A direction or gradient in space: east, north, up. */
export type Vector3 = [east: number, north: number, up: number]

/** A hinge surface: the crest of an anticline or the trough of a syncline. */
export interface Hinge {
  form: 'anticline' | 'syncline'
  /** Where across the folds it lies, metres in `across`. */
  across: Metres
}

/** The folded layers of the demo. Places are metres from the sheet's south-west corner. Heights are stratigraphic: metres
 *  above a datum in the pile of layers, so that younger rock is higher; a contact is a surface of one height. */
export interface Field {
  height(xy: XY, z: Metres, block: Block): Metres
  gradient(xy: XY, z: Metres, block: Block): Vector3
  /** Place across the folds, leaned with the axial surfaces: constant on a hinge surface. */
  across(xy: XY, z: Metres, block: Block): Metres
  /** Positive on the down-thrown side of the fault. */
  fault(xy: XY, z: Metres): number
  hinges: readonly Hinge[]
  /** Unit vector down the fold axes on the grid. */
  along: XY
}

export interface FieldOptions {
  centre: XY
  /** Trend of the fold axes, grid degrees. */
  gridTrend: Degrees
  /** Vertical throw of the fault, metres. */
  throw: Metres
}

const wave = (at: number, length: number, phase = 0): number => Math.sin((2 * Math.PI * at) / length + phase)
const bump = (at: number, middle: number, width: number): number => Math.exp(-(((at - middle) / width) ** 2))

/** Where the folds lean so far that a limb is overturned, metres across. */
const OVERTURNED_AT: Metres = -1150

/** Height of the folded layers above their mean: asymmetrical waves, steeper on their west-north-west limbs. */
function foldHeight(across: Metres): Metres {
  const phase = (2 * Math.PI * across) / 3350 + 0.7 + 0.25 * wave(across, 8200)
  const amplitude = 540 * (1 + 0.18 * wave(across, 7400, 1)) + 170 * bump(across, OVERTURNED_AT, 900)
  return amplitude * (Math.cos(phase) - 0.13 * Math.sin(2 * phase))
}

/** Rise of the layers along the axes, whose slope is the plunge: 18° give or take 3. */
const plungeHeight = (along: Metres): Metres => along * Math.tan(toRadians(18)) + 61 * wave(along, 7000, 0.5)

/** How far axial surfaces move across per metre of height: they dip east-south-east. */
const lean = (across: Metres): number => 0.12 + 0.7 * bump(across, OVERTURNED_AT, 800)

/** The field of the demo. */
export function foldBelt({ centre, gridTrend, throw: drop }: FieldOptions): Field {
  const trend = toRadians(gridTrend)
  const [sin, cos] = [Math.sin(trend), Math.cos(trend)]
  const raised = (z: Metres, block: Block): Metres => (block === 'east' ? z + drop : z)
  const place = ([x, y]: XY): [along: Metres, across: Metres] => {
    const [dx, dy] = [x - centre[0], y - centre[1]]
    return [dx * sin + dy * cos, dx * cos - dy * sin]
  }
  const across: Field['across'] = (xy, z, block) => {
    const [along, straight] = place(xy)
    return straight + 75 * wave(along, 9000, 0.8) + lean(straight) * (raised(z, block) - 200)
  }
  const height: Field['height'] = (xy, z, block) =>
    raised(z, block) + plungeHeight(place(xy)[0]) - foldHeight(across(xy, z, block))
  return {
    height,
    across,
    gradient(xy, z, block) {
      const [east, north] = slope((at) => height(at, z, block), xy)
      const up = (height(xy, z + 0.05, block) - height(xy, z - 0.05, block)) / 0.1
      return [east, north, up]
    },
    fault: ([x, y], z) =>
      x - (7500 - 0.3 * (y - 5500) + 260 * wave(y, 9000, 0.6) + 60 * wave(y, 3100, 1)) + 0.15 * (z - 200),
    hinges: findHinges(),
    along: [sin, cos],
  }
}

/** Crests and troughs of the folds within ten kilometres of the middle. */
function findHinges(): Hinge[] {
  const steepness = (at: number): number => (foldHeight(at + 0.01) - foldHeight(at - 0.01)) / 0.02
  const hinges: Hinge[] = []
  for (let at = -10_000; at < 10_000; at += 50) {
    const [before, after] = [steepness(at), steepness(at + 50)]
    if (before > 0 === after > 0) continue
    // The layers arch up where the folds' height has its crest.
    hinges.push({ form: before > 0 ? 'anticline' : 'syncline', across: bisect(steepness, at, at + 50) })
  }
  return hinges
}

/** A field on the ground: what the map shows. */
export interface GroundField {
  height(block: Block): Surface
  across(block: Block): Surface
  fault: Surface
  blockAt(xy: XY): Block
}

export function onGround(field: Field, ground: Surface): GroundField {
  const fault: Surface = (xy) => field.fault(xy, ground(xy))
  return {
    height: (block) => (xy) => field.height(xy, ground(xy), block),
    across: (block) => (xy) => field.across(xy, ground(xy), block),
    fault,
    blockAt: (xy) => (fault(xy) > 0 ? 'east' : 'west'),
  }
}

/** Grid strike by the right-hand rule, dip and facing of the layer whose height has this gradient, degrees.
 *  The upward normal of a plane leans toward its dip direction. */
export function planeOfGradient([east, north, up]: Vector3): {
  gridStrike: Degrees
  dip: Degrees
  overturned: boolean
} {
  // The layer is overturned where its younger side faces down.
  const facing = up < 0 ? -1 : 1
  const dipDirection = toDegrees(Math.atan2(east * facing, north * facing))
  return {
    gridStrike: dipDirection - 90,
    dip: toDegrees(Math.atan2(Math.hypot(east, north), up * facing)),
    overturned: up < 0,
  }
}
