import type { EntityManager } from 'typeorm'
import type { AuditEntry, AuditQuery } from '@shared/api/audit'
import { auditEventSchema } from '@shared/audit/audit-event'

interface Row extends Omit<AuditEntry, 'at' | 'event'> {
  at: Date
  kind: string
  detail: object
}

/** Entries of the audit trail that a filter leaves, newest first. */
export async function selectAuditPage(
  em: EntityManager,
  { kind, person, sheet, since, until, before, limit }: AuditQuery,
): Promise<AuditEntry[]> {
  const values: unknown[] = []
  const value = (given: unknown): string => `$${values.push(given)}`
  const conditions = [
    ...(kind ? [`entry.kind = ${value(kind)}`] : []),
    ...(person ? [`entry.account_id = ${value(person)}`] : []),
    ...(sheet ? [`entry.sheet = ${value(sheet)}`] : []),
    ...(since ? [`entry.at >= ${value(since)}`] : []),
    ...(until ? [`entry.at < ${value(until)}`] : []),
    ...(before === undefined ? [] : [`entry.number < ${value(before)}`]),
  ]
  const rows = await em.query<Row[]>(
    `SELECT entry.number, entry.at, entry.kind, entry.sheet, entry.detail, entry.hash,
       CASE WHEN account.id IS NOT NULL
         THEN json_build_object('id', account.id, 'name', account.name, 'initials', account.initials) END AS person
     FROM audit_entry AS entry LEFT JOIN account ON account.id = entry.account_id
     ${conditions.length > 0 ? `WHERE ${conditions.join(' AND ')}` : ''}
     ORDER BY entry.number DESC LIMIT ${value(limit)}`,
    values,
  )
  return rows.map(({ at, kind: written, detail, ...entry }) => ({
    ...entry,
    at: at.toISOString(),
    event: auditEventSchema.parse({ kind: written, ...detail }),
  }))
}
