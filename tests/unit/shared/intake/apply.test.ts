import { beforeEach, describe, expect, it } from 'vitest'
import { applyMapping, type Applied } from '@shared/intake/apply'
import type { Mapping } from '@shared/intake/mapping'
import type { IntakeRecord } from '@shared/intake/records'
import { aGround, aLine, aMapping, aPoint, aRecord, strikeAndDip } from '../../../support/intake-records'

const ground = aGround()
let next = 0
beforeEach(() => {
  next = 0
})
const newId = () => `00000000-0000-4000-8000-${String(++next).padStart(12, '0')}`
const applied = (records: IntakeRecord[], mapping: Mapping): Applied =>
  applyMapping(records, 'field.geojson', { mapping, ground, newId })
const propertiesOf = ({ items }: Applied) => items.map(({ item }) => item.properties)
const reasonsOf = ({ refusals }: Applied) => refusals.map(({ reason }) => reason)
const attitudes = (rows: Record<string, unknown>[], points = {}, north = {}) =>
  applied(
    rows.map((row, index) => aRecord(row, [aPoint(3, 45)], index + 1)),
    aMapping({ points: { ...strikeAndDip, ...points }, ...north }),
  )

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

describe('attitudes', () => {
  it('takes strike and dip as they are, with the reading kept', () => {
    const [properties] = propertiesOf(attitudes([{ strike: 238, dip: '70' }]))
    expect(properties).toMatchObject({
      strike: 238,
      dip: 70,
      type: 'bedding',
      reading: { text: '238/70', convention: 'strike-dip', northReference: 'true', declination: null },
    })
  })

  it('turns a dip direction into the strike by the right-hand rule', () => {
    // Outside value: orientation.md section 1, N45E 30SE is strike 045, dip direction 135.
    const [properties] = propertiesOf(
      attitudes([{ strike: 135, dip: 30 }], { convention: 'dip-direction-dip' }),
    )
    expect(properties).toMatchObject({ strike: 45, dip: 30 })
  })

  it('adds the declination to magnetic readings and says so', () => {
    const result = attitudes([{ strike: 355, dip: 30 }], {}, { northReference: 'magnetic', declination: 8.5 })
    expect(propertiesOf(result)[0]).toMatchObject({ strike: 3.5, reading: { declination: 8.5 } })
    expect(result.items[0]?.provenance.conversions).toContain(
      'magnetic north to true north: declination 8.50° east',
    )
  })

  it('adds the grid convergence of the place to grid readings', () => {
    // Outside value: tan γ = tan Δλ sin φ (geodesy.md section 3): 0.1° east of the meridian at 45° N, γ = 0.0707°.
    const result = applied(
      [aRecord({ strike: 100, dip: 30 }, [aPoint(3.1, 45)])],
      aMapping({ points: strikeAndDip, northReference: 'grid' }),
    )
    expect(propertiesOf(result)[0]).toMatchObject({ strike: 100.07 })
  })

  it('reads quadrant notation from two columns and from one', () => {
    const two = attitudes([{ strike: 'N45E', dip: '40SE' }])
    expect(propertiesOf(two)[0]).toMatchObject({ strike: 45, dip: 40, reading: { convention: 'quadrant' } })
    const one = attitudes([{ obs: 'N45E 40NW' }], { readingColumn: 'obs' })
    expect(propertiesOf(one)[0]).toMatchObject({ strike: 225, dip: 40, reading: { text: 'N45E 40NW' } })
  })

  it('takes a horizontal plane without strike', () => {
    expect(propertiesOf(attitudes([{ strike: '', dip: 0 }]))[0]).toMatchObject({ strike: null, dip: 0 })
  })

  it.each([
    [{ strike: 45, dip: 95 }, 'dip', /95/],
    [{ strike: 45, dip: -3 }, 'dip', /-3/],
    [{ strike: 361, dip: 40 }, 'strike', /361/],
    [{ strike: -9999, dip: 40 }, 'strike', /-9999/],
    [{ strike: '45?', dip: 40 }, 'strike', /not a number/],
    [{ strike: 45, dip: '30-40' }, 'dip', /not a number/],
    [{ strike: 45 }, 'dip', /No dip is given/],
    [{ dip: 40 }, 'strike', /No strike is given/],
    [{ strike: 'N45E', dip: '40NE' }, 'strike', /N45E|strike/],
  ])('refuses %j, naming the field', (row, field, reason) => {
    const result = attitudes([row])
    expect(result.items).toEqual([])
    expect(result.refusals).toEqual([
      { record: 1, field, value: expect.any(String), reason: expect.stringMatching(reason) },
    ])
  })

  it('refuses a contradictory text', () => {
    const result = attitudes([{ obs: 'N45E 40NE' }], { readingColumn: 'obs' })
    expect(result.refusals).toMatchObject([{ record: 1, field: 'obs', value: 'N45E 40NE' }])
  })

  it('refuses an overturned horizontal bed', () => {
    const points = { otherwise: { kind: 'attitude', type: 'bedding', overturned: true } }
    expect(reasonsOf(attitudes([{ dip: 0 }], points))).toEqual(['A horizontal plane cannot be overturned.'])
  })

  it('notes where tops are unknown', () => {
    const type = 'Strike and dip of strata (tops unknown)'
    const points = { typeColumn: 'what', types: { [type]: strikeAndDip.otherwise } }
    const { items } = attitudes([{ what: type, strike: 45, dip: 40 }], points)
    expect(items[0]?.provenance.conversions).toContain('tops unknown in the file: drawn as not overturned')
  })
})

