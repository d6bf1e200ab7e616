import { defineStore } from 'pinia'
import { computed, ref, shallowRef, watch } from 'vue'
import type { Member } from '@shared/api/accounts'
import type { Push } from '@shared/api/events'
import type { Face } from '@shared/api/faces'
import type { Job } from '@shared/api/jobs'
import type { LedgerEntry, Sheet } from '@shared/api/sheets'
import { editedId, type Edit } from '@shared/changes/change-set'
import { isSame } from '@shared/changes/same-value'
import { sheetProjection, type SheetProjection } from '@shared/geometry/projection'
import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import { openEventStream, type EventStream } from '@/api/event-stream'
import { newId } from '@/offline/new-id'
import { openOutbox } from '@/offline/outbox'
import { checkEdits, type EditError } from './check-edits'
import { facesKeeper } from './faces-keeper'
import { History, type Step } from './history'
import { usePresenceStore } from './presence'
import { useSessionStore } from './session'
import { SheetExchange, type Saved } from './sheet-exchange'
import { deliver, readChanges, readFaces, readSheet, readSheetOnly } from './sheet-server'
import { changedSinceSentence, readOnlyReason } from './sheet-words'

export type { Saved } from './sheet-exchange'

/** What `commit`, `undo` and `redo` answer. */
export type CommitOutcome = { outcome: 'done' } | { outcome: 'refused'; errors: EditError[] }

interface OpenSheet {
  exchange: SheetExchange
  stream: EventStream
  keeper: ReturnType<typeof facesKeeper>
}

const NOTHING_SAVED: Saved = { state: 'saved', revision: 0, waiting: 0 }

const later = (work: () => void, delayMs: number): (() => void) => {
  const timer = setTimeout(work, delayMs)
  return () => clearTimeout(timer)
}

const refusal = (detail: string) => ({
  outcome: 'refused' as const,
  errors: [{ item: '', pointer: '', detail }],
})

/** The open sheet: its items, its ledger, and the one door through which it changes. Items live in plain maps outside
 *  Vue's reactivity; read `itemsVersion` to follow them. */
