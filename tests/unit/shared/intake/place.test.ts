import { describe, expect, it } from 'vitest'
import { aLine, aMapping, aPoint, applied, aRecord, reasonsOf } from '../../../support/intake-records'

describe('places', () => {
  // Outside values: geodesy.md section 3, WGS 84 UTM zone 31 by PROJ; 45° N 3° E and 6° E.
  it('puts a point where PROJ puts it, to the millimetre', () => {
    const { items } = applied([aRecord()], aMapping({}))
    expect(items[0]?.item.geometry).toEqual({ type: 'Point', coordinates: [500_000, 4_982_950.4] })
  })

  it('drops repeated vertices and heights, and says so', () => {
    const line = aLine([3, 45, 812], [3, 45, 813], [3.01, 45, 815])
    const { items } = applied([aRecord({}, [line])], aMapping({}))
    expect(items[0]?.item.geometry?.coordinates).toHaveLength(2)
    expect(items[0]?.provenance.conversions).toEqual([
      'longitude and latitude (WGS 84) to EPSG:32631, to the millimetre',
      'heights dropped',
      '1 repeated vertex dropped',
    ])
  })

  it('makes one item of each part of a record', () => {
    const parts = [
      aLine([3, 45], [3.01, 45]),
      aLine([3, 45.01], [3, 45.01]),
      aLine([3, 45.02], [3.01, 45.02]),
    ]
    const { items, refusals } = applied([aRecord({}, parts, 7)], aMapping({}))
    expect(items.map(({ provenance }) => provenance.conversions[0])).toEqual([
      'part 1 of 3 of a record with several geometries',
      'part 3 of 3 of a record with several geometries',
    ])
    expect(refusals).toEqual([
      {
        record: 7,
        field: 'geometry',
        value: '3, 45.01',
        reason: 'Part 2 of 3: The line has no length: all its vertices are one point.',
      },
    ])
  })

  it('takes a line whole that crosses the neatline without a vertex inside', () => {
    const across = aLine([2.8, 45], [3.2, 45])
    expect(applied([aRecord({}, [across])], aMapping({})).items).toHaveLength(1)
  })

  it('refuses what lies outside, also where only its box overlaps the sheet', () => {
    const corner = aLine([2.87, 44.995], [2.87, 44.8], [3.2, 44.8])
    const result = applied([aRecord({}, [corner]), aRecord({}, [aPoint(-60, -80)])], aMapping({}))
    expect(reasonsOf(result)).toEqual([
      'This line lies outside the sheet’s neatline.',
      'This point lies outside the sheet’s neatline.',
    ])
    expect(result.outside).toBe(2)
  })

  it.each([
    [
      aPoint(498_211.5, 4_984_000),
      /^These are not degrees: 498211\.5, 4984000; the file seems to be in a projected/,
    ],
    [aPoint(NaN, 45), /not a number/],
    [aPoint(45, 120), /exchanged/],
    [aLine([3, 45], [3, Infinity]), /^Vertex 2: A coordinate is not a number/],
    [aLine(), /no vertices/],
    [{ form: 'area' } as const, /Polygons are not taken in/],
    [{ form: 'unreadable', reason: 'The coordinates are not numbers.' } as const, /not numbers/],
  ])('refuses %j', (part, reason) => {
    const result = applied([aRecord({}, [part])], aMapping({}))
    expect(result.items).toEqual([])
    expect(reasonsOf(result)).toEqual([expect.stringMatching(reason)])
  })

  it('refuses a record without geometry', () => {
    expect(reasonsOf(applied([aRecord({}, [])], aMapping({})))).toEqual(['The record has no geometry.'])
  })

  it('hints at exchanged longitude and latitude where that would lie on the sheet', () => {
    expect(reasonsOf(applied([aRecord({}, [aPoint(45, 3)])], aMapping({})))).toEqual([
      'This point lies outside the sheet’s neatline. With longitude and latitude exchanged it would lie on the sheet.',
    ])
  })
})
