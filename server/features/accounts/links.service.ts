import { createHash, randomBytes } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { z } from 'zod'
import type { acceptLink, getLink } from '@shared/api/accounts'
import { keepAudit } from '../../platform/audit'
import type { SignedIn } from '../../platform/http/access'
import { problem } from '../../platform/problem'
import { Account } from './account.entity'
import { hasAdministrator, lockGoodLink } from './accounts.queries'
import { toSignedIn } from './accounts.service'
import { toInitials } from './initials'
import { Link } from './link.entity'
import { hashPassword } from './passwords'

const HOUR_MS = 3_600_000
const FIRST_ADMINISTRATOR_MS = 24 * HOUR_MS
const INVITATION_MS = 7 * 24 * HOUR_MS
/** 256 random bits: a link is as good as a password until it is used. */
const TOKEN_BYTES = 32
/** Any number, the same for every process: two first administrators cannot be made at once. */
const FIRST_ADMINISTRATOR_LOCK = 4_310_002

/** Makes one-time links and takes what people set by them. */
export class LinksService {
  constructor(
    private readonly dataSource: DataSource,
    /** Address that links begin with. */
    private readonly url: string,
  ) {}

  /** A link by which the first administrator sets name and password; undefined once there is one. */
  async makeFirstAdministratorLink(): Promise<string | undefined> {
    const em = this.dataSource.manager
    if (await hasAdministrator(em)) return undefined
    return this.make(em, { purpose: 'first-administrator', accountId: null, validMs: FIRST_ADMINISTRATOR_MS })
  }

  /** An invitation; voids the account's earlier ones. */
  async makeInvitation(em: EntityManager, accountId: string): Promise<string> {
    await voidLinks(em, { accountId })
    return this.make(em, { purpose: 'invitation', accountId, validMs: INVITATION_MS })
  }

  /** What a link is for. */
  async describe(token: string): Promise<z.infer<typeof getLink.answer>> {
    return this.dataSource.transaction(async (em) => {
      const link = await getGoodLink(em, token)
      const account = link.accountId ? await em.findOneBy(Account, { id: link.accountId }) : null
      return { purpose: link.purpose, email: account?.email ?? null, name: account?.name ?? null }
    })
  }

  /** Sets name and password, and uses the link up. */
  async accept(token: string, person: z.output<typeof acceptLink.body>): Promise<SignedIn> {
    const passwordHash = await hashPassword(person.password)
    return this.dataSource.transaction(async (em) => {
      const link = await getGoodLink(em, token)
      const named = { name: person.name, initials: toInitials(person.name), passwordHash }
      const account = link.accountId
        ? await acceptInvitation(em, link.accountId, person.email, named)
        : await makeFirstAdministrator(em, person.email, named)
      await em.update(Link, { id: link.id }, { usedAt: new Date() })
      const { email } = account
      await keepAudit(em, {
        event: { kind: 'password-set', email, purpose: link.purpose },
        accountId: account.id,
      })
      return toSignedIn(account)
    })
  }

  private async make(
    em: EntityManager,
    { purpose, accountId, validMs }: Pick<Link, 'purpose' | 'accountId'> & { validMs: number },
  ): Promise<string> {
    const token = randomBytes(TOKEN_BYTES).toString('base64url')
    const expiresAt = new Date(Date.now() + validMs)
    await em.insert(Link, { tokenHash: hashToken(token), purpose, accountId, expiresAt })
    return `${this.url}/link/${token}`
  }
}

type Named = Pick<Account, 'name' | 'initials' | 'passwordHash'>

async function acceptInvitation(
  em: EntityManager,
  id: string,
  email: string,
  named: Named,
): Promise<Account> {
  const account = await em.findOneByOrFail(Account, { id })
  if (account.email !== email) {
    const detail = `This invitation is for ${account.email}.`
    throw problem('invalid-input', detail, { errors: [{ pointer: '/email', detail }] })
  }
  await em.update(Account, { id }, named)
  return Object.assign(account, named)
}

async function makeFirstAdministrator(em: EntityManager, email: string, named: Named): Promise<Account> {
  await em.query('SELECT pg_advisory_xact_lock($1)', [FIRST_ADMINISTRATOR_LOCK])
  if (await hasAdministrator(em)) throw problem('link-used', 'There is an administrator already.')
  if (await em.existsBy(Account, { email })) {
    const detail = `There is an account ${email} already.`
    throw problem('account-exists', detail, { errors: [{ pointer: '/email', detail }] })
  }
  await voidLinks(em, { purpose: 'first-administrator' })
  return em.save(Account, em.create(Account, { email, ...named, administrator: true }))
}

async function getGoodLink(em: EntityManager, token: string): Promise<Link> {
  const link = await lockGoodLink(em, hashToken(token))
  if (!link)
    throw problem(
      'link-used',
      'This link is not good any more: it was used, it has expired, or there was a newer one.',
    )
  return link
}

const voidLinks = async (
  em: EntityManager,
  which: Partial<Pick<Link, 'accountId' | 'purpose'>>,
): Promise<void> => {
  await em
    .createQueryBuilder()
    .update(Link)
    .set({ usedAt: new Date() })
    .where(which)
    .andWhere('used_at IS NULL')
    .execute()
}

/** Tokens are long and random, so a plain hash suffices: nobody can try them all. */
const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex')
