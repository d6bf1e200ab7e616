import { describe, expect, it } from 'vitest'
import { read, reasonOf, recordsOf } from '../../../../../support/field-text'

const gpx = (inside: string) =>
  `<?xml version="1.0"?><gpx version="1.1" xmlns="http://www.topografix.com/GPX/1/1">${inside}</gpx>`
const way = (tag: string) => `<${tag} lat="45" lon="3"/><${tag} lat="45.1" lon="3.1"><ele>12</ele></${tag}>`

describe('GPX', () => {
  it('gives waypoints, routes and tracks, in this order and each with its texts', () => {
    const text = gpx(`
      <trk><name>Burn walk</name><trkseg>${way('trkpt')}</trkseg><trkseg>${way('trkpt')}</trkseg></trk>
      <rte><name>Way back</name>${way('rtept')}</rte>
      <wpt lat="45" lon="3"><ele>812</ele><name>K 7</name><desc>bedding 045/40</desc></wpt>`)
    expect(read(text, 'walk.gpx')).toMatchObject({ reader: 'gpx', notes: [] })
    const records = recordsOf(text)
    expect(records.map(({ number, parts }) => [number, ...parts.map(({ form }) => form)])).toEqual([
      [1, 'point'],
      [2, 'line'],
      [3, 'line', 'line'],
    ])
    expect(records.map(({ attributes }) => attributes)).toMatchObject([
      { name: 'K 7', desc: 'bedding 045/40', gpx: 'waypoint' },
      { name: 'Way back', gpx: 'route' },
      { name: 'Burn walk', gpx: 'track' },
    ])
    expect(records[0]?.parts[0]).toEqual({ form: 'point', position: [3, 45, 812] })
  })

  it('keeps a track of one place as a record without a line', () => {
    const text = gpx('<trk><name>Stub</name><trkseg><trkpt lat="45" lon="3"/></trkseg></trk>')
    expect(recordsOf(text)).toEqual([{ number: 1, parts: [], attributes: { name: 'Stub', gpx: 'track' } }])
  })

  it.each([
    ['nothing in it', gpx('<metadata/>'), /holds no waypoints, routes or tracks/],
    [
      'entities',
      `<!DOCTYPE gpx [<!ENTITY a "aaaa">]>${gpx('<wpt lat="45" lon="3"><name>&a;</name></wpt>')}`,
      /entities of its own\. GPX needs none/,
    ],
    ['its end missing', gpx('<wpt lat="45" lon="3"/>').slice(0, -6), /does not end with <\/gpx>/],
  ])('with %s is refused', (_, text, reason) => {
    expect(reasonOf(text, 'walk.gpx')).toMatch(reason)
  })

  it('keeps places that are no numbers for the refusal to name', () => {
    const [record] = recordsOf(gpx('<wpt lat="north" lon="3"/>'))
    expect(record?.parts).toEqual([{ form: 'point', position: [3, NaN] }])
  })
})
