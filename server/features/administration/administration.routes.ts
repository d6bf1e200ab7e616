import type { Router } from 'express'
import { inviteAccount, listAccounts, listMembers, setMember } from '@shared/api/accounts'
import { listAuditEntries } from '@shared/api/audit'
import { serve } from '../../platform/http/serve'
import type { AdministrationService } from './administration.service'

export function mountAdministration(router: Router, administration: AdministrationService): void {
  serve(router, listAccounts, () => administration.listAccounts())
  serve(router, inviteAccount, ({ body, account }) => administration.invite(body, account.id))
  serve(router, listAuditEntries, ({ query }) => administration.listAudit(query))
  serve(router, listMembers, ({ sheet }) => administration.listMembers(sheet.id))
  serve(router, setMember, async ({ params, body, account }) => {
    await administration.setMember(params.sheet, params.account, body.roles, account)
    return null
  })
}
