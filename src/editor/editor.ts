import type { XY } from '@shared/units'
import { reverseLines } from './commands/change-items'
import type { EditorHost } from './host'
import type { KeyInput, PointerInput } from './input'
import type { MapPort } from './map-port'
import { DrawLineMode } from './modes/draw-line.mode'
import { EditVerticesMode } from './modes/edit-vertices.mode'
import { MeasureMode } from './modes/measure.mode'
import type { Mode } from './modes/mode'
import { PlacePointMode } from './modes/place-point.mode'
import { removeSelected, SelectMode } from './modes/select.mode'

export type EditorTool = 'select' | 'draw' | 'vertices' | 'measure'

const lineKinds: ReadonlySet<string> = new Set(['contact', 'fault', 'axial-trace', 'other-line'])

/** Routes pointer and keys to the active gesture. A gesture that fails is given up and begun anew: the sketch goes,
 *  nothing committed does. */
export class Editor {
  private mode: Mode

  constructor(
    private readonly map: MapPort,
    private readonly host: EditorHost,
    private readonly failed: (error: unknown) => void,
  ) {
    this.mode = new SelectMode(map, host)
    this.mode.begin()
  }

  /** Takes up an instrument; for `draw`, with the pen that the host holds now. */
  take(tool: EditorTool): void {
    this.safely(() => {
      this.mode.end()
      this.mode = this.modeFor(tool)
      this.mode.begin()
    })
  }

  move = (pointer: PointerInput): void => this.safely(() => this.mode.move(pointer))
  click = (pointer: PointerInput): void => this.safely(() => this.mode.click(pointer))
  doubleClick = (pointer: PointerInput): void => this.safely(() => this.mode.doubleClick(pointer))
  drag = (pointer: PointerInput): void => this.safely(() => this.mode.drag(pointer))
  release = (pointer: PointerInput): void => this.safely(() => this.mode.release(pointer))
  press = (pointer: PointerInput): boolean => this.ask(() => this.mode.press(pointer))
  key = (input: KeyInput): boolean => this.ask(() => this.mode.key(input))
  typed = (at: XY): boolean => this.ask(() => this.mode.typed(at))
  /** Takes back one step of an unfinished sketch; false where undo belongs to the sheet. */
  undoStep = (): boolean => this.ask(() => this.mode.undoStep())

  /** The sheet's items or the selection changed by another hand. */
  refresh(): void {
    const { mode } = this
    if (mode instanceof EditVerticesMode) this.safely(() => mode.refresh())
  }

  removeSelected(): void {
    this.ask(() => removeSelected(this.host))
  }

  reverseSelected(): void {
    this.safely(() => {
      const answer = reverseLines(this.host, this.host.selected())
      const reason = answer.outcome === 'drafted' ? this.host.commit(answer.draft) : answer.reason
      if (reason) this.host.say(reason)
    })
  }

  close(): void {
    this.safely(() => this.mode.end())
  }

  private modeFor(tool: EditorTool): Mode {
    const pen = this.host.pen()
    if (tool === 'vertices') return new EditVerticesMode(this.map, this.host)
    if (tool === 'measure') return new MeasureMode(this.map, this.host)
    if (tool !== 'draw' || !pen) return new SelectMode(this.map, this.host)
    return lineKinds.has(pen.kind)
      ? new DrawLineMode(this.map, this.host, pen)
      : new PlacePointMode(this.map, this.host, pen)
  }

  private safely(work: () => void): void {
    this.ask(() => {
      work()
      return true
    })
  }

  private ask(work: () => boolean): boolean {
    try {
      return work()
    } catch (error) {
      this.failed(error)
      this.map.show(null)
      this.mode = new SelectMode(this.map, this.host)
      this.host.say(
        'The gesture was given up because something went wrong. Nothing on the sheet has changed.',
      )
      return false
    }
  }
}
