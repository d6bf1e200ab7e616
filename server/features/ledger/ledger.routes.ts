import type { Router } from 'express'
import { z } from 'zod'
import { getChanges, getItemHistory, getItems, listRevisions, postRevision } from '@shared/api/ledger'
import { serve } from '../../platform/http/serve'
import { problem } from '../../platform/problem'
import type { HistoryService } from './history.service'
import type { LedgerService } from './ledger.service'

const keySchema = z.uuid()

export function mountLedger(router: Router, ledger: LedgerService, history: HistoryService): void {
  serve(router, getItems, ({ sheet, query }) => history.listItems(sheet.id, query.revision))
  serve(router, postRevision, ({ sheet, account, roles, body, header }) => {
    const key = keySchema.safeParse(header('Idempotency-Key'))
    if (!key.success) {
      throw problem(
        'invalid-input',
        'A change needs an Idempotency-Key header with a UUID, so that sending it twice changes the sheet once.',
      )
    }
    return ledger.post(sheet.id, { person: account, roles }, key.data, body)
  })
  serve(router, listRevisions, ({ sheet, query }) => history.listEntries(sheet.id, query))
  serve(router, getChanges, ({ sheet, query }) => history.listChanges(sheet.id, query.since))
  serve(router, getItemHistory, ({ sheet, params }) => history.listVersions(sheet.id, params.item))
}
