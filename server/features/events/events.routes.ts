import type { Router } from 'express'
import type { DataSource } from 'typeorm'
import { listenToSheet, tellPresence, type Push } from '@shared/api/events'
import { announce } from '../../platform/announce'
import type { AccessFinder } from '../../platform/http/access'
import { serve } from '../../platform/http/serve'
import type { Jobs } from '../../platform/jobs'
import type { SheetEvents } from '../../platform/sheet-events'
import type { AccountsService } from '../accounts/accounts.service'
import type { SheetsService } from '../sheets/sheets.service'

export interface EventsRoom {
  dataSource: DataSource
  events: SheetEvents
  sheets: SheetsService
  jobs: Jobs
  accounts: AccountsService & AccessFinder
}

export function mountEvents(
  router: Router,
  { dataSource, events, sheets, jobs, accounts }: EventsRoom,
): void {
  serve(router, listenToSheet, ({ sheet, account, response }) =>
    events.listen({
      sheet: sheet.number,
      response,
      async readOpening(): Promise<Push[]> {
        const { revision, state } = await sheets.get(sheet.id, account.id)
        const recent = await jobs.listRecent(sheet.number)
        return [
          { event: 'revision', revision },
          { event: 'state', state },
          ...recent.map((job): Push => ({ event: 'job', job })),
        ]
      },
      async mayStay() {
        const person = await accounts.findSignedIn(account.id)
        return (
          person !== undefined &&
          (person.administrator || (await accounts.listRoles(person.id, sheet.id)).length > 0)
        )
      },
    }),
  )
  serve(router, tellPresence, async ({ sheet, account: { id, name, initials }, body }) => {
    await announce(dataSource.manager, sheet.number, {
      event: 'presence',
      person: { id, name, initials },
      presence: body,
    })
    return null
  })
}
