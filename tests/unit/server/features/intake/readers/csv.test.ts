import { describe, expect, it } from 'vitest'
import { read, reasonOf, recordsOf } from '../../../../../support/field-text'

const positionsOf = (text: string) =>
  recordsOf(text).flatMap(({ parts }) => parts.map((part) => (part.form === 'point' ? part.position : part)))

describe('a table', () => {
  it('gives a point for each row, with every cell as it was written', () => {
    const text = 'station,lat,lon,strike,note\nK 7,45,3,012,"steep, wet"\nK 8,45.5,3.25,190,\n'
    expect(read(text, 'stations.csv')).toMatchObject({
      reader: 'csv',
      notes: ['Records are numbered from the first row under the header.'],
    })
    expect(recordsOf(text)).toEqual([
      {
        number: 1,
        parts: [{ form: 'point', position: [3, 45] }],
        attributes: { station: 'K 7', lat: '45', lon: '3', strike: '012', note: 'steep, wet' },
      },
      {
        number: 2,
        parts: [{ form: 'point', position: [3.25, 45.5] }],
        attributes: { station: 'K 8', lat: '45.5', lon: '3.25', strike: '190', note: '' },
      },
    ])
  })

  it.each([
    ['commas', 'lon,lat\n3.5,45\n'],
    ['semicolons and decimal commas', 'lon;lat\n3,5;45\n'],
    ['tabs', 'lon\tlat\n3.5\t45\n'],
    ['bars', 'lon|lat\n3.5|45\n'],
    ['degrees, minutes and seconds', 'Longitude,Latitude\n"3°30\'00"" E",45°00\'00N\n'],
    ['other names', 'Lon_WGS84,Lat_WGS84\r\n3.5,45\r\n'],
    ['comments, blank lines and blanks', '# by Rosa Kelp,,\n\n lon , lat \n 3.5 , 45 \n\n'],
  ])('is read with %s', (_, text) => {
    expect(positionsOf(text)).toEqual([[3.5, 45]])
  })

  it('says that comments were passed over', () => {
    expect(read('# by Rosa Kelp\nlon,lat\n3,45\n')).toMatchObject({
      notes: expect.arrayContaining(['Lines that begin with # were passed over.']),
    })
  })

  it('gives columns without a name, or with one that is taken, a name of their own', () => {
    expect(recordsOf('lon,lat,,dip,dip\n3,45,a,40,41\n')[0]?.attributes).toEqual({
      lon: '3',
      lat: '45',
      'column 3': 'a',
      dip: '40',
      'dip (2)': '41',
    })
  })

  it.each([
    ['no place', 'lon,lat\n,\n1,', 'No longitude and latitude are given.'],
    ['NA for a place', 'lon,lat,n\nNA,NA,7\n', 'No longitude and latitude are given.'],
    ['words for a place', 'lon,lat\nriver,45\n', /^“river”: A longitude is written like/],
    ['the wrong letter', 'lon,lat\n3 N,45 N\n', /ends in E or W, not in N/],
    ['too many cells', 'lon,lat\n3,45,12\n', 'The row has 3 cells, but the header names 2 columns.'],
  ])('keeps a row with %s for the refusal to name', (_, text, reason) => {
    expect(recordsOf(text)[0]?.parts).toEqual([
      { form: 'unreadable', reason: typeof reason === 'string' ? reason : expect.stringMatching(reason) },
    ])
  })

  it.each([
    [
      'no columns of places',
      'station,strike,dip\nK 7,12,40\n',
      /No columns of longitude and latitude are found among “station”, “strike”, “dip”/,
    ],
    [
      'metres of an unnamed grid',
      'Station;Easting;Northing\nK 7;286500;5281250\n',
      /“Easting”, “Northing” are metres of a grid that the file does not name/,
    ],
    ['a header alone', 'lon,lat\n', /no rows under its header/],
    [
      'an open quotation',
      'lon,lat,note\n3,45,"steep\n3,46,flat\n',
      /not whole: a quoted text near line 2 does not end/,
    ],
  ])('with %s is refused', (_, text, reason) => {
    expect(reasonOf(text, 'stations.csv')).toMatch(reason)
  })

  it('keeps formulas and markup as mere text', () => {
    const [record] = recordsOf('lon,lat,note\n3,45,"=HYPERLINK(""x"")"\n3,45,<b>\n')
    expect(record?.attributes).toMatchObject({ note: '=HYPERLINK("x")' })
  })
})
