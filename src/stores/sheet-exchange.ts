import type { Problem } from '@shared/api/problems'
import type { LedgerEntry } from '@shared/api/sheets'
import { editedId, type ChangeSet, type Edit } from '@shared/changes/change-set'
import type { Item } from '@shared/items/item'
import {
  addEdits,
  advanceBase,
  countWaiting,
  dropItems,
  thawFirst,
  touchedIds,
  type Batch,
} from '@/offline/batches'
import { addToHeld, decideBatch, holdFirst, type HeldWork } from '@/offline/held-work'
import type { Outbox } from '@/offline/outbox'
import { Sender, type Delivery, type SenderState } from '@/offline/sender'
import { editsShapeFaces, shapesFaces } from './faces-keeper'
import { LocalItems } from './local-items'
import type { ChangesAnswer, RevisionAnswer } from './sheet-server'

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

/** What the exchange needs of the world, and tells it. */
export interface ExchangePorts {
  post(body: ChangeSet, key: string): Promise<Delivery<RevisionAnswer>>
  readChanges(since: number): Promise<ChangesAnswer>
  /** Some items are shown otherwise than before. */
  shown(ids: readonly string[]): void
  /** Where the changes stand has changed. */
  told(): void
  entries(news: readonly LedgerEntry[]): void
  /** Lines or labels changed: here and now, or for good in a saved revision. */
  facesChanged(how: 'here' | 'saved'): void
  newKey(): string
  later(work: () => void, delayMs: number): () => void
}

const savedStates: Record<SenderState, Saved['state']> = {
  idle: 'saved',
  sending: 'saving',
  waiting: 'waiting',
  stopped: 'stopped',
}

/** The exchange of one open sheet with the server: confirmed items, waiting batches, and what others change meanwhile.
 *  Confirmed plus waiting is what is shown; the two meet nowhere else. */
export class SheetExchange {
  readonly items = new LocalItems()
  /** Ledger entries by which somebody else changed an item while this page was open. */
  readonly foreignEntries = new Map<string, readonly LedgerEntry[]>()
  /** What is to be sent, in order. */
  private batches: readonly Batch[]
  /** What two people changed: not sent until it is decided. */
  private held: readonly HeldWork[] = []
  /** Revision that the confirmed items are of, and the highest one announced. */
  private revision: number
  private announced: number
  private problem: Problem | undefined
  private state: SenderState = 'idle'
  private closed = false
  private readonly sender: Sender<RevisionAnswer>

  constructor(
    start: { revision: number; items: readonly Item[]; waiting: readonly Batch[] },
    private readonly outbox: Outbox,
    private readonly ports: ExchangePorts,
  ) {
    this.revision = this.announced = start.revision
    this.batches = start.waiting
    this.items.reset(start.items)
    this.items.show(touchedIds(this.batches), this.batches)
    this.sender = new Sender<RevisionAnswer>({
      batches: () => this.batches,
      keep: (batches) => this.keep(batches),
      post: (body, key) => ports.post(body, key),
      acknowledge: (answer) => this.acknowledge(answer),
      refuse: (problem) => this.refused(problem),
      state: (state) => this.enter(state),
      newKey: () => ports.newKey(),
      later: (work, delayMs) => ports.later(work, delayMs),
    })
  }

  get saved(): Saved {
    const problem = this.problem ?? this.held[0]?.problem
    return {
      state: this.state === 'idle' ? this.restState() : savedStates[this.state],
      revision: this.revision,
      waiting: countWaiting(this.all),
      ...(problem ? { problem } : {}),
    }
  }

  /** Where things stand while nothing is under way: what was just decided is about to be. */
  private restState(): Saved['state'] {
    if (this.batches.length > 0) return 'saving'
    return this.held.length > 0 ? 'stopped' : 'saved'
  }

  /** Whether waiting changes touch lines or labels. */
  get waitingShapesFaces(): boolean {
    return this.all.some((batch) => editsShapeFaces(batch.edits))
  }

  /** Everything that is not acknowledged yet; held work and queue have no item in common. */
  private get all(): Batch[] {
    return [...this.held.map(({ batch }) => batch), ...this.batches]
  }

  /** Begins to send what a closed page left waiting. Batches on whose items nobody worked since move to the present
   *  revision first: else the own request before them would look like somebody else's. */
  async begin(): Promise<void> {
    const bases = this.batches.filter((batch) => !batch.request).map((batch) => batch.base)
    for (const base of new Set(bases.filter((each) => each < this.revision))) {
      const answer = await this.ports.readChanges(base).catch(() => undefined)
      if (this.closed || !answer) continue
      const mine = this.idsUnderWay()
      const changed = [...answer.put.map((item) => item.id), ...answer.removed]
      const foreign = new Set(changed.filter((id) => !mine.has(id)))
      await this.keep(advanceBase(this.batches, { from: base, to: this.revision, foreign }))
    }
    this.retry()
  }

  /** Takes checked edits: shown at once, kept in the outbox, sent as soon as may be.
   *  @param why what the ledger shall say instead of the label; empty where nobody said */
  put(label: string, edits: readonly Edit[], why = ''): void {
    const added = { base: this.revision, label, edits, why }
    const held = addToHeld(this.held, added)
    if (held) this.held = held
    void this.keep(held ? this.batches : addEdits(this.batches, added))
    this.show(edits.map(editedId))
    if (editsShapeFaces(edits)) this.ports.facesChanged('here')
    // What was refused may be mended, or taken back, by this very change.
    if (this.problem?.type.endsWith('/invalid-input')) this.sender.resume()
    else this.sender.nudge()
  }

