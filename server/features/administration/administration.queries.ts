import type { EntityManager } from 'typeorm'
import type { Account as AccountAnswer, Role } from '@shared/api/accounts'
import type { Account } from '../accounts/account.entity'

export interface AccountWithState extends AccountAnswer {
  /** Whether it has a password. */
  active: boolean
  createdAt: Date
}

const accountColumns = `id, email, name, initials, administrator, password_hash IS NOT NULL AS active,
  created_at AS "createdAt"`

/** Every account, by name. */
export const selectAccounts = (em: EntityManager): Promise<AccountWithState[]> =>
  em.query(`SELECT ${accountColumns} FROM account ORDER BY name, email`)

/** Writes an account that has no password yet, also over an earlier one without; undefined if its owner is in already. */
export async function putInvited(
  em: EntityManager,
  { email, name, initials, administrator }: Pick<Account, 'email' | 'name' | 'initials' | 'administrator'>,
): Promise<AccountWithState | undefined> {
  const [row] = await em.query<AccountWithState[]>(
    `INSERT INTO account (email, name, initials, administrator) VALUES ($1, $2, $3, $4)
     ON CONFLICT (email) DO UPDATE
       SET name = excluded.name, initials = excluded.initials, administrator = excluded.administrator
       WHERE account.password_hash IS NULL
     RETURNING ${accountColumns}`,
    [email, name, initials, administrator],
  )
  return row
}

export interface MemberRow {
  id: string
  name: string
  initials: string
  email: string
  roles: Role[]
}

export const selectMembers = (em: EntityManager, sheetId: string): Promise<MemberRow[]> =>
  em.query(
    `SELECT account.id, account.name, account.initials, account.email, array_agg(role ORDER BY role)::text[] AS roles
     FROM membership JOIN account ON account.id = membership.account_id
     WHERE sheet_id = $1 GROUP BY account.id ORDER BY account.name, account.email`,
    [sheetId],
  )
