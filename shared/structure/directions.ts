import { toRadians, type Azimuth, type Degrees } from '../units'

/** Unit vector: east, north, up. */
export type Direction = readonly [east: number, north: number, up: number]

interface Line {
  trend: Azimuth | null
  plunge: Degrees
}
interface Plane {
  strike: Azimuth | null
  dip: Degrees
}

const sin = (degrees: Degrees): number => Math.sin(toRadians(degrees))
const cos = (degrees: Degrees): number => Math.cos(toRadians(degrees))

export const dot = (a: Direction, b: Direction): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]

/** Down along a line. Source: orientation.md section 2. */
export const lineDirection = ({ trend, plunge }: Line): Direction => [
  cos(plunge) * sin(trend ?? 0),
  cos(plunge) * cos(trend ?? 0),
  -sin(plunge),
]

/** Up along a plane's normal. Source: orientation.md section 2. */
export const poleDirection = ({ strike, dip }: Plane): Direction => [
  sin(dip) * cos(strike ?? 0),
  -sin(dip) * sin(strike ?? 0),
  cos(dip),
]

/** Along a plane's strike by the right-hand rule: a horizontal line. */
export const strikeDirection = ({ strike }: Pick<Plane, 'strike'>): Direction =>
  lineDirection({ trend: strike ?? 0, plunge: 0 })

/** Down a plane's dip: the line toward strike + 90 that plunges as the plane dips. Source: orientation.md section 1. */
export const dipDirection = ({ strike, dip }: Plane): Direction =>
  lineDirection({ trend: (strike ?? 0) + 90, plunge: dip })
