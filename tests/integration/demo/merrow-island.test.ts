import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { loadDemo, terrainKey } from '../../../server/demo/load-demo'
import {
  convergenceAt,
  fromIsland,
  gannetHead,
  merrowSheets,
  merrowTruth,
} from '../../../server/demo/merrow-island'
import { shownAt } from '../../../server/demo/truth/truth'
import { unitLabelOf } from '../../../server/demo/truth/units'
import { signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'

let server: TestServer
let editor: Agent
beforeAll(async () => {
  server = await startTestServer()
  editor = await signInAs(server, 'editor')
  await loadDemo(server.services)
}, 120_000)
afterAll(() => server.close())

const numbers = merrowSheets.map(({ sheet }) => sheet.number)

describe('the demo sheets', () => {
  it.each(numbers)('%s: every area has one unit, and together they fill the neatline', async (number) => {
    const { body } = await editor.get(`/api/sheets/${number}/faces`)
    expect(body.faces.filter((face: { unit: string | null }) => face.unit === null)).toEqual([])
    const [filled]: { area: number }[] = await server.dataSource.query(
      `SELECT sum(ST_Area(outline)) AS area FROM face JOIN sheet ON sheet.id = sheet_id WHERE number = $1`,
      [number],
    )
    expect(filled?.area).toBeCloseTo(110e6, -1)
  })

  it('have elevation models in the storage', async () => {
    for (const number of numbers) expect(await server.services.storage.has(terrainKey(number))).toBe(true)
  })

  it('show each unit on as much ground as a count of the known field on a raster gives', async () => {
    await editor.get('/api/sheets/MI-14/faces')
    const rows: { label: string; area: number }[] = await server.dataSource.query(
      `SELECT item.properties->>'label' AS label, sum(ST_Area(outline)) AS area
       FROM face JOIN sheet ON sheet.id = face.sheet_id AND sheet.number = 'MI-14'
       JOIN item_version AS item ON item.item_id = face.unit_id AND item.until IS NULL
       GROUP BY 1`,
    )
    const { origin, width, height } = gannetHead.extent
    const cell = 50
    const counts = new Map<string, number>()
    for (let x = origin[0] + cell / 2; x < origin[0] + width; x += cell) {
      for (let y = origin[1] + cell / 2; y < origin[1] + height; y += cell) {
        const shown = shownAt(merrowTruth, [x, y])
        const label = unitLabelOf(typeof shown === 'string' ? shown : shown.label)
        counts.set(label, (counts.get(label) ?? 0) + cell * cell)
      }
    }
    expect(rows.length).toBeGreaterThan(15)
    for (const { label, area } of rows) {
      // Cells on an edge fall to either side by chance; two in a hundred, and three hectares of the smallest patches.
      expect(Math.abs(area - (counts.get(label) ?? 0)), label).toBeLessThan(0.02 * area + 30_000)
    }
  })

  it('stand where the convergence of the grid is what PostGIS finds', async () => {
    for (const place of [
      [0, 0],
      [5000, 5500],
      [10_000, 11_000],
      [-9000, 3000],
    ] as const) {
      const [east, north] = fromIsland([place[0], place[1]])
      // The azimuth, on the ellipsoid, of a step of 200 m along the grid's north.
      const [step]: { azimuth: number }[] = await server.dataSource.query(
        `SELECT degrees(ST_Azimuth(
           ST_Transform(ST_SetSRID(ST_MakePoint($1, $2::float8 - 100), 32626), 4326)::geography,
           ST_Transform(ST_SetSRID(ST_MakePoint($1, $2::float8 + 100), 32626), 4326)::geography)) AS azimuth`,
        [east, north],
      )
      const azimuth = step?.azimuth ?? NaN
      const found = azimuth > 180 ? azimuth - 360 : azimuth
      expect(Math.abs(convergenceAt([east, north])), 'far enough from the central meridian').toBeGreaterThan(
        1.8,
      )
      // A geodesic and the grid's line part by the arc-to-chord correction, below 0.001° on 200 m.
      expect(found).toBeCloseTo(convergenceAt([east, north]), 2)
    }
  })
})
