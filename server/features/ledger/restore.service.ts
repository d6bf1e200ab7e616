import type { DataSource, EntityManager } from 'typeorm'
import type { LaterChange, Restore, RestorePreview, RestoreRequest } from '@shared/api/restores'
import type { LedgerEntry } from '@shared/api/sheets'
import { editedId, toChanges, type Edit } from '@shared/changes/change-set'
import { named } from '@shared/changes/describe-changes'
import { toDifference } from '@shared/changes/differences'
import { problem, ProblemError } from '../../platform/problem'
import { findFaults } from './check-changes'
import { countEdits, selectEditsOf, selectTouchedIds, type Span } from './comparison.queries'
import { selectEntriesOf } from './entries.queries'
import type { LedgerService } from './ledger.service'
import {
  invalidField,
  loadRows,
  requireDrafting,
  requireEditorForLegend,
  requireReached,
  type Author,
} from './ledger-rules'
import { getLedgerSheet, type LedgerSheet } from './ledger.queries'
import { selectChangedAfter, selectEntriesAfter } from './restore.queries'

/** Most differences and later changes that a preview or a refusal lists; the counts are of all. */
const LISTED = 200

/** What going back means for a sheet as it is now. */
interface Plan {
  edits: Edit[]
  /** Revision whose state the items go back to. */
  state: number
  /** Changes after this revision are later ones: not what is being taken back. */
  upTo: number
  message: string
}

/** Takes sheets back to earlier states: always forward, as a new entry. */
export class RestoreService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly ledger: LedgerService,
  ) {}

  /** What going back would do on the latest revision; nothing is changed. */
  async preview(sheetId: string, author: Author, restore: Restore): Promise<RestorePreview> {
    // One moment of the sheet, without holding up those who write to it.
    return this.dataSource.transaction('REPEATABLE READ', async (em) => {
      const sheet = await getLedgerSheet(em, sheetId)
      const { edits, state, upTo, message } = await planRestore(em, sheet, restore)
      const ids = edits.map(editedId)
      const later = await selectChangedAfter(em, sheetId, ids, upTo)
      return {
        base: sheet.revision,
        counts: await countEdits(em, { sheetId, from: sheet.revision, to: state }, ids),
        differences: edits.slice(0, LISTED).map(toDifference),
        later: await this.tellLater(em, sheetId, edits, later, upTo),
        laterItems: later.length,
        message,
        obstacle: await findObstacle(em, sheet, author, edits),
      }
    })
  }

  /** Goes back, as a new entry. Refuses where that would undo later changes, unless those up to the base are accepted. */
  async restore(
    sheetId: string,
    author: Author,
    key: string,
    request: RestoreRequest,
  ): Promise<{ revision: number; entry: LedgerEntry }> {
    const body = { restore: request }
    const { revision, entry } = await this.ledger.once(
      sheetId,
      author,
      { key, body },
      async (em, sheet, call) => {
        requireReached(request.base, sheet.revision, 'base')
        const { edits, upTo, message } = await planRestore(em, sheet, request.restore)
        if (edits.length === 0) {
          throw problem('nothing-to-restore', 'The sheet is already as it would be: nothing was written.')
        }
        await this.requireNothingLater(em, sheetId, edits, upTo, request)
        await requireRestorable(em, sheet, author, edits)
        const written = await this.ledger.appendEdits(em, sheetId, author.person.id, edits, {
          kind: 'restore',
          message: request.message || message,
          call,
        })
        return { revision: written.revision, entry: written, altered: [] }
      },
    )
    return { revision, entry }
  }

  private async requireNothingLater(
    em: EntityManager,
    sheetId: string,
    edits: readonly Edit[],
    upTo: number,
    { base, undoLater }: RestoreRequest,
  ): Promise<void> {
    // What came after the base was not in the preview, so nobody can have accepted it.
    const seen = undoLater ? Math.max(upTo, base) : upTo
    const later = await selectChangedAfter(em, sheetId, edits.map(editedId), seen)
    if (later.length === 0) return
    const items = await this.tellLater(em, sheetId, edits, later, seen)
    throw problem('later-changes', `This would undo ${laterSentence(items, later.length)}`, { items })
  }

  private async tellLater(
    em: EntityManager,
    sheetId: string,
    edits: readonly Edit[],
    later: readonly string[],
    after: number,
  ): Promise<LaterChange[]> {
    const told = later.slice(0, LISTED)
    const entries = await selectEntriesAfter(em, sheetId, told, after)
    const items = new Map(edits.map((edit) => [editedId(edit), edit.before ?? edit.after]))
    return told.flatMap((id) => {
      const item = items.get(id)
      return item ? [{ id, kind: item.kind, name: named(item), entries: entries.get(id) ?? [] }] : []
    })
  }
}

