/** The two functions used of shpjs, which ships no types. Both throw at what they cannot read. */
declare module 'shpjs' {
  import type { Geometry } from 'geojson'

  /** Shapes in order; null for a null shape. Without a projection, coordinates as they stand in the file. */
  export function parseShp(bytes: Uint8Array): (Geometry | null)[]
  /** Rows in order. */
  export function parseDbf(bytes: Uint8Array, encoding?: Uint8Array): Record<string, unknown>[]
}
