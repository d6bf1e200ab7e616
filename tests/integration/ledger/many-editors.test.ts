import { randomUUID } from 'node:crypto'
import { createServer } from 'node:http'
import { afterAll, beforeAll, expect, it } from 'vitest'
import type { Item } from '@shared/items/item'
import { createApp } from '../../../server/app'
import { VerificationService } from '../../../server/features/verification/verification.service'
import { createServices, type Services } from '../../../server/services'
import { aContact, put, useLedgerDesk, type Draft } from '../../support/ledger-desk'
import { signInAs, type Agent } from '../../support/server'

const desk = useLedgerDesk()
const EDITORS = 50
const SAVES = 5
const SHARED = 8

/** A second web process's worth of server on the same database. */
let other: { url: string; services: Services; close(): Promise<void> }

beforeAll(async () => {
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const address = server.address()
  if (address === null || typeof address === 'string') throw new Error('The second server has no port.')
  const url = `http://127.0.0.1:${address.port}`
  const services = await createServices({ ...desk.server.services.config, url })
  server.on('request', createApp(services, { checkAnswers: true }))
  other = {
    url,
    services,
    async close() {
      server.closeAllConnections()
      await new Promise((resolve) => server.close(resolve))
      await services.close()
    },
  }
})
afterAll(() => other.close())

interface Saved {
  id: string
  revision: number
  note: string
}

/** One editor: changes shared lines again and again, and where told of a conflict, looks at the other side and tries again. */
async function edit(
  agent: Agent,
  name: string,
  lines: readonly Draft[],
): Promise<{ saved: Saved[]; conflicts: number }> {
  const saved: Saved[] = []
  let conflicts = 0
  let base = 2
  for (let count = 0; count < SAVES; count++) {
    const line = lines[(name.length * 7 + Number(name) * 3 + count) % lines.length] ?? aContact()
    const note = `${name}, ${count}`
    for (;;) {
      const { status, body } = await agent
        .post(`/api/sheets/${desk.sheet}/revisions`)
        .set('Idempotency-Key', randomUUID())
        .send({ base, changes: [put(aContact({ note }, line.id))] })
      if (status === 201) {
        saved.push({ id: line.id, revision: body.revision, note })
        base = body.revision
        break
      }
      // Nothing but a conflict is in the way, over this line alone, and what the other side wrote is shown.
      expect([status, body.type]).toEqual([409, '/problems/item-conflict'])
      expect(body.items.map((item: { id: string }) => item.id)).toEqual([line.id])
      expect(body.items[0].yours.properties.note).toBe(note)
      expect(body.items[0].theirs.properties.note).not.toBe(note)
      conflicts += 1
      base = (await agent.get(`/api/sheets/${desk.sheet}`)).body.revision
    }
  }
  return { saved, conflicts }
}

it(
  'fifty editors at two servers lose nothing, and their ledger has no gap',
  async () => {
    const lines = Array.from({ length: SHARED }, () => aContact())
    await desk.post(desk.editor, lines.map(put))
    const agents = [
      desk.editor,
      desk.compiler,
      await signInAs(other, 'editor'),
      await signInAs(other, 'compiler'),
    ]
    const outcomes = await Promise.all(
      Array.from({ length: EDITORS }, (_, index) => {
        const agent = agents[index % agents.length]
        if (!agent) throw new Error('There is no such agent.')
        return edit(agent, String(index), lines)
      }),
    )
    const saved = outcomes.flatMap((outcome) => outcome.saved).toSorted((a, b) => a.revision - b.revision)
    expect(saved.map(({ revision }) => revision)).toEqual(
      Array.from({ length: EDITORS * SAVES }, (_, index) => index + 3),
    )
    expect(outcomes.reduce((sum, { conflicts }) => sum + conflicts, 0)).toBeGreaterThan(0)
    const versions = await desk.server.dataSource.query<{ id: string; since: number; note: string }[]>(
      `SELECT item_id AS id, since, properties->>'note' AS note FROM item_version
       WHERE sheet_id = $1 AND since > 2 ORDER BY since`,
      [await desk.sheetId()],
    )
    expect(versions).toEqual(saved.map(({ id, revision, note }) => ({ id, since: revision, note })))
    const now = new Map((await desk.items()).map((item: Item) => [item.id, item]))
    for (const { id } of lines) {
      const last = saved.findLast((each) => each.id === id)
      expect(now.get(id)?.properties).toMatchObject({ note: last?.note ?? '' })
    }
    const { dataSource, storage, sheets, history } = other.services
    const findings = await new VerificationService(dataSource, storage, sheets, history).verify()
    expect(findings.flatMap(({ faults }) => faults)).toEqual([])
  },
  // Fifty at once on two processors, with whatever else the machine does.
  120_000,
)
