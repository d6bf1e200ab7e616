import { createHash } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { Provenance } from '@shared/api/ledger'
import type { LedgerEntry } from '@shared/api/sheets'
import type { Change, ChangeSet, Edit } from '@shared/changes/change-set'
import { describeChanges } from '@shared/changes/describe-changes'
import type { Item, ItemKind } from '@shared/items/item'
import { snapItem } from '@shared/items/snap-item'
import { announce } from '../../platform/announce'
import { problem } from '../../platform/problem'
import { boundsOf } from '@shared/items/item-bounds'
import { changedId, findFaults, type SheetRows } from './check-changes'
import { findEntryByKey, insertEntry, selectEntries } from './entries.queries'
import {
  loadRows,
  mergeChanges,
  requireDrafting,
  requireEditorForLegend,
  requireReached,
  requireWithinSystem,
  type Author,
} from './ledger-rules'
import { closeVersions, insertVersions, lockSheet, selectItemsAt, type LockedSheet } from './ledger.queries'

export interface PostedRevision {
  revision: number
  entry: LedgerEntry
  /** Items stored otherwise than sent. */
  altered: Item[]
}

/** An entry that the server writes: an intake, a creation, the demo. */
export interface ServerEntry {
  kind: LedgerEntry['kind']
  /** In words from the edits, if left out. */
  message?: string
  /** Now, unless given. */
  at?: Date
  /** The call that asked for it, if one did. */
  call?: Call
}

/** What a call that writes an entry is known again by. */
export interface Call {
  key: string
  bodyDigest: string
  /** Items stored otherwise than sent. */
  altered: string[]
}

/** Kinds whose changes make faces stale. */
const faceKinds: readonly ItemKind[] = ['contact', 'fault', 'unit-label']

/** Writes the ledger of sheets: every change is an entry, every item keeps all its versions. */
export class LedgerService {
  constructor(private readonly dataSource: DataSource) {}

  /** Takes in a change set: all or nothing, one entry. The same key with the same body gets the first answer again. */
  async post(sheetId: string, author: Author, key: string, changeSet: ChangeSet): Promise<PostedRevision> {
    return this.once(sheetId, author, { key, body: changeSet }, async (em, sheet, call) => {
      const snapped = snapChanges(changeSet.changes)
      const { rows, changes, merged } = await this.check(em, sheet, author, {
        ...changeSet,
        changes: snapped.changes,
      })
      const mergedIds = new Set(merged.map(({ id }) => id))
      const altered = [...snapped.altered.filter(({ id }) => !mergedIds.has(id)), ...merged]
      const edits = changes.map((change) => toEdit(change, rows))
      const entry = await this.append(em, sheet, author.person.id, edits, {
        kind: 'edit',
        message: changeSet.message,
        call: { ...call, altered: altered.map((item) => item.id) },
      })
      return { revision: entry.revision, entry, altered }
    })
  }

  /** Runs what writes one entry of a drafting sheet, its row locked; or answers as the first call with this key did. */
  async once(
    sheetId: string,
    author: Author,
    { key, body }: { key: string; body: unknown },
    write: (em: EntityManager, sheet: LockedSheet, call: Call) => Promise<PostedRevision>,
  ): Promise<PostedRevision> {
    const bodyDigest = createHash('sha256').update(JSON.stringify(body)).digest('hex')
    return this.dataSource.transaction(async (em) => {
      const sheet = await lockSheet(em, sheetId)
      const known = await findEntryByKey(em, sheetId, author.person.id, key)
      if (known) return this.repeatAnswer(em, sheetId, known, bodyDigest)
      requireDrafting(sheet)
      return write(em, sheet, { key, bodyDigest, altered: [] })
    })
  }

  /** Adds new items as one entry within the caller's transaction: intake's door. Their ids must be new; lines without
   *  length on the 1 mm grid must have been left out. Fit for a hundred thousand items. */
  async appendItems(
    em: EntityManager,
    sheetId: string,
    authorId: string,
    items: readonly { item: Item; provenance: Provenance | null }[],
    entry: ServerEntry,
  ): Promise<LedgerEntry> {
    const sheet = await lockSheet(em, sheetId)
    requireDrafting(sheet)
    const provenances = new Map(items.map(({ item, provenance }) => [item.id, provenance]))
    const edits = items.map(({ item }): Edit => ({ before: null, after: item }))
    return this.append(em, sheet, authorId, edits, { ...entry, provenances })
  }

