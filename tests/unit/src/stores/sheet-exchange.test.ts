import { beforeEach, describe, expect, it } from 'vitest'
import type { Item, ItemOf } from '@shared/items/item'
import { addEdits, freezeFirst, type Batch } from '@/offline/batches'
import type { Outbox } from '@/offline/outbox'
import { SheetExchange } from '@/stores/sheet-exchange'
import { conflictProblem, FakeClock, FakeLedger, settle } from '../../../support/fake-ledger'
import { aLine } from '../../../support/sheet-items'

const aContact = (): ItemOf<'contact'> =>
  aLine(
    'contact',
    [
      [0, 0],
      [10, 0],
    ],
    {},
  )
const noted = (item: ItemOf<'contact'>, note: string): ItemOf<'contact'> => ({
  ...item,
  properties: { ...item.properties, note },
})
const noteOf = (item: Item | undefined): string | undefined =>
  item?.kind === 'contact' ? item.properties.note : undefined

let clock: FakeClock
let ledger: FakeLedger
let kept: readonly Batch[]
let keys: number

function open(items: readonly Item[] = [], waiting: readonly Batch[] = []): SheetExchange {
  const outbox: Outbox = {
    keeps: true,
    adopt: async () => [],
    save: async (batches) => void (kept = structuredClone(batches)),
    close: () => undefined,
  }
  return new SheetExchange({ revision: ledger.revision, items, waiting }, outbox, {
    post: (body, key) => ledger.post(body, key),
    readChanges: (since) => ledger.changesSince(since),
    shown: () => undefined,
    told: () => undefined,
    entries: () => undefined,
    facesChanged: () => undefined,
    newKey: () => `key-${++keys}`,
    later: clock.later,
  })
}

beforeEach(() => {
  clock = new FakeClock()
  ledger = new FakeLedger(7)
  kept = []
  keys = 0
})

describe('sending', () => {
  it('shows a change at once, keeps it before it is sent, and forgets it when the ledger has it', async () => {
    const exchange = open()
    const contact = aContact()
    ledger.weather.push('held')
    exchange.put('drew a contact', [{ before: null, after: contact }])
    expect(exchange.items.get(contact.id)).toEqual(contact)
    await settle()
    expect(kept[0]?.request?.key).toBe('key-1')
    expect(exchange.saved).toEqual({ state: 'saving', revision: 7, waiting: 1 })
    ledger.letGo()
    await settle()
    expect(exchange.saved).toEqual({ state: 'saved', revision: 8, waiting: 0 })
    expect(kept).toEqual([])
  })

  it('sends one request at a time, and what was done meanwhile as one next request on the new revision', async () => {
    const exchange = open()
    const [first, second] = [aContact(), aContact()]
    ledger.weather.push('held')
    exchange.put('drew a contact', [{ before: null, after: first }])
    await settle()
    exchange.put('drew a contact', [{ before: null, after: second }])
    exchange.put('changed a note', [{ before: first, after: noted(first, 'seen') }])
    await settle()
    expect(ledger.received).toHaveLength(1)
    ledger.letGo()
    await settle()
    expect(ledger.received).toHaveLength(2)
    expect(ledger.received[1]?.body).toMatchObject({ base: 8, message: 'drew a contact; changed a note' })
    expect(exchange.saved.revision).toBe(9)
  })

  it('repeats the very same key and body until an answer comes, and stores nothing twice', async () => {
    const exchange = open()
    const contact = aContact()
    ledger.weather.push('lost before', 'lost after')
    exchange.put('drew a contact', [{ before: null, after: contact }])
    await settle()
    expect(exchange.saved).toMatchObject({ state: 'waiting', waiting: 1 })
    exchange.put('changed a note', [{ before: contact, after: noted(contact, 'later') }])
    await clock.advance(1000)
    await clock.advance(2000)
    const [once, twice, thrice, next] = ledger.received
    expect([twice, thrice]).toEqual([once, once])
    expect(next?.key).not.toBe(once?.key)
    expect(ledger.revision).toBe(9)
    expect(noteOf(ledger.items.get(contact.id))).toBe('later')
    expect(exchange.saved).toEqual({ state: 'saved', revision: 9, waiting: 0 })
  })

  it('sends what a closed page left behind, under the key that it was frozen with', async () => {
    const contact = aContact()
    const left = freezeFirst(
      addEdits([], { base: 7, label: 'drew a contact', edits: [{ before: null, after: contact }] }),
      'from before',
    )
    const exchange = open([], left)
    expect(exchange.items.get(contact.id)).toEqual(contact)
    await exchange.begin()
    await settle()
    expect(ledger.received[0]?.key).toBe('from before')
    expect(exchange.saved.state).toBe('saved')
  })

  it('never says saved while something waits, also before the sending begins', () => {
    const drew = { base: 7, label: 'drew a contact', edits: [{ before: null, after: aContact() }] }
    expect(open([], addEdits([], drew)).saved).toEqual({ state: 'saving', revision: 7, waiting: 1 })
  })

  it('sends what a closed page left one after the other, without taking its own for somebody else’s', async () => {
    const [mine, theirs] = [aContact(), aContact()]
    ledger = new FakeLedger(7, [mine, theirs])
    const step = noted(mine, 'first')
    const left = addEdits(
      freezeFirst(
        addEdits([], { base: 7, label: 'changed a note', edits: [{ before: mine, after: step }] }),
        'from before',
      ),
      { base: 7, label: 'changed a note', edits: [{ before: step, after: noted(mine, 'second') }] },
    )
    ledger.putByOther(noted(theirs, 'meanwhile'))
    const exchange = open([...ledger.items.values()], left)
    await exchange.begin()
    await settle()
    expect(exchange.saved).toEqual({ state: 'saved', revision: 10, waiting: 0 })
    expect(noteOf(ledger.items.get(mine.id))).toBe('second')
  })
})

