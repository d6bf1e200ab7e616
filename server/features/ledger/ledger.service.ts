import { createHash } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { Person } from '@shared/api/common'
import type { Provenance } from '@shared/api/ledger'
import type { LedgerEntry } from '@shared/api/sheets'
import type { Change, ChangeSet, Edit } from '@shared/changes/change-set'
import { describeChanges } from '@shared/changes/describe-changes'
import type { Item, ItemKind } from '@shared/items/item'
import { snapItem } from '@shared/items/snap-item'
import { announce } from '../../platform/announce'
import { problem } from '../../platform/problem'
import {
  changedId,
  findConflicts,
  findFaults,
  isEditorsItem,
  type Conflict,
  type SheetRows,
} from './check-changes'
import { findUnreachable } from './find-unreachable'
import {
  closeVersions,
  countLabelsOfUnits,
  findEntryByKey,
  findLatestVersions,
  insertEntry,
  insertVersions,
  lockSheet,
  selectCurrentItems,
  selectEntries,
  selectItemsAt,
  type LockedSheet,
} from './ledger.queries'

export interface PostedRevision {
  revision: number
  entry: LedgerEntry
  /** Items stored otherwise than sent. */
  altered: Item[]
}

/** Who changes a sheet, and as what. */
export interface Author {
  person: Person
  roles: readonly Role[]
}

/** An entry that the server writes: an intake, a creation, the demo. */
export interface ServerEntry {
  kind: LedgerEntry['kind']
  /** In words from the edits, if left out. */
  message?: string
  /** Now, unless given. */
  at?: Date
}

/** Kinds whose changes make faces stale. */
const faceKinds: readonly ItemKind[] = ['contact', 'fault', 'unit-label']

/** Writes the ledger of sheets: every change is an entry, every item keeps all its versions. */
export class LedgerService {
  constructor(private readonly dataSource: DataSource) {}

