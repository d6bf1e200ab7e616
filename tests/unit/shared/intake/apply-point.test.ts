import { describe, expect, it } from 'vitest'
import type { Mapping } from '@shared/intake/mapping'
import {
  aBed,
  aMapping,
  aPoint,
  applied,
  aRecord,
  propertiesOf,
  reasonsOf,
  strikeAndDip,
} from '../../../support/intake-records'

const points = (rows: Record<string, unknown>[], mapped: Partial<Mapping['points']>, north = {}) =>
  applied(
    rows.map((row, index) => aRecord(row, [aPoint(3, 45)], index + 1)),
    aMapping({ points: mapped, ...north }),
  )
const attitudes = (rows: Record<string, unknown>[], mapped: Partial<Mapping['points']> = {}, north = {}) =>
  points(rows, { ...strikeAndDip, ...mapped }, north)

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
    const overturned = { ...aBed, overturned: true }
    expect(reasonsOf(attitudes([{ dip: 0 }], { otherwise: overturned }))).toEqual([
      'A horizontal plane cannot be overturned.',
    ])
  })

  it('notes where tops are unknown', () => {
    const type = 'Strike and dip of strata (tops unknown)'
    const mapped = { typeColumn: 'what', types: { [type]: aBed } }
    const { items } = attitudes([{ what: type, strike: 45, dip: 40 }], mapped)
    expect(items[0]?.provenance.conversions).toContain('tops unknown in the file: drawn as not overturned')
  })

  it('are overturned where a column says yes, and refused where it says neither yes nor no', () => {
    const mapped = { overturnedColumn: 'ot' }
    const rows = [
      { strike: 45, dip: 40, ot: 'Yes' },
      { strike: 45, dip: 40, ot: 'no' },
      { strike: 45, dip: 40 },
      { strike: 45, dip: 40, ot: 'perhaps' },
    ]
    const result = attitudes(rows, mapped)
    expect(propertiesOf(result).map((item) => 'overturned' in item && item.overturned)).toEqual([
      true,
      false,
      false,
    ])
    expect(result.refusals).toMatchObject([{ record: 4, field: 'ot', value: 'perhaps' }])
  })

  it('carry the traits that their type is mapped to', () => {
    const otherwise = { ...aBed, undulating: true, topsKnown: true }
    expect(propertiesOf(attitudes([{ strike: 45, dip: 40 }], { otherwise }))[0]).toMatchObject({
      undulating: true,
      topsKnown: true,
      overturned: false,
    })
  })
})

describe('lineations', () => {
  const mapped: Partial<Mapping['points']> = {
    otherwise: { kind: 'lineation', type: 'lineation' },
    trendColumn: 'trend',
    plungeColumn: 'plunge',
  }

  it('take trend and plunge from two columns, with the reading kept', () => {
    const [first, second, vertical] = propertiesOf(
      points(
        [
          { trend: 120, plunge: '35' },
          { trend: 'S60E', plunge: 35 },
          { trend: '', plunge: 90 },
        ],
        mapped,
      ),
    )
    expect(first).toMatchObject({
      type: 'lineation',
      trend: 120,
      plunge: 35,
      plane: null,
      reading: { text: '120/35', convention: 'trend-plunge', northReference: 'true' },
    })
    expect(second).toMatchObject({ trend: 120, plunge: 35, reading: { text: 'S60E/35' } })
    expect(vertical).toMatchObject({ trend: null, plunge: 90 })
  })

  it('take both from one text', () => {
    const one = { ...mapped, trendColumn: null, plungeColumn: null, readingColumn: 'line' }
    expect(propertiesOf(points([{ line: '35→120' }], one))[0]).toMatchObject({ trend: 120, plunge: 35 })
    expect(points([{ line: 'rake 40' }], one).refusals).toMatchObject([
      { field: 'line', value: 'rake 40', reason: expect.stringContaining('needs the plane') },
    ])
  })

  it('are turned from the north that their trend is counted from', () => {
    const result = points([{ trend: 355, plunge: 30 }], mapped, {
      northReference: 'magnetic',
      declination: 8.5,
    })
    expect(propertiesOf(result)[0]).toMatchObject({ trend: 3.5, reading: { declination: 8.5 } })
  })

  it.each([
    [{ trend: 120, plunge: 95 }, 'plunge'],
    [{ trend: 120 }, 'plunge'],
    [{ trend: 361, plunge: 35 }, 'trend'],
    [{ plunge: 35 }, 'trend'],
    [{ trend: 'up', plunge: 35 }, 'trend'],
    [{ trend: 120, plunge: 'steep' }, 'plunge'],
  ])('refuse %j, naming the field', (row, field) => {
    expect(points([row], mapped)).toMatchObject({ items: [], refusals: [{ record: 1, field }] })
  })

  it('are refused where no columns are chosen', () => {
    expect(reasonsOf(points([{}], { ...mapped, plungeColumn: null }))).toEqual([
      'No columns are chosen for trend and plunge.',
    ])
  })
})

describe('places', () => {
  const place = (row: Record<string, unknown>, type: 'mine-adit' | 'spring') =>
    points([row], { otherwise: { kind: 'station', type }, trendColumn: 'way', stationColumn: 'name' })

  it('take a direction where their symbol shows one', () => {
    expect(propertiesOf(place({ name: 'Holm level', way: 'N45E' }, 'mine-adit'))[0]).toMatchObject({
      type: 'mine-adit',
      name: 'Holm level',
      azimuth: 45,
    })
    expect(propertiesOf(place({}, 'mine-adit'))[0]).toMatchObject({ azimuth: null })
    expect(propertiesOf(place({ way: 45 }, 'spring'))[0]).toMatchObject({ type: 'spring', azimuth: null })
  })

  it('are refused with a direction that is none', () => {
    expect(place({ way: 'inward' }, 'mine-adit').refusals).toMatchObject([{ field: 'way', value: 'inward' }])
  })
})
