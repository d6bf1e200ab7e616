import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, beforeEach } from 'vitest'
import type { Item } from '@shared/items/item'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from './server'

/** An item as a client writes it: the server fills in what is left out. */
export interface Draft {
  kind: string
  id: string
  geometry: unknown
  properties: object
}

export const aContact = (properties: object = {}, id: string = randomUUID()): Draft => ({
  kind: 'contact',
  id,
  geometry: {
    type: 'LineString',
    coordinates: [
      [285_000, 5_280_000],
      [286_000, 5_281_000],
    ],
  },
  properties,
})

export const anAttitude = (properties: object = {}, id: string = randomUUID()): Draft => ({
  kind: 'attitude',
  id,
  geometry: { type: 'Point', coordinates: [285_500, 5_280_200] },
  properties: { strike: 45, dip: 35, ...properties },
})

export const aUnit = (label = 'Sp', id: string = randomUUID()): Draft => ({
  kind: 'unit',
  id,
  geometry: null,
  properties: { label, name: 'Spindrift Limestone', colour: '#b7cdc9', rank: 1 },
})

export const aLabel = (unit: string, id: string = randomUUID()): Draft => ({
  kind: 'unit-label',
  id,
  geometry: { type: 'Point', coordinates: [285_500, 5_280_900] },
  properties: { unit },
})

export const put = (item: Draft | Item) => ({ op: 'put', item })
export const remove = (id: string) => ({ op: 'remove', id })

/** The four demo people at one server, and an empty sheet of theirs that is new in each test. */
export class LedgerDesk {
  server!: TestServer // Set before the first test, as are the people.
  compiler!: Agent
  editor!: Agent
  approver!: Agent
  administrator!: Agent
  /** Number of the sheet that calls are about. */
  sheet = ''

  async open(): Promise<void> {
    this.server = await startTestServer()
    this.compiler = await signInAs(this.server, 'compiler')
    this.editor = await signInAs(this.server, 'editor')
    this.approver = await signInAs(this.server, 'approver')
    this.administrator = await signInAs(this.server, 'administrator')
  }

  async takeNewSheet(): Promise<void> {
    this.sheet = (await aSheet(this.server)).number
  }

  post(
    agent: Agent,
    changes: unknown[],
    { base = 1, message = '', key = randomUUID() }: { base?: number; message?: string; key?: string } = {},
  ) {
    return agent
      .post(`/api/sheets/${this.sheet}/revisions`)
      .set('Idempotency-Key', key)
      .send({ base, message, changes })
  }

  async items(revision?: number): Promise<Item[]> {
    const { body } = await this.compiler
      .get(`/api/sheets/${this.sheet}/items`)
      .query(revision === undefined ? {} : { revision })
    return body.items
  }

  async find(id: string, revision?: number): Promise<Item | undefined> {
    return (await this.items(revision)).find((item) => item.id === id)
  }

  async latest(): Promise<number> {
    return (await this.compiler.get(`/api/sheets/${this.sheet}`)).body.revision
  }

  /** The sheet's database id. */
  async sheetId(): Promise<string> {
    const id = await this.server.services.sheets.find(this.sheet)
    if (!id) throw new Error(`There is no sheet ${this.sheet}.`)
    return id
  }
}

/** A desk that opens before the first test of a file and closes after the last. */
export function useLedgerDesk(): LedgerDesk {
  const desk = new LedgerDesk()
  beforeAll(() => desk.open())
  beforeEach(() => desk.takeNewSheet())
  afterAll(() => desk.server.close())
  return desk
}
