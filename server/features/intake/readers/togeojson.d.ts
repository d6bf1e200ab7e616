/** The two functions used of @mapbox/togeojson, which ships no types. They ask nothing of a document but its elements. */
declare module '@mapbox/togeojson' {
  import type { Feature } from 'geojson'
  import type { Element } from '@xmldom/xmldom'

  type Read = (document: { getElementsByTagName(name: string): readonly Element[] }) => {
    features: Pick<Feature, 'geometry' | 'properties'>[]
  }
  const toGeoJSON: { kml: Read; gpx: Read }
  export default toGeoJSON
}