describe('what the ledger will never take', () => {
  async function withUnfit() {
    const [unfit, good] = [aContact(), aContact()]
    ledger.unfit.add(unfit.id)
    const exchange = open()
    exchange.put('drew a contact', [{ before: null, after: unfit }])
    await settle()
    expect(exchange.saved.state).toBe('stopped')
    exchange.put('drew a contact', [{ before: null, after: good }])
    await settle()
    return { exchange, unfit, good }
  }

  it('stops the sender, with the good work after it kept', async () => {
    const { exchange, good } = await withUnfit()
    expect(exchange.saved).toMatchObject({ state: 'stopped', waiting: 2 })
    expect(exchange.items.get(good.id)).toEqual(good)
  })

  it('is given up alone, and the rest is saved', async () => {
    const { exchange, unfit, good } = await withUnfit()
    await exchange.giveUp([unfit.id])
    await settle()
    expect(exchange.saved).toEqual({ state: 'saved', revision: 8, waiting: 0 })
    expect([...ledger.items.keys()]).toEqual([good.id])
    expect(exchange.items.get(unfit.id)).toBeUndefined()
  })

  it('is sent again once it is changed, and forgotten once it is taken back', async () => {
    const { exchange, unfit } = await withUnfit()
    exchange.put('took back: drew a contact', [{ before: unfit, after: null }])
    await settle()
    expect(exchange.saved).toEqual({ state: 'saved', revision: 8, waiting: 0 })
  })
})

