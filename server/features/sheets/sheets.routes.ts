import type { Router } from 'express'
import { createSheet, getCrs, getSheet, listSheets } from '@shared/api/sheets'
import { serve } from '../../platform/http/serve'
import type { SheetsService } from './sheets.service'

export function mountSheets(router: Router, sheets: SheetsService): void {
  serve(router, listSheets, ({ account }) => sheets.list(account))
  serve(router, createSheet, ({ account, body }) => sheets.create(body, account))
  serve(router, getSheet, ({ sheet, account }) => sheets.get(sheet.id, account.id))
  serve(router, getCrs, ({ params }) => sheets.getCrs(params.srid))
}
