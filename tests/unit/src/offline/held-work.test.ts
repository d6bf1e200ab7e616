import { describe, expect, it } from 'vitest'
import { addEdits, freezeFirst } from '@/offline/batches'
import { addToHeld, decideBatch, holdFirst } from '@/offline/held-work'
import { conflictProblem } from '../../../support/fake-ledger'
import { aLine } from '../../../support/sheet-items'

const contact = aLine('contact', [[0, 0], [10, 0]], {}) // prettier-ignore
const other = aLine('contact', [[0, 50], [10, 50]], {}) // prettier-ignore
const named = (name: string) => ({ ...contact, properties: { ...contact.properties, name } })
const problem = conflictProblem([contact.id])

const rename = { base: 7, label: 'changed a name', edits: [{ before: contact, after: named('Skua') }] }
const again = { base: 7, label: 'changed a name', edits: [{ before: named('Skua'), after: named('Tern') }] }
const drew = { base: 7, label: 'drew a contact', edits: [{ before: null, after: other }] }
/** Two gestures that wait one behind the other, the first under way. */
const queueOf = (second: typeof again | typeof drew) =>
  addEdits(freezeFirst(addEdits([], rename), 'key'), second)

describe('work that two people did on the same items', () => {
  it('leaves the queue, where others go on', () => {
    const { held, queue } = holdFirst(queueOf(drew), problem)
    expect(held).toMatchObject([{ batch: { edits: rename.edits, request: null }, problem }])
    expect(queue).toMatchObject([{ edits: drew.edits }])
  })

  it('takes with it what was done later to its items', () => {
    const { held, queue } = holdFirst(queueOf(again), problem)
    expect(held[0]?.batch.edits).toEqual([{ before: contact, after: named('Tern') }])
    expect(held[0]?.batch.labels).toEqual(['changed a name', 'changed a name'])
    expect(queue).toEqual([])
  })

  it('takes up further edits of its items, and no others', () => {
    const { held } = holdFirst(queueOf(drew), problem)
    expect(addToHeld(held, again)?.[0]?.batch.edits).toEqual([{ before: contact, after: named('Tern') }])
    expect(addToHeld(held, drew)).toBeUndefined()
    const undo = { ...rename, edits: [{ before: named('Skua'), after: contact }] }
    expect(addToHeld(held, undo)?.[0]?.batch.edits).toEqual([{ before: contact, after: contact }])
  })
})

describe('a decision', () => {
  const batch = addEdits(addEdits([], rename), drew)[0]
  const decide = (before: typeof contact, after: typeof contact) =>
    batch && decideBatch(batch, { revision: 9, decisions: new Map([[contact.id, { before, after }]]) })

  it('puts the item as decided, and the undisputed edits with it, on top of the revision', () => {
    expect(decide(named('Tern'), named('Skua'))).toMatchObject({
      base: 9,
      edits: [drew.edits[0], { before: named('Tern'), after: named('Skua') }],
      request: null,
    })
  })

  it('sends nothing of an item that stays as the others left it', () => {
    expect(decide(named('Tern'), named('Tern'))?.edits).toEqual(drew.edits)
    const [alone] = addEdits([], rename)
    const decisions = new Map([[contact.id, { before: contact, after: contact }]])
    expect(alone && decideBatch(alone, { revision: 9, decisions })).toBeUndefined()
  })
})