/** "a later change: contact, changed by Tove Orr at revision 4." */
function laterSentence([first]: readonly LaterChange[], count: number): string {
  const entry = first?.entries[0]
  const what =
    first && entry ? `${first.name}, changed by ${entry.author.name} at revision ${entry.revision}` : ''
  return count > 1 ? `later changes of ${count} items, among them ${what}.` : `a later change: ${what}.`
}

async function planRestore(em: EntityManager, sheet: LedgerSheet, restore: Restore): Promise<Plan> {
  requireReached(restore.revision, sheet.revision, 'restore/revision')
  const { revision } = restore
  if (restore.what === 'entry') return planTakingBack(em, sheet, revision)
  const span: Span = { sheetId: sheet.id, from: sheet.revision, to: revision }
  const ids = restore.what === 'item' ? [restore.item] : await selectTouchedIds(em, span)
  const edits = await selectEditsOf(em, span, ids)
  const [only] = edits
  const what = restore.what === 'item' && only ? `${nameOf(only)} as it was at` : 'the sheet as it was at'
  return { edits, state: revision, upTo: revision, message: `restored ${what} revision ${revision}` }
}

/** The items that one entry changed go back to what they were before it. */
async function planTakingBack(em: EntityManager, sheet: LedgerSheet, revision: number): Promise<Plan> {
  const entry = (await selectEntriesOf(em, sheet.id, [revision])).get(revision)
  if (!entry) throw invalidField('restore/revision', `There is no entry ${revision} on this sheet.`)
  const state = revision - 1
  const ids = await selectTouchedIds(em, { sheetId: sheet.id, from: state, to: revision })
  const edits = await selectEditsOf(em, { sheetId: sheet.id, from: sheet.revision, to: state }, ids)
  return {
    edits,
    state,
    upTo: revision,
    message: `took back entry ${revision}: ${entry.message}`.slice(0, 500),
  }
}

function nameOf({ before, after }: Edit): string {
  const item = after ?? before
  return item ? named(item) : ''
}

/** Refuses what a change by hand would be refused for: the sheet's state, the legend's editor, units in use. */
async function requireRestorable(
  em: EntityManager,
  sheet: LedgerSheet,
  author: Author,
  edits: readonly Edit[],
): Promise<void> {
  requireDrafting(sheet)
  const changes = toChanges(edits)
  const rows = await loadRows(em, sheet.id, changes)
  requireEditorForLegend(author, changes, rows)
  const [fault] = findFaults(changes, sheet.revision, rows)
  if (fault) throw problem('cannot-restore', fault.detail, { items: [fault.item] })
}

/** The same as a sentence; null where nothing stands in the way. */
async function findObstacle(
  em: EntityManager,
  sheet: LedgerSheet,
  author: Author,
  edits: readonly Edit[],
): Promise<string | null> {
  if (edits.length === 0) return 'The sheet is already as it would be.'
  try {
    await requireRestorable(em, sheet, author, edits)
    return null
  } catch (fault) {
    if (fault instanceof ProblemError) return fault.detail
    throw fault
  }
}
