import proj4 from 'proj4'
import { normalizeAzimuth, toDegrees, type Degrees, type LonLat, type XY } from '../units'

/** A sheet's projected system, ready to use. */
export interface SheetProjection {
  /** Sheet metres → WGS 84 degrees. */
  toLonLat(xy: XY): LonLat
  /** WGS 84 degrees → sheet metres. */
  fromLonLat(lonLat: LonLat): XY
  /** Grid convergence at a point: azimuth of grid north measured from true north, clockwise positive, degrees.
   *  Grid azimuth = true azimuth − convergence. */
  convergenceAt(xy: XY): Degrees
}

/** A ten-thousandth of a minute of latitude, some 0.2 m: far above rounding, far below any change of convergence. */
const STEP_DEGREES = 1 / 600_000

/** The projection of a sheet from its PROJ definition (PostGIS's spatial_ref_sys holds them).
 *  Convergence is the grid direction of a short step to true north. Source: common practice; checked against PROJ. */
export function sheetProjection(proj4Definition: string): SheetProjection {
  const converter = proj4('EPSG:4326', proj4Definition)
  const toLonLat = (xy: XY): LonLat => converter.inverse(xy) as LonLat
  const fromLonLat = (lonLat: LonLat): XY => converter.forward(lonLat) as XY
  return {
    toLonLat,
    fromLonLat,
    convergenceAt(xy) {
      const [lon, lat] = toLonLat(xy)
      const south = fromLonLat([lon, lat - STEP_DEGREES])
      const north = fromLonLat([lon, lat + STEP_DEGREES])
      const trueNorthOnGrid = toDegrees(Math.atan2(north[0] - south[0], north[1] - south[1]))
      const convergence = normalizeAzimuth(-trueNorthOnGrid)
      return convergence > 180 ? convergence - 360 : convergence
    },
  }
}
