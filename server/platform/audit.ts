import { createHash } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import type { AuditEvent } from '@shared/audit/audit-event'
import { canonicalJson } from './canonical-json'

/** What is about to be kept: who did what, on which sheet. */
export interface Audited {
  event: AuditEvent
  /** Null where nobody is signed in. */
  accountId: string | null
  /** Number of the sheet that it is about, if it is about one. */
  sheet?: string
}

/** An entry as its hash covers it. */
export interface ChainedEntry {
  number: number
  at: Date
  kind: string
  accountId: string | null
  sheet: string | null
  detail: Record<string, unknown>
  previous: string
}

/** SHA-256 over everything in an entry, the hash of the entry before included: whoever alters one alters all that follow. */
export function chainHash({ number, at, kind, accountId, sheet, detail, previous }: ChainedEntry): string {
  const content = { number, at: at.toISOString(), kind, accountId, sheet, detail, previous }
  return createHash('sha256').update(canonicalJson(content)).digest('hex')
}

/** Keeps an event in the audit trail, within the transaction of its cause: both are there, or neither. It locks the end
 *  of the trail until the transaction ends, so it is the last thing that a transaction does. */
export async function keepAudit(em: EntityManager, { event, accountId, sheet }: Audited): Promise<void> {
  const [head] = await em.query<{ number: number; hash: string }[]>(
    'SELECT number, hash FROM audit_head FOR UPDATE',
  )
  if (!head) throw new Error('The audit trail has no head: its migration has not run.')
  const { kind, ...detail } = event
  const entry: ChainedEntry = {
    number: head.number + 1,
    at: new Date(),
    kind,
    accountId,
    sheet: sheet ?? null,
    detail,
    previous: head.hash,
  }
  const hash = chainHash(entry)
  await em.query(
    `INSERT INTO audit_entry (number, at, kind, account_id, sheet, detail, previous, hash)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8)`,
    [entry.number, entry.at, kind, accountId, entry.sheet, detail, entry.previous, hash],
  )
  await em.query('UPDATE audit_head SET number = $1, hash = $2', [entry.number, hash])
}
