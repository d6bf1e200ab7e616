import { gridDistance } from '@shared/geometry/bearings'
import type { XY } from '@shared/units'
import { snap, type Snapped } from '../behaviours/snap'
import { drawLine } from '../commands/draw-line'
import { isSamePlace, type Node } from '../commands/line-nodes'
import type { EditorHost, Pen } from '../host'
import type { KeyInput, PointerInput } from '../input'
import type { MapPort } from '../map-port'
import { lengthWords } from './measure-words'
import { QuietMode, Steps } from './mode'

/** A second click this near to the last vertex belongs to a double click, pixels. */
const REPEAT_PX = 4

/** Draws a line: a click sets a vertex, double click or Enter ends, Backspace takes the last vertex back, Escape gives up. */
export class DrawLineMode extends QuietMode {
  private readonly steps = new Steps<'waiting' | 'drawing'>('waiting', {
    waiting: ['drawing'],
    drawing: ['waiting'],
  })
  private vertices: Snapped[] = []
  private pointer: XY | null = null

  constructor(
    private readonly map: MapPort,
    private readonly host: EditorHost,
    private readonly pen: Pen,
  ) {
    super()
  }

  begin(): void {
    this.map.cursor('crosshair')
    const kept = this.host.keptSketch()
    if (kept.length === 0) return this.tellBeginning()
    this.steps.go('drawing')
    this.vertices = kept.map((at) => ({ at, to: null, id: null }))
    this.host.say(`Your unfinished line is still here: click on, or Esc gives it up.`)
    this.show(null)
  }

  /** What is unfinished stays kept: whoever comes back goes on. */
  end(): void {
    this.map.show(null)
    this.host.say('')
  }

  override move({ at }: PointerInput): void {
    this.pointer = at
    this.show(this.place(at))
  }

  override click({ at }: PointerInput): void {
    const last = this.vertices.at(-1)
    const snapped = this.place(at)
    if (last && gridDistance(last.at, snapped.at) <= REPEAT_PX * this.map.metresPerPx()) return
    this.add(snapped)
    const first = this.vertices[0]
    if (first && this.vertices.length > 3 && isSamePlace(first.at, snapped.at)) this.finish()
  }

  override doubleClick(): void {
    if (this.steps.is('drawing')) this.finish()
  }

  override typed(at: XY): boolean {
    this.add({ at, to: null, id: null })
    return true
  }

  override key({ key }: KeyInput): boolean {
    if (!this.steps.is('drawing')) return false
    if (key === 'Enter') this.finish()
    else if (key === 'Escape') this.clear()
    else if (key === 'Backspace') this.undoStep()
    else return false
    return true
  }

  override undoStep(): boolean {
    if (!this.steps.is('drawing')) return false
    this.vertices.pop()
    this.keep()
    if (this.vertices.length === 0) this.clear()
    else this.show(this.pointer ? this.place(this.pointer) : null)
    return true
  }

  private place(at: XY): Snapped {
    if (!this.host.isSnapping()) return snap(this.map, at, { to: 'nothing' })
    const first = this.vertices[0]
    return snap(this.map, at, { own: first && this.vertices.length > 2 ? [first.at] : [] })
  }

  private add(vertex: Snapped): void {
    if (this.steps.is('waiting')) this.steps.go('drawing')
    this.vertices.push(vertex)
    this.keep()
    this.host.say('Click on; double click or Enter ends, Backspace takes the last vertex back, Esc gives up.')
    this.show(null)
  }

  private finish(): void {
    const line = this.vertices.map(({ at }) => at)
    const answer = drawLine(this.host, { id: this.host.newId(), pen: this.pen, line, nodes: this.nodes() })
    if (answer.outcome === 'refused') return this.host.say(answer.reason)
    const reason = this.host.commit(answer.draft)
    if (reason) return this.host.say(reason)
    const made = answer.draft.edits[0]?.after
    this.clear()
    if (made) this.host.select([made.id])
  }

  /** Sides of other lines that vertices were snapped onto. */
  private nodes(): Node[] {
    return this.vertices.flatMap(({ at, to, id }) => (to === 'line' && id !== null ? [{ id, at }] : []))
  }

  private clear(): void {
    if (this.steps.is('drawing')) this.steps.go('waiting')
    this.vertices = []
    this.keep()
    this.map.show(null)
    this.tellBeginning()
  }

  private keep(): void {
    this.host.keepSketch(this.vertices.map(({ at }) => at))
  }

  private tellBeginning(): void {
    this.host.say(`${this.pen.title}: click where it begins, or type a place.`)
  }

  private show(next: Snapped | null): void {
    const line = this.vertices.map(({ at }) => at)
    const last = line.at(-1)
    this.map.show({
      line,
      vertices: line.map((at) => ({ at, active: false })),
      ...(last && next ? { preview: [last, next.at] } : {}),
      ...(next?.to ? { snap: { at: next.at, to: next.to } } : {}),
      ...(last && next ? { label: { at: next.at, text: lengthWords([...line, next.at]) } } : {}),
    })
  }
}
