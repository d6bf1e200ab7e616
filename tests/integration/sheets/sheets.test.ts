import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Sheet } from '@shared/api/sheets'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'

let server: TestServer
let administrator: Agent
let editor: Agent
let compiler: Agent
beforeAll(async () => {
  server = await startTestServer()
  administrator = await signInAs(server, 'administrator')
  editor = await signInAs(server, 'editor')
  compiler = await signInAs(server, 'compiler')
})
afterAll(() => server.close())

let count = 0
const aNewSheet = (changes: object = {}) => ({
  number: `NEW-${(count += 1)}`,
  title: 'Skerry Sound',
  scale: 24_000,
  srid: 32626,
  area: { by: 'metres', west: 284_000, south: 5_278_000, east: 294_000, north: 5_289_000 },
  page: { width: 841, height: 594 },
  ...changes,
})
const create = (agent: Agent, changes: object = {}) => agent.post('/api/sheets').send(aNewSheet(changes))
const numbersOf = async (agent: Agent): Promise<string[]> => {
  const { body }: { body: { sheets: Sheet[] } } = await agent.get('/api/sheets')
  return body.sheets.map((sheet) => sheet.number)
}

describe('creating a sheet', () => {
  it('begins at revision 1, drafting, with its sheet face and an entry of its creator', async () => {
    const made = aNewSheet({ attitudeConvention: 'dip-direction-dip', authors: 'Rosa Kelp' })
    const response = await administrator.post('/api/sheets').send(made)
    expect(response.status).toBe(201)
    const sheet: Sheet = response.body
    expect(sheet).toMatchObject({
      number: made.number,
      state: 'drafting',
      revision: 1,
      edition: null,
      myRoles: [],
    })
    expect(sheet.crs.name).toBe('WGS 84 / UTM zone 26N')
    expect(sheet.lastEntry).toMatchObject({ revision: 1, kind: 'creation', author: { name: 'Ivo Skerry' } })
    const { body } = await administrator.get(`/api/sheets/${made.number}/items`)
    expect(body.items).toHaveLength(1)
    expect(body.items[0]).toMatchObject({
      kind: 'sheet-face',
      geometry: null,
      properties: { attitudeConvention: 'dip-direction-dip', authors: 'Rosa Kelp' },
    })
  })

  it('lays an area in degrees along parallels and meridians, as PROJ in PostGIS does', async () => {
    const area = { by: 'degrees', west: -29.9, south: 47.6, east: -29.75, north: 47.7 }
    const { body, status } = await create(administrator, { area })
    expect(status).toBe(201)
    const [corner] = body.neatline
    const [projected] = await server.dataSource.query(
      `SELECT ST_X(p) AS x, ST_Y(p) AS y FROM ST_Transform(ST_SetSRID(ST_MakePoint(-29.9, 47.6), 4326), 32626) AS p`,
    )
    // Both are rounded to the millimetre or finer.
    expect(Math.abs(corner[0] - projected.x)).toBeLessThan(0.001)
    expect(Math.abs(corner[1] - projected.y)).toBeLessThan(0.001)
    expect(body.footprint[0][0]).toBeCloseTo(-29.9, 7)
    expect(body.footprint[0][1]).toBeCloseTo(47.6, 7)
  })

  it('makes an editor elsewhere the editor of what they create', async () => {
    await aSheet(server)
    const { body, status } = await create(editor)
    expect(status).toBe(201)
    expect(body.myRoles).toEqual(['editor'])
    expect(await numbersOf(editor)).toContain(body.number)
  })

  it('is refused to who edits no sheet', async () => {
    await aSheet(server)
    const response = await create(compiler)
    expect(response.status).toBe(403)
    expect(response.body.type).toBe('/problems/not-allowed')
    expect((await compiler.get('/api/sheets')).body.mayCreate).toBe(false)
    expect((await administrator.get('/api/sheets')).body.mayCreate).toBe(true)
  })

  it('makes one sheet of a double click', async () => {
    const sheet = aNewSheet()
    const answers = await Promise.all(
      [1, 2, 3].map(() =>
        administrator
          .post('/api/sheets')
          .send(sheet)
          .then((response) => response),
      ),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409])
    const taken = answers.find((answer) => answer.status === 409)
    expect(taken?.body).toMatchObject({ type: '/problems/number-taken', errors: [{ pointer: '/number' }] })
    expect((await numbersOf(administrator)).filter((number) => number === sheet.number)).toHaveLength(1)
  })

  it.each([
    ['a geographic system', { srid: 4326 }, '/srid'],
    ['a system in feet', { srid: 2263 }, '/srid'],
    ['a system with axes to west and south', { srid: 2048 }, '/srid'],
    ['a system that does not exist', { srid: 999_999 }, '/srid'],
    [
      'a zone far from the area',
      { srid: 32656, area: { by: 'degrees', west: -29.9, south: 47.6, east: -29.8, north: 47.7 } },
      '/area',
    ],
    [
      'grid metres that are nowhere',
      { area: { by: 'metres', west: 9e6, south: 0, east: 9.01e6, north: 1e4 } },
      '/area',
    ],
    ['an area too large for the page', { page: { width: 297, height: 210 } }, '/page'],
    [
      'an area of a few metres',
      { area: { by: 'metres', west: 284_000, south: 5_278_000, east: 284_010, north: 5_278_010 } },
      '/area',
    ],
    [
      'west beyond east',
      { area: { by: 'metres', west: 294_000, south: 5_278_000, east: 284_000, north: 5_289_000 } },
      '/area/east',
    ],
    ['a number in small letters', { number: 'mi 14' }, '/number'],
    ['no title', { title: '  ' }, '/title'],
  ])('refuses %s and says where', async (_, changes, pointer) => {
    const response = await create(administrator, changes)
    expect(response.status).toBe(400)
    expect(response.body.type).toBe('/problems/invalid-input')
    expect(response.body.errors[0].pointer).toBe(pointer)
    expect(response.body.errors[0].detail).toMatch(/\.$/)
  })

  it('leaves nothing of a refused sheet behind', async () => {
    const number = 'NOTHING-1'
    await create(administrator, { number, page: { width: 297, height: 210 } })
    expect((await administrator.get(`/api/sheets/${number}`)).status).toBe(404)
    expect((await create(administrator, { number })).status).toBe(201)
  })
})

describe('listing sheets', () => {
  it('shows people their own sheets with their roles, administrators all', async () => {
    const mine = await aSheet(server)
    const other = (await create(administrator)).body.number
    const { body }: { body: { sheets: Sheet[] } } = await compiler.get('/api/sheets')
    const found = body.sheets.find((sheet) => sheet.number === mine.number)
    expect(found?.myRoles).toEqual(['compiler'])
    expect(body.sheets.some((sheet) => sheet.number === other)).toBe(false)
    expect(await numbersOf(administrator)).toEqual(expect.arrayContaining([mine.number, other]))
  })

  it('does not tell strangers that a sheet exists', async () => {
    const { body } = await create(administrator)
    expect((await compiler.get(`/api/sheets/${body.number}`)).status).toBe(404)
  })
})

describe('coordinate systems', () => {
  it('are found by their EPSG code if a sheet can be drawn in them', async () => {
    const { body } = await compiler.get('/api/crs/32626')
    expect(body).toEqual({
      srid: 32626,
      name: 'WGS 84 / UTM zone 26N',
      proj4: '+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs',
    })
    const geographic = await compiler.get('/api/crs/4326')
    expect(geographic.status).toBe(404)
    expect(geographic.body.detail).toContain('not a projected system')
  })
})
