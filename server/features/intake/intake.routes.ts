import { pipeline } from 'node:stream/promises'
import type { Router } from 'express'
import {
  discardIntake,
  getIntake,
  getIntakeFile,
  listIntakes,
  previewIntake,
  takeInIntake,
  uploadIntake,
} from '@shared/api/intake'
import { serve } from '../../platform/http/serve'
import type { IntakeService } from './intake.service'

/** Routes of the intake room. */
export function mountIntake(router: Router, intake: IntakeService): void {
  serve(router, uploadIntake, async ({ sheet, account, file }) => intake.bring(sheet.id, account.id, file))
  serve(router, listIntakes, async ({ sheet }) => intake.list(sheet.id))
  serve(router, getIntake, async ({ sheet, params }) => intake.get(sheet.id, params.intake))
  serve(router, previewIntake, async ({ sheet, params, body }) =>
    intake.preview(sheet.id, params.intake, body.mapping),
  )
  serve(router, takeInIntake, async ({ sheet, params, account, body }) =>
    intake.takeIn(sheet.id, params.intake, account.id, body),
  )
  serve(router, discardIntake, async ({ sheet, params }) => {
    await intake.discard(sheet.id, params.intake)
    return null
  })
  serve(router, getIntakeFile, async ({ sheet, params, response }) => {
    const { name, bytes, source } = await intake.original(sheet.id, params.intake)
    // Sent to be kept, never to be shown: a file that someone brought must not run as a page of ours.
    response.attachment(name).type('application/octet-stream').setHeader('Content-Length', bytes)
    await pipeline(source, response)
  })
}
