import type { DataSource } from 'typeorm'
import type { z } from 'zod'
import type { AccountRow, inviteAccount, Member, Role } from '@shared/api/accounts'
import type { SignedIn } from '../../platform/http/access'
import { problem } from '../../platform/problem'
import { Account } from '../accounts/account.entity'
import type { AccountsService } from '../accounts/accounts.service'
import { toInitials } from '../accounts/initials'
import type { LinksService } from '../accounts/links.service'
import { Membership } from '../accounts/membership.entity'
import { putInvited, selectAccounts, selectMembers, type AccountWithState } from './administration.queries'

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
  async invite(person: z.output<typeof inviteAccount.body>): Promise<{ account: AccountRow; link: string }> {
    return this.dataSource.transaction(async (em) => {
      const account = await putInvited(em, { ...person, initials: toInitials(person.name) })
      if (!account) throw accountExists(person.email)
      return { account: toAccountRow(account), link: await this.links.makeInvitation(em, account.id) }
    })
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
      await em.delete(Membership, member)
      for (const role of new Set(roles)) await em.insert(Membership, { ...member, role })
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
