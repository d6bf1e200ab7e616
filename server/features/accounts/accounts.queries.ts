import { IsNull, MoreThan, type EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { SheetIdentity } from '../../platform/http/access'
import { SheetRow } from '../sheets/sheet.entity'
import { Account } from './account.entity'
import { Link } from './link.entity'
import { Membership } from './membership.entity'

/** An account with the hash of its password, which ordinary reading leaves out. */
export const findForSignIn = (em: EntityManager, email: string): Promise<Account | null> =>
  em.createQueryBuilder(Account, 'account').addSelect('account.passwordHash').where({ email }).getOne()

export async function listRolesOn(em: EntityManager, accountId: string, sheetId: string): Promise<Role[]> {
  const rows = await em.findBy(Membership, { accountId, sheetId })
  return rows.map((row) => row.role).sort()
}

export async function findSheetIdentity(
  em: EntityManager,
  number: string,
): Promise<SheetIdentity | undefined> {
  const sheet = await em.findOne(SheetRow, {
    select: { id: true, number: true, state: true },
    where: { number },
  })
  return sheet ?? undefined
}

/** Whether somebody could sign in as an administrator, the demo's apart. */
export const hasAdministrator = (em: EntityManager): Promise<boolean> =>
  em
    .createQueryBuilder(Account, 'account')
    .where('account.administrator AND NOT account.demo AND account.passwordHash IS NOT NULL')
    .getExists()

/** A link that is still good, held until the transaction ends, so that two who use it at once do so one after the other. */
export const lockGoodLink = (em: EntityManager, tokenHash: string): Promise<Link | null> =>
  em.findOne(Link, {
    where: { tokenHash, usedAt: IsNull(), expiresAt: MoreThan(new Date()) },
    lock: { mode: 'pessimistic_write' },
  })
