import { defineStore } from 'pinia'
import { computed, ref, shallowRef, triggerRef } from 'vue'
import type { Member } from '@shared/api/accounts'
import type { Push } from '@shared/api/events'
import type { Face } from '@shared/api/faces'
import type { Job } from '@shared/api/jobs'
import type { Problem } from '@shared/api/problems'
import type { LedgerEntry, Sheet } from '@shared/api/sheets'
import { editedId, type Edit } from '@shared/changes/change-set'
import { sheetProjection, type SheetProjection } from '@shared/geometry/projection'
import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import { openEventStream, type EventStream } from '@/api/event-stream'
import {
  addEdits,
  advanceBase,
  countWaiting,
  dropItems,
  thawFirst,
  touchedIds,
  type Batch,
} from '@/offline/batches'
import { newId } from '@/offline/new-id'
import { openOutbox, type Outbox } from '@/offline/outbox'
import { Sender, type SenderState } from '@/offline/sender'
import { checkEdits, type EditError } from './check-edits'
import { editsShapeFaces, facesKeeper, shapesFaces } from './faces-keeper'
import { History, type Step } from './history'
import { LocalItems } from './local-items'
import { isSame } from './same-item'
import {
  deliver,
  readChanges,
  readFaces,
  readSheet,
  readSheetOnly,
  type RevisionAnswer,
} from './sheet-server'
import { changedSinceSentence, readOnlyReason } from './sheet-words'
import { useSessionStore } from './session'

/** What `commit`, `undo` and `redo` answer. */
export type CommitOutcome = { outcome: 'done' } | { outcome: 'refused'; errors: EditError[] }

/** Where the changes of this page stand. */
export interface Saved {
  state: 'saved' | 'saving' | 'waiting' | 'stopped'
  /** Last revision that this page knows of. */
  revision: number
  /** Changes (gestures) that are not acknowledged yet. */
  waiting: number
  /** Why sending stopped. */
  problem?: Problem
}

