import { describe, expect, it } from 'vitest'
import { kml, placemark, read, reasonOf, recordsOf } from '../../../../../support/field-text'

describe('KML', () => {
  it('gives placemarks in order, with folders, data and those without geometry', () => {
    const text = kml(`<Schema name="s" id="s"><SimpleField name="dip" type="int"/></Schema>
      <Folder><name>North shore</name><Folder><name>Day 2</name>
        <Placemark><name>K 1</name><ExtendedData><SchemaData schemaUrl="#s"><SimpleData name="dip">40</SimpleData></SchemaData>
          <Data name="strike"><value>045</value></Data></ExtendedData><Point><coordinates>3,45,12</coordinates></Point></Placemark>
      </Folder></Folder>
      <Placemark><name>K 2</name><description>no place</description></Placemark>
      <Placemark><LineString><coordinates>
        3,45 3.1,45
        3.2,45 </coordinates></LineString></Placemark>`)
    expect(recordsOf(text, 'a.kml')).toEqual([
      {
        number: 1,
        parts: [{ form: 'point', position: [3, 45, 12] }],
        attributes: { name: 'K 1', dip: '40', strike: '045', folder: 'North shore / Day 2' },
      },
      { number: 2, parts: [], attributes: { name: 'K 2', description: 'no place' } },
      {
        number: 3,
        parts: [
          {
            form: 'line',
            positions: [
              [3, 45],
              [3.1, 45],
              [3.2, 45],
            ],
          },
        ],
        attributes: {},
      },
    ])
  })

  it('reads multi-geometries and tracks', () => {
    const text = kml(`<Placemark><MultiGeometry><LineString><coordinates>3,45 4,45</coordinates></LineString>
        <LineString><coordinates>5,45 6,45</coordinates></LineString></MultiGeometry></Placemark>
      <Placemark xmlns:gx="http://www.google.com/kml/ext/2.2"><gx:Track><gx:coord>3 45 0</gx:coord>
        <gx:coord>4 45 0</gx:coord></gx:Track></Placemark>`)
    expect(recordsOf(text, 'a.kml').map(({ parts }) => parts.map((part) => part.form))).toEqual([
      ['line', 'line'],
      ['line'],
    ])
  })

  it('says what it passes over', () => {
    const text = kml(
      `${placemark}<GroundOverlay/><NetworkLink><Link><href>http://merrow.example/</href></Link></NetworkLink>`,
    )
    expect(read(text, 'a.kml')).toMatchObject({
      notes: ['Not read: 1 <GroundOverlay>, 1 <NetworkLink>. Placemarks with points and lines are.'],
    })
  })

  it('keeps coordinates that are no numbers for the refusal to name', () => {
    const [record] = recordsOf(
      kml('<Placemark><Point><coordinates>east,45</coordinates></Point></Placemark>'),
      'a.kml',
    )
    expect(record?.parts).toEqual([{ form: 'point', position: [NaN, 45] }])
  })

  const entities = '<!DOCTYPE kml [<!ENTITY a "aaaa"><!ENTITY b "&a;&a;&a;&a;">]>'
  it.each([
    [
      'entity expansion',
      `<?xml version="1.0"?>${entities}<kml><Document>${placemark}</Document></kml>`,
      /entities of its own/,
    ],
    [
      'an external entity',
      `<!DOCTYPE kml [<!ENTITY x SYSTEM "file:///etc/hostname">]><kml>&x;</kml>`,
      /entities of its own/,
    ],
    ['a declaration behind a comment', `<!-- <kml> --><!doctype kml []><kml></kml>`, /entities of its own/],
    ['unclosed elements', kml(placemark).slice(0, -20), /seems to be cut off/],
    ['crossed elements', '<kml>\n<Document>\n</Folder></kml>', /do not fit together near line \d/],
    ['no placemarks', kml(''), /holds no placemarks/],
  ])('with %s is refused', (_, content, reason) => {
    expect(reasonOf(content, 'a.kml')).toMatch(reason)
  })

  it('may quote a declaration in a description', () => {
    const html = '<Placemark><description><![CDATA[<!DOCTYPE html><b>Holm</b>]]></description></Placemark>'
    expect(recordsOf(kml(html), 'a.kml')[0]?.attributes).toEqual({
      description: '<!DOCTYPE html><b>Holm</b>',
    })
  })

  it('survives deep nesting', () => {
    const depth = 50_000
    const deep = `<kml>${'<Folder>'.repeat(depth)}${placemark}${'</Folder>'.repeat(depth)}</kml>`
    const outcome = read(deep, 'a.kml')
    expect(['read', 'unreadable']).toContain(outcome.outcome)
  })
})