describe('lines', () => {
  const line = (attributes: Record<string, unknown>, lines: Partial<Mapping['lines']>) =>
    applied([aRecord(attributes, [aLine([3, 45], [3.01, 45])])], aMapping({ lines }))

  it('become what their type is mapped to, with name and note', () => {
    const result = line(
      { Type: 'thrust', name: 'Holm Thrust', remark: 'walked' },
      {
        typeColumn: 'Type',
        types: { thrust: { kind: 'fault', type: 'thrust' } },
        faultSide: 'left',
        nameColumn: 'name',
        noteColumn: 'remark',
      },
    )
    expect(result.items[0]?.item).toMatchObject({
      kind: 'fault',
      properties: {
        type: 'thrust',
        side: 'left',
        name: 'Holm Thrust',
        note: 'walked',
        locationConfidence: 'certain',
      },
    })
    expect(result.items[0]?.provenance).toMatchObject({
      file: 'field.geojson',
      record: 1,
      attributes: { Type: 'thrust', name: 'Holm Thrust', remark: 'walked' },
      conversions: expect.arrayContaining(['upper plate on the left of the line as drawn: stated at intake']),
    })
  })

  it('are left out where the mapping says so, and refused where they state no type', () => {
    const lines = {
      typeColumn: 'Type',
      types: { road: { kind: 'leave-out' } },
      otherwise: { kind: 'leave-out' },
    } as const
    expect(line({ Type: 'road' }, lines)).toMatchObject({ leftOut: 1, refusals: [] })
    expect(reasonsOf(line({ Type: null }, lines))).toEqual(['The record does not say what the line is.'])
    expect(line({ Type: 'constructor' }, lines)).toMatchObject({ leftOut: 1, refusals: [] })
  })

  it('take their confidence from its column; an unknown one is refused', () => {
    const lines = { confidenceColumn: 'conf', confidences: { approx: 'approximate' } } as const
    expect(propertiesOf(line({ conf: 'approx' }, lines))[0]).toMatchObject({
      locationConfidence: 'approximate',
    })
    expect(propertiesOf(line({ conf: '' }, { ...lines, confidenceOtherwise: 'inferred' }))[0]).toMatchObject({
      locationConfidence: 'inferred',
    })
    expect(line({ conf: 'so so' }, lines).refusals).toMatchObject([{ field: 'conf', value: 'so so' }])
  })

  it('carry plunge and trend together or not at all', () => {
    const lines = {
      otherwise: { kind: 'axial-trace', form: 'syncline' },
      plungeColumn: 'plunge',
      trendColumn: 'trend',
    } as const
    expect(propertiesOf(line({ plunge: 12, trend: 360 }, lines))[0]).toMatchObject({ plunge: 12, trend: 0 })
    expect(propertiesOf(line({}, lines))[0]).toMatchObject({ plunge: null, trend: null })
    expect(line({ plunge: 12 }, lines).refusals).toMatchObject([{ field: 'trend' }])
    expect(line({ plunge: 95, trend: 10 }, lines).refusals).toMatchObject([{ field: 'plunge', value: '95' }])
  })

  it('cut a name that is too long and keep the whole in their provenance', () => {
    const name = 'a'.repeat(300)
    const { items } = line({ name }, { nameColumn: 'name' })
    expect(items[0]?.item.properties).toMatchObject({ name: `${'a'.repeat(199)}…` })
    expect(items[0]?.provenance.attributes).toEqual({ name })
  })
})

it('ends every part of every record in exactly one of three counts', () => {
  const records = [
    aRecord({ Type: 'contact' }, [aLine([3, 45], [3.01, 45]), aLine([3, 45], [3, 45])]),
    aRecord({ Type: 'road' }, [aLine([3, 45], [3.01, 45])]),
    aRecord({}, [aPoint(3, 45)]),
    aRecord({}, []),
  ]
  const lines = {
    typeColumn: 'Type',
    types: { contact: { kind: 'contact' } },
    otherwise: { kind: 'leave-out' },
  } as const
  const { items, refusals, leftOut } = applied(records, aMapping({ lines }))
  expect([items.length, refusals.length, leftOut]).toEqual([2, 2, 1])
})
