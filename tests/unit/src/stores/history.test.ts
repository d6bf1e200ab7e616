import { describe, expect, it } from 'vitest'
import { History } from '@/stores/history'
import { aLine } from '../../../support/sheet-items'

const contact = aLine(
  'contact',
  [
    [0, 0],
    [10, 0],
  ],
  {},
)
const step = { label: 'drew a contact', edits: [{ before: null, after: contact }] }

describe('undo and redo', () => {
  it('offer the inverse of the last step, and the step again once it was taken back', () => {
    const history = new History()
    history.push(step)
    expect(history.peekUndo()?.edits).toEqual([{ before: contact, after: null }])
    history.undo()
    expect(history.undoLabel).toBeNull()
    expect(history.peekRedo()).toEqual(step)
    history.redo()
    expect(history.undoLabel).toBe('drew a contact')
  })

  it('forget what was taken back as soon as something new is done', () => {
    const history = new History()
    history.push(step)
    history.undo()
    history.push({ ...step, label: 'drew another' })
    expect(history.peekRedo()).toBeUndefined()
  })
})