describe('other people’s changes', () => {
  it('come in beneath the own waiting ones, and merge where they touch other items', async () => {
    const [mine, theirs] = [aContact(), aContact()]
    ledger = new FakeLedger(7, [mine, theirs])
    const exchange = open([mine, theirs])
    ledger.weather.push('lost before')
    exchange.put('changed a note', [{ before: mine, after: noted(mine, 'mine') }])
    await settle()
    ledger.putByOther(noted(theirs, 'theirs'))
    exchange.hear(8)
    await settle()
    expect(noteOf(exchange.items.get(theirs.id))).toBe('theirs')
    expect(noteOf(exchange.items.get(mine.id))).toBe('mine')
    await clock.advance(1000)
    expect(exchange.saved).toEqual({ state: 'saved', revision: 9, waiting: 0 })
  })

  it('are fetched before the next sending where they lie between the own base and the own revision', async () => {
    const [mine, theirs] = [aContact(), aContact()]
    ledger = new FakeLedger(7, [mine, theirs])
    const exchange = open([mine, theirs])
    ledger.putByOther(noted(theirs, 'theirs'))
    exchange.put('changed a note', [{ before: mine, after: noted(mine, 'mine') }])
    await settle()
    expect(exchange.saved.revision).toBe(9)
    expect(noteOf(exchange.items.get(theirs.id))).toBe('theirs')
    expect(exchange.foreignEntries.has(theirs.id)).toBe(true)
    expect(exchange.foreignEntries.has(mine.id)).toBe(false)
  })

  it('are not overwritten by the late answer to a request that came before them', async () => {
    const contact = aContact()
    ledger = new FakeLedger(7, [contact])
    const exchange = open([contact])
    ledger.weather.push('lost after')
    exchange.put('changed a note', [{ before: contact, after: noted(contact, 'mine') }])
    await settle()
    ledger.putByOther(noted(contact, 'theirs, on top of mine'))
    exchange.hear(9)
    await settle()
    await clock.advance(1000)
    expect(exchange.saved).toEqual({ state: 'saved', revision: 9, waiting: 0 })
    expect(noteOf(exchange.items.get(contact.id))).toBe('theirs, on top of mine')
  })

  it('are still a conflict after an own request for other items went through', async () => {
    const [first, second] = [aContact(), aContact()]
    ledger = new FakeLedger(7, [first, second])
    const exchange = open([first, second])
    ledger.weather.push('lost before')
    exchange.put('changed a note', [{ before: first, after: noted(first, 'mine') }])
    await settle()
    exchange.put('changed a note', [{ before: second, after: noted(second, 'mine') }])
    ledger.putByOther(noted(second, 'theirs'))
    exchange.hear(8)
    await settle()
    await clock.advance(1000)
    expect(exchange.saved).toMatchObject({ state: 'stopped', waiting: 1 })
    expect(noteOf(ledger.items.get(second.id))).toBe('theirs')
  })

  async function inConflict() {
    const contact = aContact()
    ledger = new FakeLedger(7, [contact])
    const exchange = open([contact])
    ledger.putByOther(noted(contact, 'theirs'))
    exchange.put('changed a note', [{ before: contact, after: noted(contact, 'mine') }])
    await settle()
    return { exchange, id: contact.id }
  }

  it('stop the sender where they changed the same item, with the problem told and nothing lost', async () => {
    const { exchange, id } = await inConflict()
    expect(exchange.saved).toEqual({
      state: 'stopped',
      revision: 8,
      waiting: 1,
      problem: conflictProblem([id]),
    })
    expect(noteOf(exchange.items.get(id))).toBe('mine')
    await clock.advance(60_000)
    expect(ledger.received).toHaveLength(1)
  })

  it('hold up only what they touch: other work is saved while the decision waits', async () => {
    const { exchange, id } = await inConflict()
    const fresh = aContact()
    exchange.put('drew a contact', [{ before: null, after: fresh }])
    await settle()
    expect(ledger.items.get(fresh.id)).toEqual(fresh)
    expect(exchange.saved).toMatchObject({ state: 'stopped', revision: 9, waiting: 1 })
    expect(noteOf(exchange.items.get(id))).toBe('mine')
    expect(kept).toHaveLength(1)
    const settled = exchange.settle(new Map([[id, exchange.items.get(id) ?? null]]))
    expect(exchange.saved).toEqual({ state: 'saving', revision: 9, waiting: 1 })
    await settled
    await settle()
    expect(noteOf(ledger.items.get(id))).toBe('mine')
    expect(exchange.saved).toEqual({ state: 'saved', revision: 10, waiting: 0 })
  })

  it('stand when theirs is chosen, and nothing is sent', async () => {
    const { exchange, id } = await inConflict()
    await exchange.settle(new Map([[id, exchange.items.confirmedItem(id) ?? null]]))
    await settle()
    expect(noteOf(exchange.items.get(id))).toBe('theirs')
    expect(exchange.saved).toEqual({ state: 'saved', revision: 8, waiting: 0 })
    expect(ledger.received).toHaveLength(1)
  })

  it('are followed by the own version as a new entry when mine is chosen', async () => {
    const { exchange, id } = await inConflict()
    await exchange.settle(new Map([[id, exchange.items.get(id) ?? null]]))
    await settle()
    expect(ledger.received[1]?.body.base).toBe(8)
    expect(ledger.received[1]?.key).not.toBe(ledger.received[0]?.key)
    expect(noteOf(ledger.items.get(id))).toBe('mine')
    expect(exchange.saved).toEqual({ state: 'saved', revision: 9, waiting: 0 })
  })

  it('are joined with the own ones where a combination is decided', async () => {
    const { exchange, id } = await inConflict()
    const theirs = ledger.items.get(id) as ItemOf<'contact'>
    await exchange.settle(new Map([[id, { ...theirs, properties: { ...theirs.properties, name: 'Skua' } }]]))
    await settle()
    expect(ledger.items.get(id)?.properties).toMatchObject({ note: 'theirs', name: 'Skua' })
    expect(exchange.saved).toEqual({ state: 'saved', revision: 9, waiting: 0 })
  })

  it('show again when everything that waits is given up', async () => {
    const { exchange, id } = await inConflict()
    await exchange.discard()
    expect(noteOf(exchange.items.get(id))).toBe('theirs')
    expect(kept).toEqual([])
  })
})
