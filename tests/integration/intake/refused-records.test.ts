import { describe, expect, it } from 'vitest'
import type { Intake } from '@shared/api/intake'
import type { Mapping } from '@shared/intake/mapping'
import {
  bedding,
  collection,
  feature,
  kml,
  line,
  onSheet,
  placemark,
  useIntakeDesk,
} from '../../support/intake-desk'
import { aBed } from '../../support/intake-records'

const desk = useIntakeDesk()

const at = (...coordinates: unknown[]) => ({ type: 'Point', coordinates })
const here = onSheet[0]

/** Brings records among which one is good, takes them in, and gives back the refusals. */
async function refusalsOf(features: object[]) {
  const intake = await desk.brought(collection([bedding({}), ...features]))
  const { refusals } = await desk.preview(intake)
  const { body } = await desk.takeIn(intake)
  expect(body).toMatchObject({ accepted: 1, refused: refusals.length })
  return refusals
}

describe('a record that cannot be is refused with its number, field, value and reason; the others come in', () => {
  it.each<[string, object, { field: string; value?: string; reason: string | RegExp }]>([
    [
      'a dip beyond 90',
      bedding({ dip: 95 }),
      { field: 'dip', value: '95', reason: /^Dip 95 is more than 90/ },
    ],
    ['a missing dip', bedding({ dip: null }), { field: 'dip', value: '', reason: 'No dip is given.' }],
    ['no geometry', bedding({}, null), { field: 'geometry', reason: 'The record has no geometry.' }],
    [
      'a polygon',
      bedding({}, { type: 'Polygon', coordinates: [] }),
      { field: 'geometry', reason: /^Polygons are not/ },
    ],
    [
      'numbers as text',
      bedding({}, at('a', 'b')),
      { field: 'geometry', reason: 'The coordinates are not numbers.' },
    ],
    [
      'an impossible place',
      bedding({}, at(286_500, 5_281_250)),
      { field: 'geometry', value: '286500, 5281250', reason: /^These are not degrees/ },
    ],
    [
      'a place beyond the neatline',
      bedding({}, at(-28.1, 47.66)),
      { field: 'geometry', value: '-28.1, 47.66', reason: 'This point lies outside the sheet’s neatline.' },
    ],
    [
      'longitude and latitude exchanged',
      bedding({}, at(here[1], here[0])),
      { field: 'geometry', reason: /With longitude and latitude exchanged it would lie on the sheet\.$/ },
    ],
    [
      'a line without length',
      feature({ type: 'contact' }, line([here, here])),
      { field: 'geometry', reason: 'The line has no length: all its vertices are one point.' },
    ],
    [
      'no type',
      feature({ type: null }, line()),
      { field: 'type', value: '', reason: 'The record does not say what the line is.' },
    ],
    [
      'what is no feature',
      { type: 'Thing' },
      { field: 'geometry', reason: 'This is not a GeoJSON feature.' },
    ],
  ])('%s', async (_, record, { field, value, reason }) => {
    const refusals = await refusalsOf([
      record,
      feature(
        { type: 'contact' },
        line([
          [0, 0],
          [1, 1],
        ]),
      ),
    ])
    expect(refusals[0]).toMatchObject({ record: 2, field, ...(value === undefined ? {} : { value }) })
    expect(refusals[0]?.reason).toMatch(reason)
  })

  it('a dip along the strike, and words where a reading should be', async () => {
    const readings = ['N45E 40SE', 'N45E 40NE', 'see sketch'].map((attitude) => placemark({ attitude }))
    const mapping = (intake: Intake): Mapping => ({
      ...intake.proposal,
      points: {
        ...intake.proposal.points,
        readingColumn: 'attitude',
        otherwise: aBed,
      },
    })
    const intake = await desk.brought(kml(readings.join('')), 'readings.kml')
    const { refusals, accepted } = await desk.preview(intake, mapping(intake))
    expect(accepted).toBe(1)
    expect(refusals).toMatchObject([
      { record: 2, value: 'N45E 40NE', reason: expect.stringContaining('NE lies along the strike') },
      { record: 3, value: 'see sketch', reason: expect.stringContaining('does not read') },
    ])
  })
})

describe('where nothing remains, nothing is written', () => {
  it('all outside the neatline', async () => {
    const intake = await desk.brought(collection([bedding({}, at(3, 45)), bedding({}, at(3.1, 45))]))
    const { status, body } = await desk.takeIn(intake)
    expect([status, body.type]).toEqual([422, '/problems/outside-sheet'])
    expect(body.detail).toContain(
      'All 2 records of field.geojson that the mapping takes lie outside the neatline.',
    )
    await expectUntouched()
  })

  it('all refused, each for its own reason', async () => {
    const intake = await desk.brought(collection([bedding({ dip: 95 }), bedding({ dip: '' })]))
    const { status, body } = await desk.takeIn(intake)
    expect([status, body.type]).toEqual([422, '/problems/nothing-to-take-in'])
    expect(body.detail).toContain('2 refused and 0 left out of field.geojson: nothing remains.')
    await expectUntouched()
  })
})

describe('a mapping that does not fit', () => {
  const pointer = async (change: (mapping: Mapping) => void) => {
    const intake = await desk.brought(collection([bedding()]))
    const mapping = structuredClone(intake.proposal)
    change(mapping)
    const preview = await desk.askPreview(intake, mapping)
    const takingIn = await desk.takeIn(intake, { mapping })
    expect([preview.status, takingIn.status]).toEqual([400, 400])
    expect(takingIn.body.errors).toEqual(preview.body.errors)
    await expectUntouched()
    return preview.body.errors[0].pointer
  }

  it('names a column that the file does not have', async () => {
    expect(await pointer((mapping) => (mapping.points.dipColumn = 'DIP_ANGLE'))).toBe(
      '/mapping/points/dipColumn',
    )
  })

  it('counts from magnetic north without a declination', async () => {
    expect(await pointer((mapping) => (mapping.northReference = 'magnetic'))).toBe('/mapping/declination')
  })

  it('makes a line of what is no kind of line', async () => {
    const intake = await desk.brought(collection([bedding()]))
    const mapping = { ...intake.proposal, lines: { ...intake.proposal.lines, otherwise: { kind: 'road' } } }
    const { status, body } = await desk.askPreview(intake, mapping)
    expect(status).toBe(400)
    expect(body.errors[0].pointer).toMatch(/^\/mapping\/lines\/otherwise/)
  })
})

describe('a sheet under review', () => {
  it('takes in nothing', async () => {
    const intake = await desk.brought(collection([bedding()]))
    await desk.server.dataSource.query(`UPDATE sheet SET state = 'submitted' WHERE number = $1`, [desk.sheet])
    const { status, body } = await desk.takeIn(intake)
    expect([status, body.type]).toEqual([409, '/problems/wrong-state'])
    await expectUntouched()
  })
})

/** One revision, nothing on the sheet, and the file still waiting. */
async function expectUntouched(): Promise<void> {
  expect(await desk.latest()).toBe(1)
  expect((await desk.items()).map((item) => item.kind)).toEqual(['sheet-face'])
  expect((await desk.intakes()).map((intake) => intake.state)).toEqual(['read'])
}
