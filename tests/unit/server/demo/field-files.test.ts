import { describe, expect, it } from 'vitest'
import { parseAttitude } from '@shared/structure/attitude-text'
import { demoFieldFiles } from '../../../../server/demo/field-files'

const files = demoFieldFiles()
const text = (name: string): string => files.find((file) => file.name === name)?.text ?? ''

interface Feature {
  properties: { strike?: number | null; dip?: number | null; type?: string }
  geometry: { type: string; coordinates: [number, number] }
}

describe('field files of the demo', () => {
  const { features }: { features: Feature[] } = JSON.parse(text('ridge-traverse.geojson'))

  it('hold points and lines in longitude and latitude, most of them on the sheet', () => {
    const points = features.filter((feature) => feature.geometry.type === 'Point')
    const onSheet = points.filter(({ geometry: { coordinates } }) => {
      const [lon, lat] = coordinates
      return lon > -29.9 && lon < -29.7 && lat > 47.6 && lat < 47.8
    })
    expect(onSheet.length).toBeGreaterThan(12)
    expect(points.length - onSheet.length).toBe(1)
    expect(features.some((feature) => feature.geometry.type === 'LineString')).toBe(true)
  })

  it('hold records that cannot be taken in: a dip of 95, none, and one far away', () => {
    expect(features.filter((feature) => feature.properties.dip === 95)).toHaveLength(1)
    expect(features.filter((feature) => feature.properties.dip === null)).toHaveLength(1)
  })

  it('write readings as quadrants that read back, but for two that do not', () => {
    const readings = [...text('valley-traverse.kml').matchAll(/name="attitude"><value>([^<]+)/g)].map(
      (match) => match[1] ?? '',
    )
    expect(readings.length).toBeGreaterThan(12)
    const refused = readings.filter((reading) => parseAttitude(reading, 'strike-dip').outcome === 'refused')
    expect(refused).toEqual(['N45E 40NE', 'see sketch'])
  })
})