  /** Takes in a change set: all or nothing, one entry. The same key with the same body gets the first answer again. */
  async post(sheetId: string, author: Author, key: string, changeSet: ChangeSet): Promise<PostedRevision> {
    const bodyDigest = createHash('sha256').update(JSON.stringify(changeSet)).digest('hex')
    return this.dataSource.transaction(async (em) => {
      const sheet = await lockSheet(em, sheetId)
      const known = await findEntryByKey(em, sheetId, author.person.id, key)
      if (known) return this.repeatAnswer(em, sheetId, known, bodyDigest)
      requireDrafting(sheet)
      const { changes, altered } = snapChanges(changeSet.changes)
      const rows = await this.check(em, sheet, author, { ...changeSet, changes })
      const edits = changes.map((change) => toEdit(change, rows))
      const entry = await this.append(em, sheet, author.person.id, edits, {
        kind: 'edit',
        message: changeSet.message,
        call: { key, bodyDigest, altered: altered.map((item) => item.id) },
      })
      return { revision: entry.revision, entry, altered }
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
    entry: ServerEntry & {
      call?: { key: string; bodyDigest: string; altered: string[] }
      provenances?: ReadonlyMap<string, Provenance | null>
    },
  ): Promise<LedgerEntry> {
    const revision = sheet.revision + 1
    const touched = edits.flatMap(({ before, after }) => [before, after]).filter((item) => item !== null)
    const touchesFaces = touched.some((item) => faceKinds.includes(item.kind))
    const message = entry.message || describeChanges(edits)
    const { kind, at, call } = entry
    await insertEntry(
      em,
      sheet,
      revision,
      { kind, authorId, message, changed: edits.length, at, call },
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

  /** Refuses what may not be; answers with the rows that the changes meet. */
  private async check(
    em: EntityManager,
    sheet: LockedSheet,
    author: Author,
    { base, changes }: Pick<ChangeSet, 'base' | 'changes'>,
  ): Promise<SheetRows> {
    if (base > sheet.revision) {
      const detail = `The sheet is at revision ${sheet.revision}; revision ${base} does not exist yet.`
      throw problem('invalid-input', detail, { errors: [{ pointer: '/base', detail }] })
    }
    requireWithinSystem(sheet, changes)
    const rows = await loadRows(em, sheet.id, changes)
    requireEditorForLegend(author, changes, rows)
    const faults = findFaults(changes, base, rows)
    if (faults.length > 0) {
      throw problem('invalid-input', faults[0]?.detail ?? '', { errors: faults.slice(0, 100) })
    }
    await requireNoConflict(em, sheet.id, author, base, changes, rows)
    return rows
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

function requireDrafting(sheet: LockedSheet): void {
  if (sheet.state === 'drafting') return
  throw problem(
    'wrong-state',
    `Sheet ${sheet.number} is ${sheet.state}: it cannot be changed until it is back in drafting.`,
  )
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

/** A place beyond the region of the sheet's system would be drawn, measured and printed wrong. */
function requireWithinSystem(sheet: LockedSheet, changes: readonly Change[]): void {
  const items = changes.flatMap((change) => (change.op === 'put' ? [change.item] : []))
  const beyond = findUnreachable(items, sheet.proj4)
  if (beyond.length === 0) return
  const errors = beyond.slice(0, 100).map(({ id, at }) => ({
    pointer: `/changes/${changes.findIndex((change) => changedId(change) === id)}/item/geometry/coordinates`,
    detail: `The place ${at[0]} ${at[1]} lies outside the region that the sheet’s coordinate system (EPSG:${sheet.srid}) is made for.`,
    item: id,
  }))
  throw problem('invalid-input', errors[0]?.detail ?? '', { errors })
}

function snapOrThrow(item: Item): Item {
  const snapped = snapItem(item)
  if (!snapped) throw new RangeError(`Item ${item.id} is a line without length.`)
  return snapped
}

async function loadRows(em: EntityManager, sheetId: string, changes: readonly Change[]): Promise<SheetRows> {
  const ids = changes.map(changedId)
  const latest = await findLatestVersions(em, ids)
  const units = await selectCurrentItems(em, sheetId, 'unit')
  const [sheetFace] = await selectCurrentItems(em, sheetId, 'sheet-face')
  const removed = changes.flatMap((change) => (change.op === 'remove' ? [change.id] : []))
  const counts = await countLabelsOfUnits(em, sheetId, removed, ids)
  return {
    sheetId,
    latest,
    unitIds: new Set(units.map((unit) => unit.id)),
    sheetFaceId: sheetFace?.id,
    labelsOfUnits: new Map(counts.map(({ unit, labels }) => [unit, labels])),
  }
}

/** Legend and sheet face are the editor's. */
function requireEditorForLegend({ roles }: Author, changes: readonly Change[], { latest }: SheetRows): void {
  if (roles.includes('editor')) return
  const item = changes
    .map((change) => (change.op === 'put' ? change.item : latest.get(change.id)?.item))
    .find((item) => item !== undefined && isEditorsItem(item))
  if (!item) return
  const what = item.kind === 'unit' ? `the unit ${item.properties.label} of the legend` : 'the sheet face'
  throw problem('not-allowed', `Only an editor of this sheet changes ${what}.`)
}

async function requireNoConflict(
  em: EntityManager,
  sheetId: string,
  author: Author,
  base: number,
  changes: readonly Change[],
  rows: SheetRows,
): Promise<void> {
  const found = findConflicts(changes, base, rows)
  if (found.length === 0) return
  const ids = found.map(({ id }) => id)
  const bases = new Map((await selectItemsAt(em, sheetId, base, ids)).map((item) => [item.id, item]))
  const conflicts = found.map((conflict): Conflict => ({ ...conflict, base: bases.get(conflict.id) ?? null }))
  const names = new Set(
    ids.map((id) => {
      const other = rows.latest.get(id)?.author
      return !other || other.id === author.person.id ? 'You, elsewhere,' : other.name
    }),
  )
  throw problem(
    'item-conflict',
    `${[...names].join(' and ')} changed ${ids.length === 1 ? 'the same item' : `${ids.length} of the same items`} after revision ${base}. Nothing of yours was stored.`,
    { items: conflicts },
  )
}

function toEdit(change: Change, { latest }: SheetRows): Edit {
  const known = latest.get(changedId(change))
  const before = known && known.until === null ? known.item : null
  return { before, after: change.op === 'put' ? change.item : null }
}
