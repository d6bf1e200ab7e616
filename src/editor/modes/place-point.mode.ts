import { snapToGrid } from '@shared/geometry/grid'
import type { XY } from '@shared/units'
import { snap } from '../behaviours/snap'
import { placePoint } from '../commands/draw-line'
import type { EditorHost, Pen } from '../host'
import type { PointerInput } from '../input'
import type { MapPort } from '../map-port'
import { QuietMode } from './mode'

/** Places points: one click, or one typed place, each. The reading of an attitude or a lineation is asked for before it becomes an item. */
export class PlacePointMode extends QuietMode {
  constructor(
    private readonly map: MapPort,
    private readonly host: EditorHost,
    private readonly pen: Pen,
  ) {
    super()
  }

  begin(): void {
    this.map.cursor('crosshair')
    const next = this.hasReading() ? ' Its reading is asked for beside the map.' : ''
    this.host.say(`${this.pen.title}: click its place, or type it below.${next}`)
  }

  end(): void {
    this.map.show(null)
    this.host.say('')
  }

  override move({ at }: PointerInput): void {
    const to = this.station(at)
    this.map.show(to ? { snap: { at: to, to: 'point' } } : null)
  }

  override click({ at }: PointerInput): void {
    this.place(this.station(at) ?? snapToGrid(at))
  }

  override typed(at: XY): boolean {
    this.place(at)
    return true
  }

  /** Whether the pen's items are known by a reading. */
  private hasReading(): boolean {
    return this.pen.kind === 'attitude' || this.pen.kind === 'lineation'
  }

  /** Readings belong to stations: only points attract them, never a line's vertex. */
  private station(at: XY): XY | null {
    if (!this.host.isSnapping() || !this.hasReading()) return null
    const snapped = snap(this.map, at, { to: 'points' })
    return snapped.to === 'point' ? snapped.at : null
  }

  private place(at: XY): void {
    if (this.hasReading()) return this.host.askReading(at)
    const answer = placePoint({ id: this.host.newId(), pen: this.pen, at })
    if (answer.outcome === 'refused') return this.host.say(answer.reason)
    const reason = this.host.commit(answer.draft)
    if (reason) this.host.say(reason)
  }
}
