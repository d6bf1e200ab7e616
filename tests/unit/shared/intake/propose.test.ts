import { describe, expect, it } from 'vitest'
import { summarizeColumns } from '@shared/intake/columns'
import { proposeMapping } from '@shared/intake/propose'
import { hasLines, hasPoints, type IntakeRecord } from '@shared/intake/records'
import { aLine, aPoint, aRecord } from '../../../support/intake-records'

const proposalFor = (records: IntakeRecord[]) =>
  proposeMapping(summarizeColumns(records), {
    points: records.filter(hasPoints).length,
    lines: records.filter(hasLines).length,
  })
const points = (rows: Record<string, unknown>[]) =>
  rows.map((row, index) => aRecord(row, [aPoint(3, 45)], index + 1))
const lines = (rows: Record<string, unknown>[]) =>
  rows.map((row, index) => aRecord(row, [aLine([3, 45], [3.01, 45])], index + 1))
const asked = (records: IntakeRecord[]) => proposalFor(records).notes.filter((note) => note.weight === 'ask')

describe('readings', () => {
  it('takes a strike that runs round the circle by the right-hand rule, without asking', () => {
    const records = points([
      { Strike_Val: 238, Dip_Value: 70 },
      { Strike_Val: 12, Dip_Value: 35 },
    ])
    expect(proposalFor(records).mapping.points).toMatchObject({
      azimuthColumn: 'Strike_Val',
      dipColumn: 'Dip_Value',
      convention: 'strike-dip',
    })
    expect(asked(records)).toEqual([])
  })

  it('asks about strikes that stay within half the circle', () => {
    const records = points([
      { strike: 38, dip: 70 },
      { strike: 171, dip: 35 },
    ])
    expect(asked(records)).toMatchObject([{ field: 'points.convention' }])
  })

  it('takes a dip direction by its name', () => {
    const { mapping } = proposalFor(points([{ dip_dir: 131, dip: 55 }]))
    expect(mapping.points).toMatchObject({ azimuthColumn: 'dip_dir', convention: 'dip-direction-dip' })
  })

  it('asks whether an azimuth is a strike or a dip direction', () => {
    const records = points([{ azimut: 231, dip: 55 }])
    expect(proposalFor(records).mapping.points.azimuthColumn).toBe('azimut')
    expect(asked(records)).toMatchObject([{ field: 'points.convention' }])
  })

  it('finds a column of whole readings, and asks only where they read in two ways', () => {
    const quadrants = points([{ obs: 'N45E 40SE' }, { obs: 'N30W, 60 SW' }])
    expect(proposalFor(quadrants).mapping.points.readingColumn).toBe('obs')
    expect(asked(quadrants)).toEqual([])
    expect(asked(points([{ obs: '135/40' }]))).toHaveLength(1)
  })

  it('takes points without readings as stations', () => {
    expect(proposalFor(points([{ name: 'K 12' }])).mapping.points).toMatchObject({
      otherwise: { kind: 'station' },
      stationColumn: 'name',
    })
  })
})

describe('points without readings', () => {
  it('are stations, even where a column that is called type says something else of them', () => {
    const { mapping } = proposalFor(points([{ name_en: 'K 12', type: 'road' }, { type: 'stream' }]))
    expect(mapping.points).toMatchObject({
      typeColumn: null,
      otherwise: { kind: 'station', type: 'station' },
      stationColumn: 'name_en',
    })
  })

  it('are lineations where they have trend and plunge', () => {
    const { mapping } = proposalFor(points([{ trend: 120, plunge: 35 }]))
    expect(mapping.points).toMatchObject({
      otherwise: { kind: 'lineation', type: 'lineation' },
      trendColumn: 'trend',
      plungeColumn: 'plunge',
    })
  })
})

describe('a column of points whose values nobody understands', () => {
  it('is not passed over where the points have readings', () => {
    const { mapping } = proposalFor(points([{ type: 'S2', strike: 210, dip: 40 }]))
    expect(mapping.points).toMatchObject({
      typeColumn: 'type',
      types: { S2: { kind: 'leave-out' } },
      otherwise: { kind: 'leave-out' },
    })
  })

  it('called overturned says which beds are', () => {
    const { mapping } = proposalFor(points([{ strike: 210, dip: 40, overturned: 'yes' }]))
    expect(mapping.points.overturnedColumn).toBe('overturned')
  })
})

