import type { EntityManager } from 'typeorm'
import type { Push } from '@shared/api/events'

/** PostgreSQL channel that carries the announcements of all sheets. */
export const ANNOUNCEMENT_CHANNEL = 'sheet_push'

/** NOTIFY refuses payloads of 8000 bytes and more. */
const MAX_PAYLOAD_BYTES = 7999

/** What travels on the channel. */
export interface Announcement {
  /** Number of the sheet. */
  sheet: string
  push: Push
}

/** Tells every open client of a sheet, from whichever server process, once the transaction of `em` commits. */
export async function announce(em: EntityManager, sheetNumber: string, push: Push): Promise<void> {
  const announcement: Announcement = { sheet: sheetNumber, push }
  const payload = JSON.stringify(announcement)
  if (Buffer.byteLength(payload) > MAX_PAYLOAD_BYTES) {
    throw new RangeError(`An announcement carries numbers, not data: ${Buffer.byteLength(payload)} bytes.`)
  }
  await em.query('SELECT pg_notify($1, $2)', [ANNOUNCEMENT_CHANNEL, payload])
}
