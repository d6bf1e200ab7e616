import { writeArrayBuffer } from 'geotiff'
import type { Metres } from '@shared/units'
import { fromIsland, islandSrid } from './merrow-island'
import type { Extent } from './truth/lattice'
import type { Surface } from './truth/vectors'

/** Side of a pixel, metres: a fifth of the shortest valley. */
export const TERRAIN_PIXEL: Metres = 20
/** The model reaches beyond the neatline, so that slopes at the edge can be taken. */
export const TERRAIN_MARGIN: Metres = 200

/** An elevation model as GeoTIFF: 32-bit heights above sea of pixel middles, metres, from the north-west; the sea floor is
 *  below zero. Source: OGC GeoTIFF 1.1, keys GTModelType, GTRasterType and ProjectedCRS. */
export function terrainFile(ground: Surface, { origin, width, height }: Extent): Buffer {
  const [west, north] = [origin[0] - TERRAIN_MARGIN, origin[1] + height + TERRAIN_MARGIN]
  const columns = Math.round((width + 2 * TERRAIN_MARGIN) / TERRAIN_PIXEL)
  const rows = Math.round((height + 2 * TERRAIN_MARGIN) / TERRAIN_PIXEL)
  const heights = new Float32Array(columns * rows)
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      heights[row * columns + column] = ground([
        west + (column + 0.5) * TERRAIN_PIXEL,
        north - (row + 0.5) * TERRAIN_PIXEL,
      ])
    }
  }
  const [east, top] = fromIsland([west, north])
  const written = writeArrayBuffer(heights, {
    width: columns,
    height: rows,
    ModelPixelScale: [TERRAIN_PIXEL, TERRAIN_PIXEL, 0],
    ModelTiepoint: [0, 0, 0, east, top, 0],
    GTModelTypeGeoKey: 1,
    GTRasterTypeGeoKey: 1,
    ProjectedCSTypeGeoKey: islandSrid,
    GeogCitationGeoKey: 'WGS 84',
    BitsPerSample: [32],
    SampleFormat: [3],
  })
  return Buffer.from(written)
}
