import { pipeline } from 'node:stream/promises'
import { Readable } from 'node:stream'
import type { Response, Router } from 'express'
import { z } from 'zod'
import { compareStates, exportComparisonMap, exportComparisonTable } from '@shared/api/comparisons'
import {
  getChanges,
  getItemHistory,
  getItems,
  listNamedRevisions,
  listRevisions,
  nameRevision,
  postRevision,
  unnameRevision,
} from '@shared/api/ledger'
import { previewRestore, restoreSheet } from '@shared/api/restores'
import { serve } from '../../platform/http/serve'
import { problem } from '../../platform/problem'
import type { ComparisonService, States } from './comparison.service'
import type { HistoryService } from './history.service'
import type { LedgerService } from './ledger.service'
import type { NamedRevisionsService } from './named-revisions.service'
import type { RestoreService } from './restore.service'

export interface LedgerServices {
  ledger: LedgerService
  history: HistoryService
  names: NamedRevisionsService
  comparisons: ComparisonService
  restores: RestoreService
}

export function mountLedger(router: Router, services: LedgerServices): void {
  const { ledger, history, names, comparisons, restores } = services
  serve(router, getItems, ({ sheet, query }) => history.listItems(sheet.id, query.revision))
  serve(router, postRevision, ({ sheet, account, roles, body, header }) =>
    ledger.post(sheet.id, { person: account, roles }, keyOf(header), body),
  )
  serve(router, listRevisions, ({ sheet, query: { before, limit, ...filter } }) =>
    history.listEntries(sheet.id, { filter, before, limit }),
  )
  serve(router, getChanges, ({ sheet, query }) => history.listChanges(sheet.id, query.since))
  serve(router, getItemHistory, ({ sheet, params }) => history.listVersions(sheet.id, params.item))

  serve(router, listNamedRevisions, ({ sheet }) => names.list(sheet.id))
  serve(router, nameRevision, ({ sheet, account, params, body }) =>
    names.put(sheet.id, account.id, params.revision, body),
  )
  serve(router, unnameRevision, async ({ sheet, account, params }) => {
    await names.remove(sheet.id, account.id, params.revision)
    return null
  })

  serve(router, compareStates, ({ sheet, query }) => comparisons.compare(sheet.id, query, query))
  serve(router, exportComparisonTable, async ({ sheet, query, response }) => {
    const parts = await comparisons.table(sheet.id, query)
    await sendFile(response, 'text/csv; charset=utf-8', fileName(sheet.number, query, 'csv'), parts)
  })
  serve(router, exportComparisonMap, async ({ sheet, query, response }) => {
    const parts = await comparisons.map(sheet.id, query)
    await sendFile(response, 'application/geo+json', fileName(sheet.number, query, 'geojson'), parts)
  })

  serve(router, previewRestore, ({ sheet, account, roles, body }) =>
    restores.preview(sheet.id, { person: account, roles }, body),
  )
  serve(router, restoreSheet, ({ sheet, account, roles, body, header }) =>
    restores.restore(sheet.id, { person: account, roles }, keyOf(header), body),
  )
}

const keySchema = z.uuid()

/** The key by which a repeated call is known. */
function keyOf(header: (name: string) => string | undefined): string {
  const key = keySchema.safeParse(header('Idempotency-Key'))
  if (key.success) return key.data
  throw problem(
    'invalid-input',
    'A change needs an Idempotency-Key header with a UUID, so that sending it twice changes the sheet once.',
  )
}

const fileName = (sheet: string, { from, to }: States, ending: string): string =>
  `${sheet}-${from}-${to}.${ending}`

/** Streams a file to be kept, as fast as its reader takes it. */
async function sendFile(
  response: Response,
  type: string,
  name: string,
  parts: AsyncIterable<string>,
): Promise<void> {
  response.attachment(name).type(type)
  await pipeline(Readable.from(parts), response)
}
