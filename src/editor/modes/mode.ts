import type { XY } from '@shared/units'
import type { KeyInput, PointerInput } from '../input'

/** One gesture. Every handler that takes an event answers whether it used it. */
export interface Mode {
  /** The instrument was taken up. */
  begin(): void
  /** The instrument is put down: the sketch goes, nothing committed does. */
  end(): void
  move(pointer: PointerInput): void
  click(pointer: PointerInput): void
  doubleClick(pointer: PointerInput): void
  /** Button pressed: true takes the drag for the gesture, false leaves it to panning. */
  press(pointer: PointerInput): boolean
  drag(pointer: PointerInput): void
  release(pointer: PointerInput): void
  key(input: KeyInput): boolean
  /** A place typed as coordinates, sheet metres. */
  typed(at: XY): boolean
  /** Takes back one step inside an unfinished sketch; false where there is none, so that undo goes to the sheet. */
  undoStep(): boolean
}

/** A mode that ignores everything; real ones override what they use. */
export abstract class QuietMode implements Mode {
  abstract begin(): void
  abstract end(): void
  move(_pointer: PointerInput): void {}
  click(_pointer: PointerInput): void {}
  doubleClick(_pointer: PointerInput): void {}
  press(_pointer: PointerInput): boolean {
    return false
  }
  drag(_pointer: PointerInput): void {}
  release(_pointer: PointerInput): void {}
  key(_input: KeyInput): boolean {
    return false
  }
  typed(_at: XY): boolean {
    return false
  }
  undoStep(): boolean {
    return false
  }
}

/** The states of a mode and the steps between them. A step that is not in the table is a programmer's mistake: it throws,
 *  and the editor gives the gesture up. */
export class Steps<S extends string> {
  constructor(
    private current: S,
    private readonly legal: Readonly<Record<S, readonly S[]>>,
  ) {}

  is(state: S): boolean {
    return this.current === state
  }

  go(next: S): void {
    if (!this.legal[this.current].includes(next)) {
      throw new RangeError(`No step leads from ${this.current} to ${next}.`)
    }
    this.current = next
  }
}