  /** Writes edits as one entry within the caller's transaction. `before` must be the items as they now are. */
  async appendEdits(
    em: EntityManager,
    sheetId: string,
    authorId: string,
    edits: readonly Edit[],
    entry: ServerEntry,
  ): Promise<LedgerEntry> {
    return this.append(em, await lockSheet(em, sheetId), authorId, edits, entry)
  }

  private async append(
    em: EntityManager,
    sheet: LockedSheet,
    authorId: string,
    edits: readonly Edit[],
    entry: ServerEntry & { provenances?: ReadonlyMap<string, Provenance | null> },
  ): Promise<LedgerEntry> {
    const revision = sheet.revision + 1
    const touched = edits.flatMap(({ before, after }) => [before, after]).filter((item) => item !== null)
    const touchesFaces = touched.some((item) => faceKinds.includes(item.kind))
    const what = describeChanges(edits)
    const { kind, at, call } = entry
    await insertEntry(
      em,
      sheet,
      revision,
      {
        kind,
        authorId,
        message: entry.message || what,
        what,
        changed: edits.length,
        kinds: [...new Set(touched.map((item) => item.kind))],
        extent: boundsOf(touched),
        at,
        call,
      },
      touchesFaces,
    )
    const ended = edits.flatMap(({ before }) => (before ? [before.id] : []))
    if (ended.length > 0) await closeVersions(em, sheet.id, ended, revision)
    const puts = edits.flatMap(({ after }) =>
      after ? [{ item: snapOrThrow(after), provenance: entry.provenances?.get(after.id) }] : [],
    )
    await insertVersions(em, sheet, revision, puts)
    await announce(em, sheet.number, { event: 'revision', revision })
    const [written] = await selectEntries(em, sheet.id, { above: revision - 1, limit: 1 })
    if (!written) throw new Error(`Entry ${revision} of sheet ${sheet.number} was not written.`)
    return written
  }

  /** Refuses what may not be; answers with the rows that the changes meet, and the changes on top of what others did. */
  private async check(
    em: EntityManager,
    sheet: LockedSheet,
    author: Author,
    { base, changes }: Pick<ChangeSet, 'base' | 'changes'>,
  ): Promise<{ rows: SheetRows; changes: readonly Change[]; merged: Item[] }> {
    requireReached(base, sheet.revision, 'base')
    requireWithinSystem(sheet, changes)
    const rows = await loadRows(em, sheet.id, changes)
    requireEditorForLegend(author, changes, rows)
    const faults = findFaults(changes, base, rows)
    if (faults.length > 0) {
      throw problem('invalid-input', faults[0]?.detail ?? '', { errors: faults.slice(0, 100) })
    }
    return { rows, ...(await mergeChanges(em, sheet.id, author, { base, changes }, rows)) }
  }

  private async repeatAnswer(
    em: EntityManager,
    sheetId: string,
    known: { entry: LedgerEntry; bodyDigest: string; altered: string[] },
    bodyDigest: string,
  ): Promise<PostedRevision> {
    if (known.bodyDigest !== bodyDigest) {
      throw problem(
        'key-reused',
        `This key was used for revision ${known.entry.revision} with other changes.`,
      )
    }
    const { revision } = known.entry
    return {
      revision,
      entry: known.entry,
      altered: await selectItemsAt(em, sheetId, revision, known.altered),
    }
  }
}

/** Changes with their coordinates on the grid, and the items that this altered. */
function snapChanges(changes: readonly Change[]): { changes: Change[]; altered: Item[] } {
  const altered: Item[] = []
  const snapped = changes.map((change, index): Change => {
    if (change.op === 'remove') return change
    const item = snapItem(change.item)
    if (!item) {
      const detail = 'This line has no length: its vertices fall on one point of the 1 mm grid.'
      const pointer = `/changes/${index}/item/geometry/coordinates`
      throw problem('invalid-input', detail, { errors: [{ pointer, detail, item: change.item.id }] })
    }
    if (item !== change.item) altered.push(item)
    return { op: 'put', item }
  })
  return { changes: snapped, altered }
}

function snapOrThrow(item: Item): Item {
  const snapped = snapItem(item)
  if (!snapped) throw new RangeError(`Item ${item.id} is a line without length.`)
  return snapped
}

function toEdit(change: Change, { latest }: SheetRows): Edit {
  const known = latest.get(changedId(change))
  const before = known && known.until === null ? known.item : null
  return { before, after: change.op === 'put' ? change.item : null }
}
