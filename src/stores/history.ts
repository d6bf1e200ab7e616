import { invertEdits, type Edit } from '@shared/changes/change-set'

/** One step that can be taken back: everything that one gesture, or one intake, changed. */
export interface Step {
  label: string
  edits: readonly Edit[]
}

/** Most steps kept; older ones are forgotten first. */
const MOST_STEPS = 500

/** Undo and redo of one open sheet, as edits and nothing else: taking back is the inverse of what was done, for every
 *  command at once. Knows nothing of how edits are stored or sent. */
export class History {
  private done: Step[] = []
  private undone: Step[] = []

  /** A new step; what was taken back before can no longer be done again. */
  push(step: Step): void {
    this.done.push(step)
    if (this.done.length > MOST_STEPS) this.done.shift()
    this.undone = []
  }

  get undoLabel(): string | null {
    return this.done.at(-1)?.label ?? null
  }

  get redoLabel(): string | null {
    return this.undone.at(-1)?.label ?? null
  }

  /** The edits that would take back the last step; undefined where there is none. */
  peekUndo(): Step | undefined {
    const step = this.done.at(-1)
    return step && { label: step.label, edits: invertEdits(step.edits) }
  }

  /** The edits that would do the last taken-back step again. */
  peekRedo(): Step | undefined {
    return this.undone.at(-1)
  }

  /** The last step was taken back. */
  undo(): void {
    const step = this.done.pop()
    if (step) this.undone.push(step)
  }

  /** The last taken-back step was done again. */
  redo(): void {
    const step = this.undone.pop()
    if (step) this.done.push(step)
  }

  clear(): void {
    this.done = []
    this.undone = []
  }
}
