import type { DataSource } from 'typeorm'
import type { z } from 'zod'
import type { AccountRow, inviteAccount, Member, Role } from '@shared/api/accounts'
import type { AuditEntry, AuditQuery } from '@shared/api/audit'
import { keepAudit } from '../../platform/audit'
import type { SignedIn } from '../../platform/http/access'
import { problem } from '../../platform/problem'
import { Account } from '../accounts/account.entity'
import { listRolesOn } from '../accounts/accounts.queries'
import type { AccountsService } from '../accounts/accounts.service'
import { toInitials } from '../accounts/initials'
import type { LinksService } from '../accounts/links.service'
import { Membership } from '../accounts/membership.entity'
import { putInvited, selectAccounts, selectMembers, type AccountWithState } from './administration.queries'
import { selectAuditPage } from './audit.queries'

/** Looks after people and who works on which sheet. */
export class AdministrationService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly accounts: AccountsService,
    private readonly links: LinksService,
  ) {}

  /** All accounts, by name. */
  async listAccounts(): Promise<AccountRow[]> {
    return (await selectAccounts(this.dataSource.manager)).map(toAccountRow)
  }

  /** Makes an account without a password and the link by which its owner sets one. Inviting again somebody who has not
   *  answered replaces the earlier link. */
  async invite(
    person: z.output<typeof inviteAccount.body>,
    byId: string | null,
  ): Promise<{ account: AccountRow; link: string }> {
    return this.dataSource.transaction(async (em) => {
      const account = await putInvited(em, { ...person, initials: toInitials(person.name) })
      if (!account) throw accountExists(person.email)
      const link = await this.links.makeInvitation(em, account.id)
      const { email, administrator } = account
      await keepAudit(em, { event: { kind: 'invitation', email, administrator }, accountId: byId })
      return { account: toAccountRow(account), link }
    })
  }

  /** A page of the audit trail, newest first; `next` is what to ask for as `before`, null on the last page. */
  async listAudit(query: AuditQuery): Promise<{ entries: AuditEntry[]; next: number | null }> {
    const entries = await selectAuditPage(this.dataSource.manager, query)
    const last = entries.length === query.limit ? entries.at(-1) : undefined
    return { entries, next: last && last.number > 1 ? last.number : null }
  }

  /** Who works on a sheet, by name. */
  async listMembers(sheetId: string): Promise<Member[]> {
    const rows = await selectMembers(this.dataSource.manager, sheetId)
    return rows.map(({ email, roles, ...person }) => ({ person, email, roles }))
  }

  /** Gives a person exactly these roles on a sheet; none ends their membership. Nobody sets their own. */
  async setMember(
    sheetNumber: string,
    accountId: string,
    roles: readonly Role[],
    by: SignedIn,
  ): Promise<void> {
    if (accountId === by.id) {
      throw problem('not-allowed', 'Nobody sets their own roles: another administrator has to do it.')
    }
    const sheet = await this.accounts.findSheet(sheetNumber)
    if (!sheet) throw problem('not-found', `There is no sheet ${sheetNumber}.`)
    await this.dataSource.transaction(async (em) => {
      // Held until the end, so that two who set the same person's roles do so one after the other.
      const found = await em.findOne(Account, {
        where: { id: accountId },
        lock: { mode: 'pessimistic_write' },
      })
      if (!found) throw problem('not-found', 'There is no such account.')
      const member = { sheetId: sheet.id, accountId }
      const before = await listRolesOn(em, accountId, sheet.id)
      await em.delete(Membership, member)
      for (const role of new Set(roles)) await em.insert(Membership, { ...member, role })
      await keepAudit(em, {
        event: { kind: 'membership', email: found.email, before, after: [...new Set(roles)].toSorted() },
        accountId: by.id,
        sheet: sheet.number,
      })
    })
  }
}

const toAccountRow = ({ createdAt, ...account }: AccountWithState): AccountRow => ({
  ...account,
  createdAt: createdAt.toISOString(),
})

function accountExists(email: string) {
  const detail = `There is an account ${email} already.`
  return problem('account-exists', detail, { errors: [{ pointer: '/email', detail }] })
}
