import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { collection, feature, useIntakeDesk } from '../../support/intake-desk'

const desk = useIntakeDesk()
const content = collection([feature({ type: 'bedding', strike: 310, dip: 40 })])

describe('field files', () => {
  it('are brought, previewed and taken in by compilers and editors', async () => {
    for (const agent of [desk.compiler, desk.editor]) {
      const { status, body } = await desk.bring(content, 'field.geojson', agent)
      expect(status).toBe(201)
      expect((await desk.askPreview(body, body.proposal, agent)).status).toBe(200)
      expect((await desk.takeIn(body, { agent })).status).toBe(201)
    }
  })

  it('are seen by an approver, who changes nothing', async () => {
    const intake = await desk.brought(content)
    const path = `/api/sheets/${desk.sheet}/intakes`
    expect((await desk.approver.get(path)).body).toHaveLength(1)
    expect((await desk.approver.get(`${path}/${intake.id}/file`)).status).toBe(200)
    const answers = [
      await desk.bring(content, 'field.geojson', desk.approver),
      await desk.askPreview(intake, intake.proposal, desk.approver),
      await desk.takeIn(intake, { agent: desk.approver }),
      await desk.discard(intake, desk.approver),
    ]
    expect(answers.map(({ status }) => status)).toEqual([403, 403, 403, 403])
    expect(await desk.latest()).toBe(1)
    expect(await desk.intakes()).toHaveLength(1)
  })

  it('are found on their own sheet only', async () => {
    const intake = await desk.brought(content)
    await desk.takeNewSheet()
    expect((await desk.askPreview(intake, intake.proposal)).status).toBe(404)
    expect((await desk.takeIn(intake)).status).toBe(404)
    expect((await desk.discard(intake)).status).toBe(404)
    expect((await desk.takeIn({ ...intake, id: randomUUID() })).status).toBe(404)
    expect(await desk.intakes()).toEqual([])
  })
})
