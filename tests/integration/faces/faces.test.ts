import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { Face } from '@shared/api/faces'
import type { ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { loadDemo } from '../../../server/demo/load-demo'
import { fromIsland, gannetHead, merrowTruth } from '../../../server/demo/merrow-island'
import { shownAt } from '../../../server/demo/truth/truth'
import { coverUnits } from '../../../server/demo/truth/units'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'

let server: TestServer
let editor: Agent
let sheet: string
let revision: number
const [older, younger] = [randomUUID(), randomUUID()]
beforeAll(async () => {
  server = await startTestServer()
  editor = await signInAs(server, 'editor')
})
afterAll(() => server.close())

const line = (coordinates: number[][], properties: object = {}, kind = 'contact') => ({
  op: 'put',
  item: { kind, id: randomUUID(), geometry: { type: 'LineString', coordinates }, properties },
})
const label = (unit: string, coordinates: number[]) => ({
  op: 'put',
  item: {
    kind: 'unit-label',
    id: randomUUID(),
    geometry: { type: 'Point', coordinates },
    properties: { unit },
  },
})
const unit = (id: string, name: string) => ({
  op: 'put',
  item: { kind: 'unit', id, geometry: null, properties: { label: name, name, colour: '#b7cdc9', rank: 1 } },
})
async function change(...changes: object[]): Promise<void> {
  const { body, status } = await editor
    .post(`/api/sheets/${sheet}/revisions`)
    .set('Idempotency-Key', randomUUID())
    .send({ base: revision, changes })
  expect(status, JSON.stringify(body)).toBe(201)
  revision = body.revision
}
async function facesOf(number = sheet): Promise<{ revision: number; faces: Face[] }> {
  const { body, status } = await editor.get(`/api/sheets/${number}/faces`)
  expect(status).toBe(200)
  return body
}

const [west, south, east, north] = [284_000, 5_278_000, 294_000, 5_289_000]
/** A straight line across the whole sheet. */
const across = (at: number, properties: object = {}) =>
  line(
    [
      [west, at],
      [east, at],
    ],
    properties,
  )
const ringArea = (ring: readonly XY[]): number =>
  Math.abs(
    ring.slice(1).reduce((sum, [x, y], index) => {
      const [fromX, fromY] = ring[index] ?? [x, y]
      return sum + ((fromX - west) * (y - south) - (x - west) * (fromY - south)) / 2
    }, 0),
  )
const areaOf = ({ rings: [outer = [], ...holes] }: Face): number =>
  ringArea(outer) - holes.reduce((sum, hole) => sum + ringArea(hole), 0)
const whole = (east - west) * (north - south)

describe('faces', () => {
  beforeEach(async () => {
    ;({ number: sheet, revision } = await aSheet(server))
    // Ids of units are unique over all sheets: each test has units of its own.
    ;[unitA, unitB] = [randomUUID(), randomUUID()]
    await change(unit(unitA, 'Sp'), unit(unitB, 'Dm'))
  })
  let unitA = older
  let unitB = younger

  it('of an empty sheet are the sheet itself, without a unit', async () => {
    const { revision: at, faces } = await facesOf()
    expect(at).toBe(revision)
    expect(faces).toHaveLength(1)
    expect(faces[0]).toMatchObject({ unit: null })
    expect(faces[0] && areaOf(faces[0])).toBeCloseTo(whole, 3)
  })

  it('are bounded by contacts and neatline, and named by the label inside', async () => {
    await change(across(5_282_000), label(unitA, [289_000, 5_280_000]), label(unitB, [289_000, 5_285_000]))
    const { faces } = await facesOf()
    expect(faces.map((face) => face.unit)).toEqual([unitB, unitA])
    expect(faces.map(areaOf).map(Math.round)).toEqual([7000 * 10_000, 4000 * 10_000])
  })

  it('close on a fault as well, and on lines that run beyond the neatline', async () => {
    await change(
      line(
        [
          [west - 500, 5_282_000],
          [east + 500, 5_282_000],
        ],
        {},
        'fault',
      ),
    )
    const { faces } = await facesOf()
    expect(faces.map(areaOf).map(Math.round)).toEqual([7000 * 10_000, 4000 * 10_000])
  })

  it('are not bounded by concealed contacts, axial traces or other lines', async () => {
    await change(
      across(5_282_000, { locationConfidence: 'concealed' }),
      line(
        [
          [west, 5_283_000],
          [east, 5_283_000],
        ],
        { form: 'anticline' },
        'axial-trace',
      ),
      line(
        [
          [west, 5_284_000],
          [east, 5_284_000],
        ],
        { type: 'dike' },
        'other-line',
      ),
    )
    expect((await facesOf()).faces).toHaveLength(1)
  })

  it('have no unit where labels disagree, and one where they agree', async () => {
    await change(label(unitA, [289_000, 5_280_000]), label(unitA, [289_500, 5_280_000]))
    expect((await facesOf()).faces[0]?.unit).toBe(unitA)
    await change(label(unitB, [289_900, 5_280_000]))
    expect((await facesOf()).faces[0]?.unit).toBeNull()
  })

  it('are not disturbed by lines that end in the open, touch, cross or repeat one another', async () => {
    await change(
      across(5_282_000),
      across(5_282_000),
      line([
        [285_000, 5_284_000],
        [286_000, 5_285_000],
      ]),
      line([
        [286_000, 5_281_000],
        [286_000, 5_283_000],
      ]),
      line([
        [290_000, 5_282_000],
        [290_000, 5_280_000],
        [291_000, 5_280_000],
      ]),
    )
    const { faces } = await facesOf()
    expect(faces.map(areaOf).map(Math.round)).toEqual([7000 * 10_000, 4000 * 10_000])
  })

  it('close where the snapped end of a line lies on a slanting one', async () => {
    // The end lies on the slanting line only to within the 1 mm grid.
    const onSlant = [287_333.333, 5_280_222.222]
    await change(
      line([
        [west, 5_278_000],
        [294_000, 5_284_666.667],
      ]),
      line([onSlant, [287_333.333, north]]),
    )
    const { faces } = await facesOf()
    expect(faces).toHaveLength(3)
    expect(faces.reduce((sum, face) => sum + areaOf(face), 0)).toBeCloseTo(whole, 0)
  })

  it('have holes for what lies inside them', async () => {
    await change(
      line([
        [286_000, 5_280_000],
        [287_000, 5_280_000],
        [287_000, 5_281_000],
        [286_000, 5_280_000],
      ]),
      label(unitA, [286_800, 5_280_400]),
      label(unitB, [290_000, 5_285_000]),
    )
    const { faces } = await facesOf()
    expect(faces.map((face) => [face.unit, face.rings.length])).toEqual([
      [unitB, 2],
      [unitA, 1],
    ])
  })

  it('are never a stale answer: each change of linework or labels is in the next one', async () => {
    for (const step of [1, 2, 3, 4]) {
      await change(across(5_278_000 + step * 1000))
      const { revision: at, faces } = await facesOf()
      expect(at).toBe(revision)
      expect(faces).toHaveLength(step + 1)
    }
    const builtFrom = async () =>
      (
        await server.dataSource.query(
          'SELECT max(face_build.revision) AS revision FROM face_build JOIN sheet ON sheet.id = sheet_id WHERE number = $1',
          [sheet],
        )
      )[0].revision
    const before = await builtFrom()
    await change(
      line(
        [
          [285_000, 5_284_000],
          [286_000, 5_285_000],
        ],
        { form: 'syncline' },
        'axial-trace',
      ),
    )
    // An axial trace bounds nothing: the faces hold for the new revision without being built again.
    expect((await facesOf()).revision).toBe(revision)
    expect(await builtFrom()).toBe(before)
  })

  it('are built once when many ask at the same moment', async () => {
    await change(across(5_282_000))
    const answers = await Promise.all(Array.from({ length: 12 }, () => facesOf()))
    for (const answer of answers) expect(answer.faces).toHaveLength(2)
    const [{ count }] = await server.dataSource.query(
      'SELECT count(*)::integer AS count FROM face JOIN sheet ON sheet.id = sheet_id WHERE number = $1',
      [sheet],
    )
    expect(count).toBe(2)
  })

  it('can be had for any revision', async () => {
    await change(across(5_282_000))
    const id = await server.services.sheets.find(sheet)
    if (!id) throw new Error('The sheet is gone.')
    const at = (number: number) =>
      server.dataSource.transaction((em) => server.services.faces.facesAt(em, id, number))
    expect(await at(revision - 1)).toHaveLength(1)
    expect(await at(revision)).toHaveLength(2)
  })
})

describe('the demo sheet', () => {
  beforeAll(async () => {
    await loadDemo(server.services)
  })

  it('is loaded once, however often it is asked for', async () => {
    await loadDemo(server.services)
    const { body } = await editor.get('/api/sheets/MI-14')
    expect(body).toMatchObject({
      title: 'Gannet Head, Merrow Island',
      state: 'drafting',
      myRoles: ['editor'],
    })
    const { body: ledger } = await editor.get('/api/sheets/MI-14/revisions')
    expect(ledger.entries).toHaveLength(body.revision)
    const authors = new Set(ledger.entries.map((entry: { author: { name: string } }) => entry.author.name))
    // The approver must be able to approve: nothing on the sheet is theirs.
    expect(authors).toEqual(new Set(['Ivo Skerry', 'Rosa Kelp', 'Tove Orr']))
  })

  it('closes into areas that each have a unit and together fill the neatline', async () => {
    const { faces } = await facesOf('MI-14')
    expect(faces.length).toBeGreaterThan(40)
    expect(faces.filter((face) => face.unit === null)).toEqual([])
    expect(faces.reduce((sum, face) => sum + areaOf(face), 0)).toBeCloseTo(whole, 0)
  })

  it('shows in each area the unit that the field has there', async () => {
    const { body } = await editor.get('/api/sheets/MI-14/items')
    const units: ItemOf<'unit'>[] = body.items.filter((item: { kind: string }) => item.kind === 'unit')
    const { origin, width, height } = gannetHead.extent
    const samples: { label: string; x: number; y: number }[] = []
    for (let x = origin[0] + 155; x < origin[0] + width; x += 310) {
      for (let y = origin[1] + 165; y < origin[1] + height; y += 330) {
        const shown = shownAt(merrowTruth, [x, y])
        const label =
          typeof shown === 'string' ? coverUnits.find(({ cover }) => cover === shown)?.label : shown.label
        const [east, north] = fromIsland([x, y])
        samples.push({ label: label ?? '', x: east, y: north })
      }
    }
    const rows: { label: string; unit: string }[] = await server.dataSource.query(
      `SELECT sample.label, face.unit_id AS unit
       FROM json_to_recordset($1::json) AS sample (label text, x double precision, y double precision)
       JOIN face ON ST_Contains(face.outline, ST_SetSRID(ST_MakePoint(sample.x, sample.y), 32626))
       JOIN sheet ON sheet.id = face.sheet_id AND sheet.number = 'MI-14'`,
      [JSON.stringify(samples)],
    )
    const labels = new Map(units.map((item) => [item.id, item.properties.label]))
    // A place within a metre of a line may fall on its other side: drawn lines depart that far from the true ones. Patches
    // too small for the map are left out.
    const wrong = rows.filter((row) => labels.get(row.unit) !== row.label)
    expect(rows.length).toBeGreaterThan(1000)
    expect(wrong.length).toBeLessThanOrEqual(3)
  })
})