const savedStates: Record<SenderState, Saved['state']> = {
  idle: 'saved',
  sending: 'saving',
  waiting: 'waiting',
  stopped: 'stopped',
}

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
  const sheet = shallowRef<Sheet | null>(null)
  const projection = shallowRef<SheetProjection | null>(null)
  const itemsVersion = ref(0)
  /** Ids changed by the last step of `itemsVersion`; null where everything may have. */
  const lastChanged = shallowRef<readonly string[] | null>(null)
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
  const saved = shallowRef<Saved>({ state: 'saved', revision: 0, waiting: 0 })
  /** False where this browser keeps no unsent changes over a closed page. */
  const keepsUnsent = ref(true)
  /** Whether the server's announcements arrive; false while the connection is down. */
  const listening = ref(true)

  const roles = computed(() => sheet.value?.myRoles ?? [])
  const readOnly = computed(() =>
    sheet.value ? readOnlyReason(sheet.value.state, roles.value) : 'No sheet is open.',
  )
  const mayEdit = computed(() => readOnly.value === null)

  const local = new LocalItems()
  const history = new History()
  let batches: readonly Batch[] = []
  /** Revision that the confirmed items are of, and the highest one announced. */
  let revision = 0
  let announced = 0
  let problem: Problem | undefined
  let senderState: SenderState = 'idle'
  let open: OpenSheet | null = null
  let opening = 0
  /** Ledger entries by which somebody else changed an item while this page was open. */
  const foreignEntries = new Map<string, readonly LedgerEntry[]>()

  interface OpenSheet {
    number: string
    outbox: Outbox
    sender: Sender<RevisionAnswer>
    stream: EventStream
    keeper: ReturnType<typeof facesKeeper>
  }

  const get = (id: string): Item | undefined => local.get(id)
  const all = (): Item[] => local.all()
  const ofKind = <K extends ItemKind>(kind: K): ItemOf<K>[] => local.ofKind(kind)

  async function openSheet(number: string): Promise<void> {
    close()
    const turn = ++opening
    const account = useSessionStore().account?.id ?? ''
    const [read, outbox] = await Promise.all([readSheet(number), openOutbox(account, number)])
    const adopted = await outbox.adopt()
    if (turn !== opening) return outbox.close()
    sheet.value = read.sheet
    projection.value = sheetProjection(read.sheet.crs.proj4)
    entries.value = read.entries
    members.value = read.members
    keepsUnsent.value = outbox.keeps
    revision = announced = read.revision
    batches = adopted
    local.reset(read.items)
    local.show(touchedIds(batches), batches)
    open = start(number, outbox)
    bump(null)
    report()
    open.keeper.refresh()
    open.sender.nudge()
  }

  function start(number: string, outbox: Outbox): OpenSheet {
    const keeper = facesKeeper({
      read: () => readFaces(number),
      show(built, ofRevision) {
        faces.value = built
        facesRevision.value = ofRevision
        facesStale.value = batches.some((batch) => editsShapeFaces(batch.edits))
      },
      later,
    })
    const sender = new Sender<RevisionAnswer>({
      batches: () => batches,
      keep,
      async post(body, key) {
        if (announced > revision && !batches[0]?.request) await catchUp().catch(() => {})
        return deliver(number, body, key)
      },
      acknowledge,
      refuse: refused,
      state(state) {
        senderState = state
        if (state !== 'stopped') problem = undefined
        report()
        if (state !== 'sending') followAnnouncements()
      },
      newKey: newId,
      later,
    })
    const stream = openEventStream(number, {
      push: (push) => void hear(push),
      connected(again) {
        listening.value = true
        sender.resume()
        if (again) {
          announced = Math.max(announced, revision + 1)
          followAnnouncements()
        }
      },
      lost: () => (listening.value = false),
    })
    return { number, outbox, sender, stream, keeper }
  }

  function close(): void {
    opening += 1
    open?.sender.close()
    open?.stream.close()
    open?.keeper.close()
    open?.outbox.close()
    open = null
    batches = []
    problem = undefined
    senderState = 'idle'
    history.clear()
    foreignEntries.clear()
    local.reset([])
    sheet.value = projection.value = null
    faces.value = []
    facesRevision.value = null
    facesStale.value = false
    entries.value = []
    members.value = []
    jobs.value = []
    undoLabel.value = redoLabel.value = null
    bump(null)
  }

  function bump(ids: readonly string[] | null): void {
    lastChanged.value = ids
    itemsVersion.value += 1
  }

  function report(): void {
    saved.value = {
      state: savedStates[senderState],
      revision,
      waiting: countWaiting(batches),
      ...(problem ? { problem } : {}),
    }
    undoLabel.value = history.undoLabel
    redoLabel.value = history.redoLabel
  }

  function keep(next: readonly Batch[]): Promise<void> {
    batches = next
    report()
    return open ? open.outbox.save(next) : Promise.resolve()
  }

  /** The one door: checks the edits, shows them at once, and has them kept and sent. */
  function commit(label: string, edits: readonly Edit[]): CommitOutcome {
    const outcome = put(label, edits)
    if (outcome.outcome === 'refused') return outcome
    history.push({ label, edits: outcome.edits })
    report()
    return { outcome: 'done' }
  }

  function put(label: string, edits: readonly Edit[]): ReturnType<typeof checkEdits> {
    if (!open || readOnly.value) return refusal(readOnly.value ?? 'No sheet is open.')
    const checked = checkEdits(edits, get)
    if (checked.outcome === 'refused' || checked.edits.length === 0) return checked
    const next = addEdits(batches, { base: revision, label, edits: checked.edits })
    void keep(next)
    showAgain(checked.edits.map(editedId))
    if (editsShapeFaces(checked.edits)) facesStale.value = true
    open.sender.nudge()
    return checked
  }

  function showAgain(ids: readonly string[]): void {
    local.show(ids, batches)
    bump(ids)
  }

  const undo = (): CommitOutcome => turnBack(history.peekUndo(), 'took back: ', () => history.undo())
  const redo = (): CommitOutcome => turnBack(history.peekRedo(), 'did again: ', () => history.redo())

  function turnBack(step: Step | undefined, prefix: string, move: () => void): CommitOutcome {
    if (!step) return refusal('There is nothing to take back or do again.')
    const inTheWay = step.edits.find((edit) => !isSame(get(editedId(edit)) ?? null, edit.before))
    if (inTheWay) {
      const item = inTheWay.after ?? inTheWay.before
      const id = editedId(inTheWay)
      return refusal(item ? changedSinceSentence(item, foreignEntries.get(id) ?? []) : '')
    }
    const outcome = put(prefix + step.label, step.edits)
    if (outcome.outcome === 'refused') return outcome
    move()
    report()
    return { outcome: 'done' }
  }

  async function acknowledge(answer: RevisionAnswer): Promise<void> {
    const [first, ...rest] = batches
    if (!first) return
    const ids = first.edits.map(editedId)
    const news = answer.revision > revision
    if (news) {
      const kept = first.edits.flatMap((edit) => (edit.after ? [edit.after] : []))
      local.confirm(kept, first.edits.filter((edit) => !edit.after).map(editedId))
      local.confirm(answer.altered, [])
    }
    announced = Math.max(announced, answer.revision)
    batches = rest
    if (answer.revision === revision + 1) {
      revision = answer.revision
      batches = advanceBase(batches, revision, new Set())
      addEntries([answer.entry])
    } else if (news) {
      // Others were faster: their revisions lie between. Without them the next batch would be sent on a wrong base.
      await catchUp(new Set(ids)).catch(() => {})
    }
    await keep(batches)
    if (answer.altered.length > 0 || !news) showAgain(ids)
    if (editsShapeFaces(first.edits)) open?.keeper.refresh()
  }

  /** Asks for what changed since the own revision and lays waiting changes on top again.
   *  @param mine ids that the own, just acknowledged or still unanswered request changed */
  async function catchUp(mine: ReadonlySet<string> = idsUnderWay()): Promise<void> {
    const here = open
    if (!here) return
    const since = revision
    const answer = await readChanges(here.number, since)
    if (open !== here || revision !== since) return
    local.confirm(answer.put, answer.removed)
    revision = answer.revision
    announced = Math.max(announced, revision)
    const changed = [...answer.put.map((item) => item.id), ...answer.removed]
    const foreign = new Set(changed.filter((id) => !mine.has(id)))
    for (const id of foreign) foreignEntries.set(id, answer.entries)
    addEntries(answer.entries)
    await keep(advanceBase(batches, revision, foreign))
    showAgain(changed)
    if (answer.removed.length > 0 || answer.put.some((item) => shapesFaces(item.kind))) {
      facesStale.value = true
      here.keeper.refresh()
    }
  }

  const idsUnderWay = (): ReadonlySet<string> =>
    new Set(batches[0]?.request ? batches[0].edits.map(editedId) : [])

  /** A request under way may be the very one announced, so its answer comes first. */
  function followAnnouncements(): void {
    if (senderState !== 'sending' && announced > revision) void catchUp().catch(() => {})
  }

  async function hear(push: Push): Promise<void> {
    if (push.event === 'revision') {
      announced = Math.max(announced, push.revision)
      followAnnouncements()
    } else if (push.event === 'job') {
      jobs.value = [push.job, ...jobs.value.filter((job) => job.id !== push.job.id)]
    } else if (sheet.value) {
      sheet.value = { ...sheet.value, state: push.state }
      sheet.value = await readSheetOnly(sheet.value.number).catch(() => sheet.value)
    }
  }

  function addEntries(news: readonly LedgerEntry[]): void {
    const known = new Set(news.map((entry) => entry.revision))
    entries.value = [...news, ...entries.value.filter((entry) => !known.has(entry.revision))].sort(
      (a, b) => b.revision - a.revision,
    )
    triggerRef(entries)
  }

  async function refused(why: Problem): Promise<void> {
    problem = why
    await keep(thawFirst(batches))
    if (why.type.endsWith('/item-conflict')) await catchUp(new Set()).catch(() => {})
  }

  /** Settles a conflict. `theirs` drops this page's changes to the items in conflict; `mine` keeps them and sends them
   *  on top of what the others did, as a new entry. */
  async function settleConflict(choice: 'theirs' | 'mine', ids: readonly string[]): Promise<void> {
    const touched = touchedIds(batches)
    await keep(
      choice === 'theirs' ? dropItems(batches, new Set(ids)) : advanceBase(batches, revision, new Set()),
    )
    showAgain(touched)
    retry()
  }

  /** Gives up everything that waits, after a refusal that no retry can change. */
  async function discardWaiting(): Promise<void> {
    const touched = touchedIds(batches)
    await keep([])
    history.clear()
    showAgain(touched)
    retry()
  }

  /** Tries again to send what waits. */
  function retry(): void {
    open?.sender.resume()
  }

  return {
    sheet,
    projection,
    itemsVersion,
    lastChanged,
    faces,
    facesRevision,
    facesStale,
    entries,
    members,
    jobs,
    undoLabel,
    redoLabel,
    saved,
    keepsUnsent,
    listening,
    roles,
    readOnly,
    mayEdit,
    get,
    all,
    ofKind,
    open: openSheet,
    close,
    commit,
    undo,
    redo,
    settleConflict,
    discardWaiting,
    retry,
  }
})
