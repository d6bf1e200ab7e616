import { toRadians, type Degrees, type Metres, type XY } from '@shared/units'
import type { Vector3 } from './fold-belt'
import { normal, type Random } from './random'

/** Errors of measuring in the field, standard deviations. */
export interface Noise {
  /** Tilt of a measured plane or line in each of two directions at right angles, degrees. */
  attitude: Degrees
  /** Error of a place in each of east and north, metres. */
  position: Metres
}

export const noNoise: Noise = { attitude: 0, position: 0 }

/** What compass and positioning receiver do on a good day. */
export const fieldNoise: Noise = { attitude: 2.5, position: 4 }

export const misplaced = ([x, y]: XY, { position }: Noise, random: Random): XY =>
  position === 0 ? [x, y] : [x + position * normal(random), y + position * normal(random)]

/** A direction tilted by normally distributed angles toward two directions at right angles to it; of unit length. */
export function tilted(direction: Vector3, { attitude }: Noise, random: Random): Vector3 {
  const length = Math.hypot(...direction)
  const [x, y, z] = direction.map((part) => part / length) as [number, number, number] // Three parts stay three.
  if (attitude === 0) return [x, y, z]
  const [u, v] = basisAcross([x, y, z])
  const [a, b] = [toRadians(attitude * normal(random)), toRadians(attitude * normal(random))]
  const angle = Math.hypot(a, b)
  const [cos, sin] = [Math.cos(angle), angle === 0 ? 0 : Math.sin(angle) / angle]
  return [
    x * cos + (u[0] * a + v[0] * b) * sin,
    y * cos + (u[1] * a + v[1] * b) * sin,
    z * cos + (u[2] * a + v[2] * b) * sin,
  ]
}

/** Two unit vectors at right angles to a unit vector and to one another. */
function basisAcross([x, y, z]: Vector3): [Vector3, Vector3] {
  const level = Math.hypot(x, y)
  const u: Vector3 = level < 1e-9 ? [1, 0, 0] : [-y / level, x / level, 0]
  return [u, [y * u[2] - z * u[1], z * u[0] - x * u[2], x * u[1] - y * u[0]]]
}