export const useSheetStore = defineStore('sheet', () => {
  const session = useSessionStore()
  const presence = usePresenceStore()
  const sheet = shallowRef<Sheet | null>(null)
  const projection = shallowRef<SheetProjection | null>(null)
  const itemsVersion = ref(0)
  const faces = shallowRef<Face[]>([])
  /** Revision that the unit areas were built from; null before the first answer. */
  const facesRevision = ref<number | null>(null)
  /** Whether lines or labels have changed since the unit areas on screen were built. */
  const facesStale = ref(false)
  const entries = shallowRef<LedgerEntry[]>([])
  const members = shallowRef<Member[]>([])
  const jobs = shallowRef<Job[]>([])
  const undoLabel = ref<string | null>(null)
  const redoLabel = ref<string | null>(null)
  /** Why the person makes the changes that follow, for the ledger; empty where it shall say what was done. */
  const why = ref('')
  const saved = shallowRef<Saved>(NOTHING_SAVED)
  /** False where this browser keeps no unsent changes over a closed page. */
  const keepsUnsent = ref(true)
  /** Whether the server's announcements arrive; false while the connection is down. */
  const listening = ref(true)

  const roles = computed(() => sheet.value?.myRoles ?? [])
  /** Why the sheet cannot be changed, as a sentence; null where it can. */
  const readOnly = computed(() =>
    sheet.value ? readOnlyReason(sheet.value.state, roles.value) : 'No sheet is open.',
  )
  const mayEdit = computed(() => readOnly.value === null)

  const history = new History()
  let now: OpenSheet | null = null
  /** Counts openings, so that an answer for a sheet that was left meanwhile is dropped. */
  let turn = 0

  const get = (id: string): Item | undefined => now?.exchange.items.get(id)
  const all = (): Item[] => now?.exchange.items.all() ?? []
  const ofKind = <K extends ItemKind>(kind: K): ItemOf<K>[] => now?.exchange.items.ofKind(kind) ?? []

  /** Opens a sheet by its number, with the changes that a closed page left waiting.
   *  @throws ApiProblem where it cannot be read */
  async function open(number: string): Promise<void> {
    close()
    const mine = ++turn
    const account = session.account?.id ?? ''
    const [read, outbox] = await Promise.all([readSheet(number), openOutbox(account, number)])
    const waiting = await outbox.adopt()
    if (mine !== turn) return outbox.close()
    sheet.value = read.sheet
    projection.value = sheetProjection(read.sheet.crs.proj4)
    entries.value = read.entries
    members.value = read.members
    keepsUnsent.value = outbox.keeps
    const keeper = keepFaces(number)
    const exchange = new SheetExchange({ revision: read.revision, items: read.items, waiting }, outbox, {
      post: (body, key) => deliver(number, body, key),
      readChanges: (since) => readChanges(number, since),
      shown: () => (itemsVersion.value += 1),
      told: report,
      entries: addEntries,
      facesChanged(how) {
        facesStale.value = true
        if (how === 'saved') keeper.refresh()
      },
      newKey: newId,
      later,
    })
    now = { exchange, stream: listen(number, exchange), keeper }
    itemsVersion.value += 1
    report()
    keeper.refresh()
    void exchange.begin()
  }

  const keepFaces = (number: string) =>
    facesKeeper({
      read: () => readFaces(number),
      show(built, ofRevision) {
        faces.value = built
        facesRevision.value = ofRevision
        facesStale.value = now?.exchange.waitingShapesFaces ?? false
      },
      later,
    })

  const listen = (number: string, exchange: SheetExchange): EventStream =>
    openEventStream(number, {
      push: (push) => void hear(push, exchange),
      connected(again) {
        listening.value = true
        if (again) exchange.reconnected()
      },
      lost: () => (listening.value = false),
    })

  function close(): void {
    turn += 1
    now?.exchange.close()
    now?.stream.close()
    now?.keeper.close()
    now = null
    history.clear()
    presence.clear()
    sheet.value = projection.value = null
    faces.value = []
    facesRevision.value = null
    facesStale.value = false
    entries.value = []
    members.value = []
    jobs.value = []
    why.value = ''
    itemsVersion.value += 1
    report()
  }

  function report(): void {
    saved.value = now?.exchange.saved ?? NOTHING_SAVED
    undoLabel.value = history.undoLabel
    redoLabel.value = history.redoLabel
  }

  async function hear(push: Push, exchange: SheetExchange): Promise<void> {
    if (push.event === 'revision') return exchange.hear(push.revision)
    if (push.event === 'presence') return presence.hear(push.person, push.presence, Date.now())
    if (push.event === 'job') {
      jobs.value = [push.job, ...jobs.value.filter((job) => job.id !== push.job.id)]
      return
    }
    if (!sheet.value) return
    sheet.value = { ...sheet.value, state: push.state }
    const read = await readSheetOnly(sheet.value.number).catch(() => null)
    if (read && now?.exchange === exchange) sheet.value = read
  }

  function addEntries(news: readonly LedgerEntry[]): void {
    const known = new Set(news.map((entry) => entry.revision))
    const others = entries.value.filter((entry) => !known.has(entry.revision))
    entries.value = [...news, ...others].sort((a, b) => b.revision - a.revision)
  }

  /** The one door: checks the edits, shows them at once, and has them kept and sent.
   *  @param label what was done, in a few words for ledger and undo: "moved a vertex of a contact" */
  function commit(label: string, edits: readonly Edit[]): CommitOutcome {
    const checked = put(label, edits)
    if (checked.outcome === 'refused') return checked
    if (checked.edits.length > 0) history.push({ label, edits: checked.edits })
    report()
    return { outcome: 'done' }
  }

  function put(label: string, edits: readonly Edit[]): ReturnType<typeof checkEdits> {
    if (!now || readOnly.value) return refusal(readOnly.value ?? 'No sheet is open.')
    const checked = checkEdits(edits, get, sheet.value?.crs)
    if (checked.outcome === 'ok' && checked.edits.length > 0)
      now.exchange.put(label, checked.edits, why.value)
    return checked
  }

  const undo = (): CommitOutcome => turnBack(history.peekUndo(), 'took back: ', () => history.undo())
  const redo = (): CommitOutcome => turnBack(history.peekRedo(), 'did again: ', () => history.redo())

  function turnBack(step: Step | undefined, prefix: string, move: () => void): CommitOutcome {
    if (!step) return refusal('There is nothing to take back or do again.')
    const inTheWay = step.edits.find((edit) => !isSame(get(editedId(edit)) ?? null, edit.before))
    if (inTheWay) return refusal(inTheWaySentence(inTheWay))
    const outcome = put(prefix + step.label, step.edits)
    if (outcome.outcome === 'refused') return outcome
    move()
    report()
    return { outcome: 'done' }
  }

  function inTheWaySentence(edit: Edit): string {
    const id = editedId(edit)
    const item = get(id) ?? edit.after ?? edit.before
    return item ? changedSinceSentence(item, now?.exchange.foreignEntries.get(id) ?? []) : ''
  }

  /** An item as the server has it, without the changes of this page that wait. */
  const confirmed = (id: string): Item | undefined => now?.exchange.items.confirmedItem(id)

  /** Settles a conflict: each of its items becomes what was decided, on top of what the others did, as a new entry. */
  async function settleConflict(decided: ReadonlyMap<string, Item | null>): Promise<CommitOutcome> {
    const edits = [...decided].map(([id, after]) => ({ before: get(id) ?? null, after }))
    const checked = checkEdits(
      edits.filter(({ before, after }) => before ?? after),
      get,
    )
    if (checked.outcome === 'refused') return checked
    await now?.exchange.settle(decided)
    return { outcome: 'done' }
  }

  /** Gives up what waits of some items, which the server will never take, and sends the rest. */
  const giveUp = async (ids: readonly string[]): Promise<void> => now?.exchange.giveUp(ids)

  /** Gives up everything that waits, after a refusal that no retry can change. */
  async function discardWaiting(): Promise<void> {
    history.clear()
    await now?.exchange.discard()
  }

  /** Tries again to send what waits. */
  const retry = (): void => now?.exchange.retry()

  watch(
    () => session.hasEnded,
    (ended) => {
      if (!ended) retry()
    },
  )

  return {
    sheet,
    projection,
    itemsVersion,
    faces,
    facesRevision,
    facesStale,
    entries,
    members,
    jobs,
    undoLabel,
    redoLabel,
    why,
    saved,
    keepsUnsent,
    listening,
    roles,
    readOnly,
    mayEdit,
    get,
    confirmed,
    all,
    ofKind,
    open,
    close,
    commit,
    undo,
    redo,
    settleConflict,
    giveUp,
    discardWaiting,
    retry,
  }
})
