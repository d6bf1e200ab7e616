import { randomUUID } from 'node:crypto'
import { decideSubmission, getSubmission, type Submission } from '@shared/api/review'
import type { Job } from '@shared/api/jobs'
import { itemSchema, type Item } from '@shared/items/item'
import type { Agent } from './server'

/** A plain message to wait for a job, longer than any of these takes. */
const PATIENCE_MS = 20_000

/** Puts items on a sheet as one entry; answers with the new revision. */
export async function putItems(
  agent: Agent,
  sheet: string,
  base: number,
  items: Item[],
  message = '',
): Promise<number> {
  const response = await agent
    .post(`/api/sheets/${sheet}/revisions`)
    .set('Idempotency-Key', randomUUID())
    .send({ base, message, changes: items.map((item) => ({ op: 'put', item })) })
  if (response.status !== 201) throw new Error(`${response.status} ${JSON.stringify(response.body)}`)
  return response.body.revision
}

export const anItem = (item: object): Item => itemSchema.parse({ id: randomUUID(), ...item })

/** A unit with the label that stands for it, an attitude, and a contact across the whole of a sheet of 10 × 11 km. */
export function aSmallMap(): Item[] {
  const younger = anItem({
    kind: 'unit',
    geometry: null,
    properties: { label: 'Df', name: 'Fulmar Sandstone', age: 'Devonian', colour: '#cf9d86', rank: 1 },
  })
  const older = anItem({
    kind: 'unit',
    geometry: null,
    properties: { label: 'Sp', name: 'Spindrift Limestone', age: 'Silurian', colour: '#b4cbc7', rank: 2 },
  })
  const point = (east: number, north: number) => ({ type: 'Point', coordinates: [east, north] })
  return [
    younger,
    older,
    anItem({
      kind: 'contact',
      geometry: {
        type: 'LineString',
        coordinates: [
          [284_000, 5_283_000],
          [294_000, 5_284_000],
        ],
      },
      properties: {},
    }),
    anItem({ kind: 'unit-label', geometry: point(289_000, 5_287_000), properties: { unit: younger.id } }),
    anItem({ kind: 'unit-label', geometry: point(289_000, 5_280_000), properties: { unit: older.id } }),
    anItem({ kind: 'attitude', geometry: point(287_000, 5_280_000), properties: { strike: 45, dip: 40 } }),
  ]
}

export async function latestSubmission(agent: Agent, sheet: string): Promise<Submission> {
  const response = await agent.get(`/api${getSubmission.path.replace('{sheet}', sheet)}`)
  return response.body
}

export const submit = (agent: Agent, sheet: string, revision: number, message = 'For review') =>
  agent.post(`/api/sheets/${sheet}/submission`).send({ revision, message })

export const decide = (
  agent: Agent,
  sheet: string,
  decision: 'approved' | 'returned',
  digest: string,
  note = '',
) => agent.post(`/api${decideSubmission.path.replace('{sheet}', sheet)}`).send({ decision, digest, note })

export const release = (agent: Agent, sheet: string) => agent.post(`/api/sheets/${sheet}/release`).send({})

/** Waits until a job has ended, well or badly. */
export async function jobEnd(agent: Agent, id: string): Promise<Job> {
  const until = Date.now() + PATIENCE_MS
  for (;;) {
    const { body } = await agent.get(`/api/jobs/${id}`)
    if (body.state === 'done' || body.state === 'failed') return body
    if (Date.now() > until) throw new Error(`The job is still ${body.state}: ${body.message}`)
    await new Promise((resolve) => setTimeout(resolve, 50))
  }
}

/** Takes a sheet from its revision to a released edition. */
export async function releaseEdition(
  people: { editor: Agent; approver: Agent },
  sheet: string,
  revision: number,
): Promise<Job> {
  const submitted = await submit(people.editor, sheet, revision)
  await decide(people.approver, sheet, 'approved', submitted.body.digest)
  const job = await release(people.approver, sheet)
  return jobEnd(people.approver, job.body.id)
}
