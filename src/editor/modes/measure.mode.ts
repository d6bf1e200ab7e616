import type { XY } from '@shared/units'
import { snap } from '../behaviours/snap'
import type { EditorHost } from '../host'
import type { KeyInput, PointerInput } from '../input'
import type { MapPort } from '../map-port'
import { bearingWords, lengthWords } from './measure-words'
import { QuietMode, Steps } from './mode'

/** Measures along a line on the sheet's grid, and the azimuth of its last piece from true north. Changes nothing. */
export class MeasureMode extends QuietMode {
  private readonly steps = new Steps<'waiting' | 'measuring' | 'shown'>('waiting', {
    waiting: ['measuring'],
    measuring: ['shown', 'waiting'],
    shown: ['waiting', 'measuring'],
  })
  private line: XY[] = []

  constructor(
    private readonly map: MapPort,
    private readonly host: EditorHost,
  ) {
    super()
  }

  begin(): void {
    this.map.cursor('crosshair')
    this.host.say(
      'Click along what you want to measure. Lengths are on the sheet’s grid, azimuths from true north.',
    )
  }

  end(): void {
    this.clear()
  }

  override move({ at }: PointerInput): void {
    if (this.steps.is('measuring')) this.show(this.place(at))
  }

  override click({ at }: PointerInput): void {
    this.add(this.place(at))
  }

  override typed(at: XY): boolean {
    this.add(at)
    return true
  }

  override doubleClick(): void {
    if (this.steps.is('measuring')) this.stop()
  }

  override key({ key }: KeyInput): boolean {
    if (this.steps.is('waiting')) return false
    if (key === 'Escape') this.clear()
    else if (key === 'Enter' && this.steps.is('measuring')) this.stop()
    else if (key === 'Backspace') this.undoStep()
    else return false
    return true
  }

  override undoStep(): boolean {
    if (!this.steps.is('measuring')) return false
    this.line.pop()
    if (this.line.length === 0) this.clear()
    else this.show(null)
    return true
  }

  private place(at: XY): XY {
    return snap(this.map, at, { to: this.host.isSnapping() ? 'all' : 'nothing' }).at
  }

  private add(at: XY): void {
    if (this.steps.is('shown')) this.clear()
    if (this.steps.is('waiting')) this.steps.go('measuring')
    this.line.push(at)
    this.show(null)
  }

  private stop(): void {
    this.steps.go('shown')
    this.show(null)
  }

  private clear(): void {
    if (!this.steps.is('waiting')) this.steps.go('waiting')
    this.line = []
    this.map.show(null)
    this.host.say('')
  }

  private show(next: XY | null): void {
    const whole = next ? [...this.line, next] : this.line
    const [from, to] = [whole.at(-2), whole.at(-1)]
    if (!to) return
    const words = from
      ? `${lengthWords(whole)}, azimuth ${bearingWords(from, to, this.host.convergenceAt(from))}`
      : ''
    if (words) this.host.say(words)
    this.map.show({
      line: this.line,
      vertices: this.line.map((at) => ({ at, active: false })),
      ...(next && from ? { preview: [from, next] } : {}),
      ...(words ? { label: { at: to, text: words } } : {}),
    })
  }
}
