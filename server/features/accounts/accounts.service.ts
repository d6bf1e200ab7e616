import type { DataSource } from 'typeorm'
import type { DemoAccount, Role } from '@shared/api/accounts'
import type { AuditEvent } from '@shared/audit/audit-event'
import { keepAudit } from '../../platform/audit'
import type { AccessFinder, SheetIdentity, SignedIn } from '../../platform/http/access'
import { Account } from './account.entity'
import { findForSignIn, findSheetIdentity, listRolesOn } from './accounts.queries'
import { demoAccounts } from './demo-accounts'
import { isPassword } from './passwords'

/** Knows who signs in, and what their memberships let them do. */
export class AccountsService implements AccessFinder {
  constructor(
    private readonly dataSource: DataSource,
    /** Whether the demo is served, on loopback: only then may its accounts sign in. */
    private readonly demo: boolean,
  ) {}

  /** The person whose e-mail and password these are. Takes equally long whether the e-mail is known or not. */
  async verify(email: string, password: string): Promise<SignedIn | undefined> {
    const account = await findForSignIn(this.dataSource.manager, email.trim().toLowerCase())
    const right = await isPassword(password, account?.passwordHash ?? null)
    return right && account && this.mayEnter(account) ? toSignedIn(account) : undefined
  }

  /** The person of a session; undefined once their account may not be used. */
  async findSignedIn(id: string): Promise<SignedIn | undefined> {
    const account = await this.dataSource.manager.findOneBy(Account, { id })
    return account && this.mayEnter(account) ? toSignedIn(account) : undefined
  }

  /** Keeps in the audit trail what changes nothing in the database: a session begun, refused or ended, a download. */
  async keepEvent(event: AuditEvent, accountId: string | null, sheet?: string): Promise<void> {
    await this.dataSource.transaction((em) =>
      keepAudit(em, { event, accountId, ...(sheet ? { sheet } : {}) }),
    )
  }

  /** Accounts to show on the sign-in page: none unless the demo is served on loopback. */
  listDemoAccounts(): DemoAccount[] {
    return this.demo ? [...demoAccounts] : []
  }

  findSheet(number: string): Promise<SheetIdentity | undefined> {
    return findSheetIdentity(this.dataSource.manager, number)
  }

  listRoles(accountId: string, sheetId: string): Promise<Role[]> {
    return listRolesOn(this.dataSource.manager, accountId, sheetId)
  }

  private mayEnter(account: Account): boolean {
    return this.demo || !account.demo
  }
}

export const toSignedIn = ({ id, email, name, initials, administrator }: Account): SignedIn => ({
  id,
  email,
  name,
  initials,
  administrator,
})
