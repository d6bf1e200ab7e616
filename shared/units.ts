/** Units as names in signatures. They are plain numbers: the name says what the number means. */

/** Degrees of arc. */
export type Degrees = number
/** Radians of arc; only inside a function, never at a border. */
export type Radians = number
/** Degrees clockwise from true north, 0 ≤ a < 360, unless the name says grid or magnetic. */
export type Azimuth = number
/** Metres; in `xy` pairs, sheet metres (east, north) in the sheet's projected CRS. */
export type Metres = number
/** Millimetres on the printed sheet. */
export type Millimetres = number

/** Sheet metres: east, north in the sheet's projected CRS. */
export type XY = [east: Metres, north: Metres]
/** WGS 84 degrees: longitude, latitude. */
export type LonLat = [lon: Degrees, lat: Degrees]
/** Millimetres on the page: x to the right, y up. */
export type MM = [x: Millimetres, y: Millimetres]

export const toRadians = (degrees: Degrees): Radians => (degrees * Math.PI) / 180
export const toDegrees = (radians: Radians): Degrees => (radians * 180) / Math.PI

/** The same direction as a number of degrees with 0 ≤ a < 360. */
export function normalizeAzimuth(degrees: Degrees): Azimuth {
  const turned = degrees % 360
  // The second remainder removes -0 and the 360 that adding to a tiny negative number rounds to.
  return ((turned < 0 ? turned + 360 : turned) % 360) + 0
}

/** Smallest angle between two directions, degrees, 0–180. */
export function angleBetween(a: Degrees, b: Degrees): Degrees {
  const turn = Math.abs(normalizeAzimuth(a) - normalizeAzimuth(b))
  return turn > 180 ? 360 - turn : turn
}
