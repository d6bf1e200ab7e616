import type { Metres, XY } from '@shared/units'
import { bisect } from './vectors'
import type { Curve } from './curves'

/** A direction or gradient in space: east, north, up. */
export type Vector3 = readonly [east: number, north: number, up: number]

/** A function of the place in space, with its gradient. `xy` is metres from the island's origin, `z` height above sea. */
export interface SpaceField {
  value(xy: XY, z: Metres): number
  gradient(xy: XY, z: Metres): Vector3
}

/** A hinge surface: the crest of an anticline or the trough of a syncline. */
export interface Hinge {
  form: 'anticline' | 'syncline'
  /** Where across the folds it lies: the constant value of `across` on it, metres. */
  across: Metres
}

/** Folded layers: stratigraphic height, and the place across the folds that is constant on a hinge surface. */
export interface FoldBelt {
  height: SpaceField
  across: SpaceField
  hinges: readonly Hinge[]
}

export interface FoldBeltShape {
  /** Turns and shifts places on the island to the folds' own axes. */
  axes: FoldAxes
  /** Height of the layers above their mean, by place across the folds. */
  profile: Curve
  /** How much stronger or weaker the folds are along their axes, about 1; never zero. */
  strength: Curve
  /** Rise of the layers down the axes; its slope is the tangent of the plunge. */
  plunge: Curve
  /** Sideways wandering of the axes. */
  wander: Curve
  /** How far axial surfaces move across per metre of depth, by place across the folds. */
  lean: Curve
  /** Stratigraphic height that is added everywhere, metres. */
  offset: Metres
  /** Where across the folds hinges are looked for. */
  reach: readonly [from: Metres, to: Metres]
}

/** The folds' own axes: along them, down-plunge, and across them to the right of that. */
export interface FoldAxes {
  along: XY
  toOwn(xy: XY): readonly [along: Metres, across: Metres]
}

/** Height above sea at which a lean does not shift the folds. */
const LEAN_LEVEL: Metres = 200

/** Layers in similar folds: every layer is the one above it, moved along the axial surfaces. Height is
 *  z + plunge(along) − strength(along) · profile(across) + offset, where `across` is measured along leaned axial surfaces. */
export function foldBelt(shape: FoldBeltShape): FoldBelt {
  const { axes, profile, strength, plunge, wander, lean, offset } = shape
  const acrossOf = (along: Metres, straight: Metres, z: Metres): Metres =>
    straight + wander.value(along) + lean.value(straight) * (z - LEAN_LEVEL)
  const acrossSlope = (along: Metres, straight: Metres, z: Metres): Vector3 => [
    wander.slope(along),
    1 + lean.slope(straight) * (z - LEAN_LEVEL),
    lean.value(straight),
  ]
  const toGrid = ([along, across, up]: Vector3): Vector3 => {
    const [sin, cos] = axes.along
    return [along * sin + across * cos, along * cos - across * sin, up]
  }
  return {
    across: {
      value: (xy, z) => acrossOf(...axes.toOwn(xy), z),
      gradient: (xy, z) => toGrid(acrossSlope(...axes.toOwn(xy), z)),
    },
    height: {
      value(xy, z) {
        const [along, straight] = axes.toOwn(xy)
        const across = acrossOf(along, straight, z)
        return z + offset + plunge.value(along) - strength.value(along) * profile.value(across)
      },
      gradient(xy, z) {
        const [along, straight] = axes.toOwn(xy)
        const across = acrossOf(along, straight, z)
        const turn = acrossSlope(along, straight, z)
        const fall = strength.value(along) * profile.slope(across)
        return toGrid([
          plunge.slope(along) - strength.slope(along) * profile.value(across) - fall * turn[0],
          -fall * turn[1],
          1 - fall * turn[2],
        ])
      },
    },
    hinges: findHinges(profile, shape.reach),
  }
}

/** Step in which hinges are looked for: far shorter than any fold. */
const HINGE_STEP: Metres = 50

/** Crests and troughs of a profile. The layers arch up where it has its crest. */
function findHinges(profile: Curve, [from, to]: FoldBeltShape['reach']): Hinge[] {
  const steepness = (at: number): number => profile.slope(at)
  const hinges: Hinge[] = []
  for (let at = from; at < to; at += HINGE_STEP) {
    const [before, after] = [steepness(at), steepness(at + HINGE_STEP)]
    if (before > 0 === after > 0) continue
    hinges.push({
      form: before > 0 ? 'anticline' : 'syncline',
      across: bisect(steepness, at, at + HINGE_STEP),
    })
  }
  return hinges
}

/** The folds' axes about a middle. @param gridTrend radians clockwise from grid north */
export function foldAxes([middleX, middleY]: XY, gridTrend: number): FoldAxes {
  const [sin, cos] = [Math.sin(gridTrend), Math.cos(gridTrend)]
  return {
    along: [sin, cos],
    toOwn([x, y]) {
      const [dx, dy] = [x - middleX, y - middleY]
      return [dx * sin + dy * cos, dx * cos - dy * sin]
    },
  }
}
