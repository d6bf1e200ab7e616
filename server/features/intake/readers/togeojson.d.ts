/** The one function used of @mapbox/togeojson, which ships no types. It asks nothing of a document but its elements. */
declare module '@mapbox/togeojson' {
  import type { Feature } from 'geojson'
  import type { Element } from '@xmldom/xmldom'

  const toGeoJSON: {
    kml(document: { getElementsByTagName(name: string): readonly Element[] }): {
      features: Pick<Feature, 'geometry' | 'properties'>[]
    }
  }
  export default toGeoJSON
}
