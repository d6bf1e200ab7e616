import { randomUUID } from 'node:crypto'
import { promisify } from 'node:util'
import { gzip } from 'node:zlib'
import { itemSchema, type Item } from '@shared/items/item'
import { seededRandom } from '@shared/seeded-random'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'
import { inTurn, type BenchRow } from '../measure'

const LARGE = 100_000
const SMALL = 1_000
const SAVES = 100
const OPENINGS = 7

/** Rows of the ledger: saving one edit, and the server's part of opening a sheet. */
async function unusedRows(): Promise<BenchRow[]> {
  const server = await startTestServer({}, { checkAnswers: false })
  try {
    const editor = await signInAs(server, 'editor')
    const large = await fillSheet(server, LARGE)
    const small = await fillSheet(server, SMALL)
    await server.asSuperuser('VACUUM ANALYZE')
    return [await saveRow(editor, large, small), await openRow(server, editor, large)]
  } finally {
    await server.close()
  }
}

interface FilledSheet {
  id: string
  number: string
  items: Item[]
}

async function saveRow(editor: Agent, large: FilledSheet, small: FilledSheet): Promise<BenchRow> {
  const [next, nextSmall] = [saver(editor, large), saver(editor, small)]
  return {
    what: `save one edit on a sheet of ${LARGE} items`,
    reference: `the same on a sheet of ${SMALL}`,
    target: 1.2,
    ...(await inTurn(SAVES, next, nextSmall)),
  }
}

/** Moves one item after the other by a metre, each as an entry of its own, over HTTP. */
function saver(editor: Agent, { number, items }: FilledSheet): () => Promise<void> {
  let count = 0
  return async () => {
    const item = items[(count * 37) % items.length]
    count += 1
    const { status, body } = await editor
      .post(`/api/sheets/${number}/revisions`)
      .set('Idempotency-Key', randomUUID())
      .send({ base: count + 1, changes: [{ op: 'put', item: item && moved(item) }] })
    if (status !== 201) throw new Error(JSON.stringify(body))
  }
}

function moved(item: Item): unknown {
  const { geometry } = item
  if (geometry?.type !== 'LineString')
    return { ...item, geometry: { type: 'Point', coordinates: [285_000, 5_280_000] } }
  const coordinates = geometry.coordinates.map(([x, y]) => [x + 1, y])
  return { ...item, geometry: { type: 'LineString', coordinates } }
}

/** Only the server's part of the row in quality.md: from the call to the last byte of the answer, against the same rows as
 *  FlatGeobuf straight from PostGIS, packed as tightly. */
async function openRow(server: TestServer, editor: Agent, sheet: FilledSheet): Promise<BenchRow> {
  const pack = promisify(gzip)
  const open = () =>
    editor
      .get(`/api/sheets/${sheet.number}/items`)
      .set('Accept-Encoding', 'gzip')
      .buffer(false)
      .parse((response, done) => {
        response.on('data', () => undefined)
        response.on('end', () => done(null, null))
      })
  const bare = async () => {
    // A FlatGeobuf file of PostGIS holds one type of geometry.
    for (const type of ['LINESTRING', 'POINT']) {
      const [row] = await server.dataSource.query<{ file: Buffer }[]>(
        `SELECT ST_AsFlatGeobuf(item, false, 'geometry') AS file FROM (
           SELECT item_id::text AS id, kind, properties::text AS properties, geometry FROM item_version
           WHERE sheet_id = $1 AND until IS NULL AND GeometryType(geometry) = $2) AS item`,
        [sheet.id, type],
      )
      if (row) await pack(row.file)
    }
  }
  return {
    what: `open a sheet of ${LARGE} items (the server’s part only)`,
    reference: 'ST_AsFlatGeobuf of the same rows, gzip',
    target: 1.3,
    ...(await inTurn(OPENINGS, open, bare)),
  }
}

export async function fillSheet(server: TestServer, count: number): Promise<FilledSheet> {
  const { id, number } = await aSheet(server)
  const [author] = await server.dataSource.query(
    `SELECT id FROM account WHERE email = 'editor@merrow.example'`,
  )
  const items = makeItems(count)
  await server.dataSource.transaction((em) =>
    server.services.ledger.appendItems(
      em,
      id,
      author.id,
      items.map((item) => ({ item, provenance: null })),
      { kind: 'intake', message: `took in ${count} items` },
    ),
  )
  return { id, number, items }
}

/** Three contacts of a dozen vertices to one attitude, spread over the sheet; the same in every run but for their ids. */
function makeItems(count: number): Item[] {
  const random = seededRandom(count)
  const metres = (value: number): number => Math.round(value * 1000) / 1000
  return Array.from({ length: count }, (_, index) => {
    let [x, y] = [284_000 + random() * 9_000, 5_278_000 + random() * 10_000]
    const id = randomUUID()
    if (index % 4 === 3) {
      const properties = { strike: metres(random() * 359), dip: metres(random() * 90), station: `B-${index}` }
      return itemSchema.parse({
        kind: 'attitude',
        id,
        geometry: { type: 'Point', coordinates: [metres(x), metres(y)] },
        properties,
      })
    }
    const coordinates = Array.from({ length: 12 }, () => {
      x += random() * 30
      y += (random() - 0.5) * 30
      return [metres(x), metres(y)]
    })
    return itemSchema.parse({
      kind: 'contact',
      id,
      geometry: { type: 'LineString', coordinates },
      properties: {},
    })
  })
}