  /** A revision was announced, by number only. */
  hear(revision: number): void {
    this.announced = Math.max(this.announced, revision)
    this.follow()
  }

  /** The stream was broken: something may have been missed. */
  reconnected(): void {
    this.sender.resume()
    this.announced = Math.max(this.announced, this.revision + 1)
    this.follow()
  }

  /** Settles the first conflict: each of its items becomes what was decided, on top of what the others did, as a new
   *  entry. Nothing is sent of an item that was decided to be as the others left it. */
  async settle(decided: ReadonlyMap<string, Item | null>): Promise<void> {
    const [first, ...others] = this.held
    if (!first) return
    const decisions = new Map(
      [...decided].map(([id, after]) => [id, { before: this.items.confirmedItem(id) ?? null, after }]),
    )
    const settled = decideBatch(first.batch, { revision: this.revision, decisions })
    this.held = others
    await this.keep(settled ? [...this.batches, settled] : this.batches)
    this.show([...touchedIds([first.batch]), ...decided.keys()])
    this.retry()
  }

  /** Gives up what waits of some items, and sends the rest. */
  async giveUp(ids: readonly string[]): Promise<void> {
    this.held = this.held.flatMap(({ batch, problem }) =>
      dropItems([batch], new Set(ids)).map((left) => ({ batch: left, problem })),
    )
    await this.keep(dropItems(this.batches, new Set(ids)))
    this.show(ids)
    this.retry()
  }

  /** Gives up everything that waits. */
  async discard(): Promise<void> {
    const touched = touchedIds(this.all)
    this.held = []
    await this.keep([])
    this.show(touched)
    this.retry()
  }

  /** Tries again to send what waits; does nothing while a request is under way. */
  retry(): void {
    this.sender.resume()
  }

  close(): void {
    this.closed = true
    this.sender.close()
    this.outbox.close()
  }

  private enter(state: SenderState): void {
    this.state = state
    if (state !== 'stopped') this.problem = undefined
    this.ports.told()
    this.follow()
  }

  /** Keeps batches in memory at once, and on disk when the promise resolves. */
  private async keep(batches: readonly Batch[]): Promise<void> {
    this.batches = batches
    this.ports.told()
    await this.outbox.save(this.all)
  }

  private show(ids: readonly string[]): void {
    this.items.show(ids, this.all)
    this.ports.shown(ids)
  }

  private async acknowledge(answer: RevisionAnswer): Promise<void> {
    const [first, ...rest] = this.batches
    if (!first) return
    const ids = first.edits.map(editedId)
    // An answer repeated for an old key says nothing new: the confirmed items are of a later revision already.
    const isNews = answer.revision > this.revision
    if (isNews) this.confirmOwn(first, answer)
    this.batches = rest
    this.announced = Math.max(this.announced, answer.revision)
    if (answer.revision === this.revision + 1) {
      this.batches = advanceBase(rest, { from: this.revision, to: answer.revision, foreign: new Set() })
      this.revision = answer.revision
      this.ports.entries([answer.entry])
    } else if (isNews) {
      // Others were faster: their revisions lie between. Without them the next batch would be sent on a wrong base.
      await this.catchUp(new Set(ids)).catch(() => undefined)
    }
    await this.keep(this.batches)
    if (!isNews || answer.altered.length > 0) this.show(ids)
    if (editsShapeFaces(first.edits)) this.ports.facesChanged('saved')
  }

  private confirmOwn(batch: Batch, answer: RevisionAnswer): void {
    const put = batch.edits.flatMap((edit) => (edit.after ? [edit.after] : []))
    const removed = batch.edits.filter((edit) => !edit.after).map(editedId)
    this.items.confirm([...put, ...answer.altered], removed)
  }

  /** What two people changed is held for a decision, and the rest goes on; any other refusal stops the sending. */
  private async refused(problem: Problem): Promise<'go on' | 'stop'> {
    if (!problem.type.endsWith('/item-conflict')) {
      await this.keep(thawFirst(this.batches))
      this.problem = problem
      return 'stop'
    }
    const { held, queue } = holdFirst(this.batches, problem)
    this.held = [...this.held, ...held]
    await this.keep(queue)
    await this.catchUp(new Set()).catch(() => undefined)
    return 'go on'
  }

  /** A request under way may be the very one announced, so its answer comes first. */
  private follow(): void {
    if (this.state !== 'sending' && this.announced > this.revision) {
      // Without an answer the next announcement, or the next connection, asks again.
      void this.catchUp().catch(() => undefined)
    }
  }

  /** Asks for what changed since the own revision, and lays waiting changes on top again.
   *  @param mine ids that the own request changed, which was just acknowledged or may have arrived unanswered */
  private async catchUp(mine: ReadonlySet<string> = this.idsUnderWay()): Promise<void> {
    const since = this.revision
    const answer = await this.ports.readChanges(since)
    if (this.closed || this.revision !== since) return
    this.items.confirm(answer.put, answer.removed)
    this.revision = answer.revision
    this.announced = Math.max(this.announced, answer.revision)
    const changed = [...answer.put.map((item) => item.id), ...answer.removed]
    const foreign = new Set(changed.filter((id) => !mine.has(id)))
    for (const id of foreign) this.foreignEntries.set(id, answer.entries)
    this.ports.entries(answer.entries)
    await this.keep(advanceBase(this.batches, { from: since, to: this.revision, foreign }))
    this.show(changed)
    if (answer.removed.length > 0 || answer.put.some((item) => shapesFaces(item.kind))) {
      this.ports.facesChanged('saved')
    }
  }

  private idsUnderWay(): ReadonlySet<string> {
    const first = this.batches[0]
    return new Set(first?.request ? first.edits.map(editedId) : [])
  }
}