describe('north', () => {
  const northOf = (rows: Record<string, unknown>[]) => {
    const { mapping, notes } = proposalFor(points(rows.map((row) => ({ strike: 210, dip: 40, ...row }))))
    const note = notes.find(({ field }) => field === 'northReference')
    return { north: mapping.northReference, declination: mapping.declination, note }
  }

  it('is what a column says in every record, with the declination beside it', () => {
    expect(northOf([{ north: 'magnetic', declination: -8.5 }])).toEqual({
      north: 'magnetic',
      declination: -8.5,
      note: {
        weight: 'reason',
        field: 'northReference',
        text: '“north” states magnetic north, and the declination as -8.5°, in every record.',
      },
    })
    expect(northOf([{ Reference: 'Grid north' }])).toMatchObject({ north: 'grid', declination: null })
  })

  it('is true north, to be looked at, where records differ or say nothing', () => {
    expect(northOf([{ north: 'magnetic' }, { north: 'true' }])).toMatchObject({
      north: 'true',
      note: { weight: 'check', text: expect.stringContaining('does not state the same north') },
    })
    expect(northOf([{ north: 5_281_250 }])).toMatchObject({
      north: 'true',
      note: {
        weight: 'check',
        text: expect.stringContaining('does not say what its azimuths are counted from'),
      },
    })
  })

  it('takes no declination that differs from record to record', () => {
    const rows = [
      { north: 'magnetic', declination: -8.5 },
      { north: 'magnetic', declination: -8.6 },
    ]
    expect(northOf(rows)).toMatchObject({ north: 'magnetic', declination: null })
  })
})

describe('types', () => {
  it('finds the column whose values say what lines are, whatever its name', () => {
    const { mapping } = proposalFor(
      lines([
        { CODE: 1, LEGEND_E: 'Geologic boundary' },
        { CODE: 11, LEGEND_E: 'Fault' },
      ]),
    )
    expect(mapping.lines.typeColumn).toBe('LEGEND_E')
    expect(mapping.lines.types).toEqual({
      'Geologic boundary': { kind: 'contact' },
      Fault: { kind: 'fault', type: 'unspecified' },
    })
  })

  it('proposes to leave out what it does not understand, and says so', () => {
    const { mapping, notes } = proposalFor(lines([{ Type: 'thrust' }, { Type: 'fold' }, { Type: 'thrsut' }]))
    expect(mapping.lines.types).toMatchObject({ fold: { kind: 'leave-out' }, thrsut: { kind: 'leave-out' } })
    expect(mapping.lines.otherwise).toEqual({ kind: 'leave-out' })
    expect(notes).toContainEqual({
      weight: 'check',
      field: 'lines.types',
      text: '2 values are not understood and would be left out (2 lines). A likely meaning is offered beside 1.',
    })
  })

  it('never proposes a meaning for a missing value', () => {
    const { mapping } = proposalFor(lines([{ Type: 'thrust' }, { Type: null }, {}]))
    expect(mapping.lines.types).toEqual({ thrust: { kind: 'fault', type: 'thrust' } })
  })

  it('leaves lines out where no column says what they are', () => {
    const { mapping, notes } = proposalFor(lines([{ id: 7 }]))
    expect(mapping.lines).toMatchObject({ typeColumn: null, otherwise: { kind: 'leave-out' } })
    expect(notes.map((note) => note.field)).toContain('lines.otherwise')
  })

  it('keeps a value named like a property of every object', () => {
    const { mapping } = proposalFor(
      lines([{ Type: 'thrust' }, { Type: '__proto__' }, { Type: 'constructor' }]),
    )
    expect(Object.entries(mapping.lines.types)).toContainEqual(['__proto__', { kind: 'leave-out' }])
    expect(Object.entries(mapping.lines.types)).toContainEqual(['constructor', { kind: 'leave-out' }])
  })
})

describe('location confidence', () => {
  it('is found in a column of its own', () => {
    const { mapping } = proposalFor(
      lines([
        { type: 'contact', conf: 'approx.' },
        { type: 'contact', conf: 'certain' },
        { type: 'contact', conf: 'so so' },
      ]),
    )
    expect(mapping.lines.confidenceColumn).toBe('conf')
    expect(mapping.lines.confidences).toEqual({ 'approx.': 'approximate', certain: 'certain' })
  })

  it('is found in the words of the type', () => {
    const { mapping } = proposalFor(lines([{ type: 'Fault' }, { type: 'Concealed fault' }]))
    expect(mapping.lines.confidenceColumn).toBe('type')
    expect(mapping.lines.confidences).toEqual({ Fault: 'certain', 'Concealed fault': 'concealed' })
  })
})

it('says that the side of a thrust is not in the file', () => {
  const { notes } = proposalFor(lines([{ Type: 'thrust' }]))
  expect(notes.map((note) => note.field)).toContain('lines.faultSide')
})
