import type { Crs } from '@shared/api/sheets'
import { get, type Projection } from 'ol/proj'
import { register } from 'ol/proj/proj4'
import proj4 from 'proj4'

/** The sheet's projected system as OpenLayers' own object, so that view and pointer speak sheet metres. */
export function viewProjection(crs: Crs): Projection {
  const code = `EPSG:${crs.srid}`
  proj4.defs(code, crs.proj4)
  register(proj4)
  const projection = get(code)
  if (!projection) throw new RangeError(`The projection ${code} could not be set up.`)
  return projection
}
