import { describe, expect, it } from 'vitest'
import {
  addEdits,
  advanceBase,
  countWaiting,
  dropItems,
  freezeFirst,
  messageOf,
  thawFirst,
} from '@/offline/batches'
import { aLine } from '../../../support/sheet-items'

const contact = aLine(
  'contact',
  [
    [0, 0],
    [10, 0],
  ],
  {},
)
const moved = {
  ...contact,
  geometry: {
    ...contact.geometry,
    coordinates: [
      [0, 0],
      [10, 5],
    ] as [number, number][],
  },
}
const drew = { base: 7, label: 'drew a contact', edits: [{ before: null, after: contact }] }
const move = { base: 7, label: 'moved a vertex of a contact', edits: [{ before: contact, after: moved }] }
const undo = { base: 7, label: 'took back: drew a contact', edits: [{ before: contact, after: null }] }

describe('batches of unsent edits', () => {
  it('composes gestures that were made before sending into one change set whose message names them', () => {
    const [batch] = freezeFirst(addEdits(addEdits([], drew), move), 'key')
    expect(batch?.request?.body).toEqual({
      base: 7,
      message: 'drew a contact; moved a vertex of a contact',
      changes: [{ op: 'put', item: moved }],
    })
  })

  it('says why instead of what was done, each reason once', () => {
    const why = 'after the spring visit'
    const batches = addEdits(addEdits(addEdits([], { ...drew, why }), { ...move, why }), {
      ...move,
      edits: [{ before: moved, after: contact }],
      why: 'the old line was right',
    })
    expect(freezeFirst(batches, 'key')[0]?.request?.body.message).toBe(
      'after the spring visit; the old line was right',
    )
    const silent = freezeFirst(addEdits([], { ...drew, why: '' }), 'key')
    expect(silent[0]?.request?.body.message).toBe('drew a contact')
  })

  it('leaves nothing to send of what was drawn and taken back before it was sent', () => {
    expect(addEdits(addEdits([], drew), undo)).toEqual([])
  })

  it('opens a new batch behind a frozen one, and never changes the frozen one', () => {
    const frozen = freezeFirst(addEdits([], drew), 'key')
    const both = addEdits(frozen, move)
    expect(both[0]).toBe(frozen[0])
    expect(both[1]?.request).toBeNull()
    expect(countWaiting(both)).toBe(2)
  })

  it('keeps key and body over a second freezing', () => {
    const once = freezeFirst(addEdits([], drew), 'first')
    expect(freezeFirst(once, 'second')[0]?.request?.key).toBe('first')
    expect(freezeFirst(thawFirst(once), 'second')[0]?.request?.key).toBe('second')
  })

  it('moves the base along with known revisions, except where somebody else changed the same item', () => {
    const batches = addEdits([], move)
    const to9 = { from: 7, to: 9, foreign: new Set<string>() }
    expect(advanceBase(batches, to9)[0]?.base).toBe(9)
    const behind = advanceBase(batches, { ...to9, foreign: new Set([contact.id]) })
    expect(behind[0]?.base).toBe(7)
    expect(advanceBase(behind, { from: 9, to: 10, foreign: new Set() })[0]?.base).toBe(7)
  })

  it('leaves the base of a frozen batch alone', () => {
    const frozen = freezeFirst(addEdits([], move), 'key')
    expect(advanceBase(frozen, { from: 7, to: 9, foreign: new Set() })).toEqual(frozen)
  })

  it('drops the edits of items that were given up, keeps the base of the others, and no empty batch', () => {
    const other = { ...contact, id: '00000000-0000-4000-8000-00000000eeee' }
    const both = addEdits(addEdits([], move), { ...drew, edits: [{ before: null, after: other }] })
    expect(dropItems(both, new Set([contact.id]))).toMatchObject([{ base: 7, edits: [{ after: other }] }])
    expect(dropItems(both, new Set([contact.id, other.id]))).toEqual([])
  })

  it('counts equal gestures and keeps the message within what the ledger takes', () => {
    expect(messageOf(['placed a station', 'placed a station'])).toBe('placed a station (2 times)')
    const many = messageOf(Array.from({ length: 80 }, (_, index) => `changed the note of station ${index}`))
    expect(many.length).toBeLessThanOrEqual(500)
    expect(many).toMatch(/; and \d+ more$/)
  })
})
