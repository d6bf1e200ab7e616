import type { LedgerEntry } from '@shared/api/sheets'
import type { ChangeSet } from '@shared/changes/change-set'
import type { Item } from '@shared/items/item'
import type { Delivery } from '@/offline/sender'
import type { ChangesAnswer, RevisionAnswer } from '@/stores/sheet-server'

const people = {
  rosa: { id: '00000000-0000-4000-9000-000000000001', name: 'Rosa Kelp', initials: 'RK' },
  tove: { id: '00000000-0000-4000-9000-000000000002', name: 'Tove Orr', initials: 'TO' },
}

/** A ledger as the client meets it over the wire: gives numbers, repeats answers for known keys, refuses what somebody
 *  else changed since the base, and can be cut off before or after it has done its work. */
export class FakeLedger {
  readonly items = new Map<string, Item>()
  readonly received: { key: string; body: ChangeSet }[] = []
  /** Items that the ledger never takes, whoever sends them. */
  readonly unfit = new Set<string>()
  /** What happens to the next posts, in order; 'ok' when there is nothing more. */
  readonly weather: ('ok' | 'lost before' | 'lost after' | 'held')[] = []
  private readonly changedAt = new Map<string, number>()
  private readonly answers = new Map<string, RevisionAnswer>()
  private readonly entries: LedgerEntry[] = []
  private release: () => void = () => undefined
  revision: number

  constructor(revision: number, items: readonly Item[] = []) {
    this.revision = revision
    for (const item of items) this.items.set(item.id, item)
  }

  /** Lets a held post go on. */
  letGo(): void {
    this.release()
  }

  /** Somebody else puts an item. */
  putByOther(item: Item): void {
    this.write('tove', { base: this.revision, message: 'changed something', changes: [{ op: 'put', item }] })
  }

  async post(body: ChangeSet, key: string): Promise<Delivery<RevisionAnswer>> {
    this.received.push({ key, body: structuredClone(body) })
    const weather = this.weather.shift() ?? 'ok'
    if (weather === 'lost before') return { outcome: 'unreachable' }
    if (weather === 'held') await new Promise<void>((resolve) => (this.release = resolve))
    const answered = this.answers.get(key)
    if (answered) return { outcome: 'done', answer: answered }
    const unfit = body.changes.flatMap((change) =>
      change.op === 'put' && this.unfit.has(change.item.id) ? [change.item.id] : [],
    )
    if (unfit.length > 0) return { outcome: 'refused', problem: unfitProblem(unfit) }
    const conflicts = body.changes
      .map((change) => (change.op === 'put' ? change.item.id : change.id))
      .filter((id) => (this.changedAt.get(id) ?? 0) > body.base)
    if (conflicts.length > 0) return { outcome: 'refused', problem: conflictProblem(conflicts) }
    const answer = this.write('rosa', body)
    this.answers.set(key, answer)
    return weather === 'lost after' ? { outcome: 'unreachable' } : { outcome: 'done', answer }
  }

  async changesSince(since: number): Promise<ChangesAnswer> {
    const ids = [...this.changedAt].filter(([, at]) => at > since).map(([id]) => id)
    return {
      revision: this.revision,
      // Over the wire nothing stays the same object.
      put: structuredClone(ids.flatMap((id) => this.items.get(id) ?? [])),
      removed: ids.filter((id) => !this.items.has(id)),
      entries: this.entries.filter((entry) => entry.revision > since),
    }
  }

  private write(who: keyof typeof people, body: ChangeSet): RevisionAnswer {
    this.revision += 1
    for (const change of body.changes) {
      const id = change.op === 'put' ? change.item.id : change.id
      if (change.op === 'put') this.items.set(id, structuredClone(change.item))
      else this.items.delete(id)
      this.changedAt.set(id, this.revision)
    }
    const entry: LedgerEntry = {
      revision: this.revision,
      kind: 'edit',
      author: people[who],
      at: '2026-12-01T09:00:00.000Z',
      message: body.message,
      what: 'drew 1 contact',
      changed: body.changes.length,
    }
    this.entries.push(entry)
    return { revision: this.revision, entry, altered: [] }
  }
}

export const conflictProblem = (ids: readonly string[]) => ({
  type: '/problems/item-conflict',
  title: 'Someone else changed the same items',
  status: 409,
  detail: 'Tove Orr changed the same item.',
  instance: 'urn:uuid:00000000-0000-4000-8000-000000000000',
  todo: 'Compare both versions and choose.',
  items: ids.map((id) => ({ id })),
})

export const unfitProblem = (ids: readonly string[]) => ({
  type: '/problems/invalid-input',
  title: 'Something in the request is not right',
  status: 400,
  detail: 'This line cannot be stored.',
  instance: 'urn:uuid:00000000-0000-4000-8000-000000000000',
  todo: 'Correct it.',
  errors: ids.map((item) => ({ pointer: '/changes/0', detail: 'This line cannot be stored.', item })),
})

/** A clock that only moves when it is told to. */
export class FakeClock {
  private waiting: { work: () => void; at: number }[] = []
  private now = 0

  later = (work: () => void, delayMs: number): (() => void) => {
    const entry = { work, at: this.now + delayMs }
    this.waiting.push(entry)
    return () => (this.waiting = this.waiting.filter((other) => other !== entry))
  }

  async advance(ms: number): Promise<void> {
    this.now += ms
    const due = this.waiting.filter(({ at }) => at <= this.now)
    this.waiting = this.waiting.filter(({ at }) => at > this.now)
    due.forEach(({ work }) => work())
    await settle()
  }
}

/** Lets everything that waits for promises alone come to its end. */
export async function settle(): Promise<void> {
  for (let turn = 0; turn < 30; turn++) await Promise.resolve()
}
