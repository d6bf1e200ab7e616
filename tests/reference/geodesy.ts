/** Convergence of WGS 84 UTM grids. Source: PROJ 9.1.1 through pyproj 3.4.1 and GeographicLib 2.1.2, which agree to
 *  1e-9°; reference/geodesy.md section 3. */
export const utmConvergence: {
  lat: number
  lon: number
  zone: string
  east: number
  north: number
  convergence: number
}[] = [
  { lat: 45, lon: 3, zone: '31', east: 500000, north: 4982950.4002, convergence: 0 },
  { lat: 45, lon: 6, zone: '31', east: 736446.0261, north: 4987329.5047, convergence: 2.122299717 },
  { lat: 45, lon: 0, zone: '31', east: 263553.9739, north: 4987329.5047, convergence: -2.122299717 },
  { lat: 60, lon: 6, zone: '31', east: 667294.8211, north: 6655205.4836, convergence: 2.598672694 },
  { lat: 70, lon: 0, zone: '31', east: 385526.2853, north: 7768690.1088, convergence: -2.819379827 },
  { lat: 80, lon: 5.9, zone: '31', east: 556196.0568, north: 8882986.6962, convergence: 2.856016033 },
  {
    lat: -23.5,
    lon: 5.5,
    zone: '31 +south',
    east: 755306.0791,
    north: 7398906.6689,
    convergence: -0.99741412,
  },
  { lat: -38, lon: 0.4, zone: '31 +south', east: 271707.8081, north: 5790994.7483, convergence: 1.601410948 },
  { lat: 47.62, lon: -122.35, zone: '10', east: 548841.98, north: 5274270.8638, convergence: 0.480158381 },
  { lat: 40.015, lon: -105.27, zone: '13', east: 476957.9099, north: 4429456.9832, convergence: -0.17360756 },
]

/** PROJ's name for a zone of the list. */
export const utmDefinition = (zone: string): string =>
  `+proj=utm +zone=${zone} +datum=WGS84 +units=m +no_defs`

/** Magnetic azimuths with declination and convergence, and the same direction from true and grid north.
 *  Source: computed in reference/geodesy.md section 1 from the sign rules stated there. */
export const northConversions = [
  { magnetic: 100, declination: 12.5, convergence: 2.122299717, true: 112.5, grid: 110.377700283 },
  { magnetic: 355, declination: -9.75, convergence: -2.819379827, true: 345.25, grid: 348.069379827 },
  { magnetic: 10, declination: -14.2, convergence: 1.601410948, true: 355.8, grid: 354.198589052 },
  { magnetic: 222, declination: 3, convergence: -0.17360756, true: 225, grid: 225.17360756 },
]

/** Zones of places, with the exceptions of south-west Norway and Svalbard.
 *  Source: zone rules of reference/geodesy.md section 3, which names several stored libraries. */
export const utmZones: [lon: number, lat: number, zone: number][] = [
  [-180, 0, 1],
  [180, 0, 60],
  [-174.0001, 10, 1],
  [-174, 10, 2],
  [-0.001, 51, 30],
  [0, 51, 31],
  [6, 45, 32],
  [2.999, 60, 31],
  [3, 60, 32],
  [3, 55.999, 31],
  [3, 64, 31],
  [11.999, 63.999, 32],
  [12, 60, 33],
  [8.999, 78, 31],
  [9, 78, 33],
  [20.999, 78, 33],
  [21, 78, 35],
  [32.999, 78, 35],
  [33, 78, 37],
  [41.999, 84, 37],
  [42, 78, 38],
  [9, 71.999, 32],
]
