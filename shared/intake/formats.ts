/** Kinds of field file that are read, with what a person calls them and how their names end. */
export const formats = {
  geojson: { words: 'GeoJSON', endings: ['geojson', 'json'] },
  kml: { words: 'KML', endings: ['kml'] },
  kmz: { words: 'KMZ', endings: ['kmz'] },
  gpx: { words: 'GPX', endings: ['gpx'] },
  csv: { words: 'CSV', endings: ['csv', 'tsv', 'txt'] },
  shapefile: { words: 'Shapefile', endings: ['zip'] },
} as const satisfies Record<string, { words: string; endings: readonly string[] }>

export type Format = keyof typeof formats

export const formatNames = Object.keys(formats) as [Format, ...Format[]]

/** The kinds in a sentence: GeoJSON, KML, … and zipped shapefiles. */
export const formatsInWords = 'GeoJSON, KML, KMZ, GPX, CSV and zipped shapefiles'
