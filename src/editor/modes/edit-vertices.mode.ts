import { gridDistance } from '@shared/geometry/bearings'
import { isLineItem, isPointItem, type LineItem, type PointItem } from '@shared/items/item'
import type { XY } from '@shared/units'
import { nearestOnLine, nearestVertex } from '@shared/geometry/nearest'
import { verticesAt, type VertexPlace } from '../behaviours/shared-vertices'
import { snap, type Snapped } from '../behaviours/snap'
import type { Drafted } from '../commands/change-draft'
import { withVertex, type Node } from '../commands/line-nodes'
import { movePoint, reshapeLines, type ReshapedLine } from '../commands/move-vertices'
import type { EditorHost } from '../host'
import type { KeyInput, PointerInput } from '../input'
import type { MapPort } from '../map-port'
import { QuietMode, Steps } from './mode'
import { removeSelected } from './select.mode'

/** Reach of a vertex handle and of a line's side, pixels. */
const VERTEX_PX = 9
const SIDE_PX = 7

/** What is being dragged: vertices that share a place, one new vertex of the line, or a point item. */
type Grip =
  | { what: 'vertices'; places: VertexPlace[]; from: XY }
  | { what: 'new'; line: XY[]; index: number }
  | { what: 'point' }

/** Moves, inserts and removes vertices of the selected line, and moves a selected point. A drag on a vertex moves every
 *  line that meets there (Alt: this line alone); a drag on a side puts a vertex in; Delete or Alt-click takes one out.
 *  Without a pointer: [ and ] step from vertex to vertex, a typed place moves the active one, Insert adds one after it. */
export class EditVerticesMode extends QuietMode {
  private readonly steps = new Steps<'resting' | 'dragging'>('resting', {
    resting: ['dragging'],
    dragging: ['resting'],
  })
  private grip: Grip | null = null
  private active: number | null = null

  constructor(
    private readonly map: MapPort,
    private readonly host: EditorHost,
  ) {
    super()
  }

  begin(): void {
    this.map.cursor('default')
    this.active = null
    this.show()
    this.tell()
  }

  end(): void {
    this.letGo()
    this.map.show(null)
    this.host.hover([])
    this.host.say('')
  }

  override move({ at }: PointerInput): void {
    const line = this.line()
    if (line && this.vertexAt(line, at) !== undefined) return this.map.cursor('move')
    if (line && this.isOnSide(line, at)) return this.map.cursor('pointer')
    const [first] = this.map.pick(at)
    this.host.hover(first ? [first] : [])
    this.map.cursor(first ? 'pointer' : 'default')
  }

  override press({ at, alt }: PointerInput): boolean {
    this.grip = this.gripAt(at, alt)
    if (this.grip) this.steps.go('dragging')
    return this.grip !== null
  }

  override drag({ at }: PointerInput): void {
    if (!this.grip) return
    this.map.cursor('grabbing')
    this.showDragged(this.target(at))
  }

  override release({ at }: PointerInput): void {
    const grip = this.grip
    const target = this.target(at)
    const moved = grip && !(grip.what === 'vertices' && this.isBarelyMoved(grip.from, at))
    this.letGo()
    if (grip && moved) this.finish(this.dragged(grip, target))
    this.show()
  }

  override click({ at, alt }: PointerInput): void {
    const line = this.line()
    const vertex = line ? this.vertexAt(line, at) : undefined
    if (vertex !== undefined) {
      this.active = vertex
      if (alt) this.removeVertex()
      return this.show()
    }
    if (line && this.isOnSide(line, at)) return
    const [first] = this.map.pick(at)
    this.host.select(first ? [first] : [])
    this.active = null
    this.show()
    this.tell()
  }

  override typed(at: XY): boolean {
    const point = this.point()
    if (point) this.finish(movePoint(this.host, { id: point.id, at }))
    const line = this.line()
    const from = this.active === null ? undefined : line?.geometry.coordinates[this.active]
    if (!line || !from) {
      if (!point) this.host.say('Choose a vertex with [ and ] first, then type where it goes.')
      return point !== undefined
    }
    const places = verticesAt(this.map, this.host, from)
    this.finish(this.dragged({ what: 'vertices', places, from }, { at, to: null, id: null }))
    this.show()
    return true
  }

  override key({ key }: KeyInput): boolean {
    if (key === 'Escape') return this.escape()
    if (key === '[' || key === ']') return this.step(key === ']' ? 1 : -1)
    if (key === 'Insert') return this.insertAfterActive()
    if (key !== 'Delete' && key !== 'Backspace') return false
    return this.active === null ? removeSelected(this.host) : this.removeVertex()
  }

  /** The items changed under the gesture: by undo, or by somebody else. */
  refresh(): void {
    if (this.steps.is('resting')) this.show()
  }

  private line(): LineItem | undefined {
    const item = this.only()
    return item && isLineItem(item) ? item : undefined
  }

  private point(): PointItem | undefined {
    const item = this.only()
    return item && isPointItem(item) ? item : undefined
  }

  private only() {
    const [id, ...more] = this.host.selected()
    return id !== undefined && more.length === 0 ? this.host.item(id) : undefined
  }

  private vertexAt(line: LineItem, at: XY): number | undefined {
    return nearestVertex(line.geometry.coordinates, at, VERTEX_PX * this.map.metresPerPx())
  }

  private isOnSide(line: LineItem, at: XY): boolean {
    return nearestOnLine(line.geometry.coordinates, at).distance <= SIDE_PX * this.map.metresPerPx()
  }

  private isBarelyMoved(from: XY, at: XY): boolean {
    return gridDistance(from, at) <= 2 * this.map.metresPerPx()
  }

  private gripAt(at: XY, alone: boolean): Grip | null {
    if (this.host.readOnly() !== null) return null
    const point = this.point()
    if (point) return this.map.pick(at).includes(point.id) ? { what: 'point' } : null
    const line = this.line()
    if (!line) return null
    const index = this.vertexAt(line, at)
    const from = index === undefined ? undefined : line.geometry.coordinates[index]
    if (index !== undefined && from) {
      this.active = index
      const places = alone ? [{ id: line.id, index }] : verticesAt(this.map, this.host, from)
      return { what: 'vertices', places, from }
    }
    if (!this.isOnSide(line, at)) return null
    const { segment } = nearestOnLine(line.geometry.coordinates, at)
    this.active = segment + 1
    return { what: 'new', line: line.geometry.coordinates.toSpliced(segment + 1, 0, at), index: segment + 1 }
  }

  private target(at: XY): Snapped {
    if (!this.host.isSnapping()) return snap(this.map, at, { to: 'nothing' })
    return snap(this.map, at, { exclude: new Set(this.lines(this.grip).map(({ id }) => id)) })
  }

  /** The lines a grip holds, as they would be with the held vertices at a place. */
  private lines(grip: Grip | null, at?: XY): ReshapedLine[] {
    const line = this.line()
    if (grip?.what === 'new' && line) {
      return [{ id: line.id, line: at ? grip.line.with(grip.index, at) : grip.line }]
    }
    if (grip?.what !== 'vertices') return []
    const ids = [...new Set(grip.places.map(({ id }) => id))]
    return ids.flatMap((id) => {
      const item = this.host.item(id)
      if (!item || !isLineItem(item)) return []
      const held = new Set(grip.places.flatMap((place) => (place.id === id ? [place.index] : [])))
      return [{ id, line: item.geometry.coordinates.map((xy, index) => (at && held.has(index) ? at : xy)) }]
    })
  }

  private dragged(grip: Grip, target: Snapped): Drafted {
    const point = this.point()
    if (grip.what === 'point' && point) return movePoint(this.host, { id: point.id, at: target.at })
    const nodes: Node[] = target.to === 'line' && target.id !== null ? [{ id: target.id, at: target.at }] : []
    const deed = grip.what === 'new' ? 'put a vertex into' : 'moved a vertex of'
    return reshapeLines(this.host, { deed, lines: this.lines(grip, target.at), nodes })
  }

  private removeVertex(): boolean {
    const line = this.line()
    if (!line || this.active === null) return false
    const left = line.geometry.coordinates.toSpliced(this.active, 1)
    this.finish(
      reshapeLines(this.host, {
        deed: 'took a vertex out of',
        lines: [{ id: line.id, line: left }],
        nodes: [],
      }),
    )
    this.active = null
    this.show()
    return true
  }

  private insertAfterActive(): boolean {
    const line = this.line()?.geometry.coordinates
    const from = this.active === null ? undefined : line?.[this.active]
    const to = this.active === null ? undefined : line?.[this.active + 1]
    const item = this.line()
    if (!item || !line || !from || !to) return false
    const middle = snap(this.map, [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2], { to: 'nothing' }).at
    this.finish(
      reshapeLines(this.host, {
        deed: 'put a vertex into',
        lines: [{ id: item.id, line: withVertex(line, middle) }],
        nodes: [],
      }),
    )
    this.active = (this.active ?? 0) + 1
    this.show()
    return true
  }

  private step(by: number): boolean {
    const count = this.line()?.geometry.coordinates.length
    if (!count) return false
    this.active = this.active === null ? (by > 0 ? 0 : count - 1) : (this.active + by + count) % count
    this.host.say(`Vertex ${this.active + 1} of ${count}. Type where it goes, Delete takes it out.`)
    this.show()
    return true
  }

  private escape(): boolean {
    if (this.grip) this.letGo()
    else if (this.active !== null) this.active = null
    else this.host.select([])
    this.show()
    return true
  }

  private finish(answer: Drafted): void {
    const reason = answer.outcome === 'drafted' ? this.host.commit(answer.draft) : answer.reason
    if (reason) this.host.say(reason)
  }

  private letGo(): void {
    if (this.steps.is('dragging')) this.steps.go('resting')
    this.grip = null
  }

  private showDragged(target: Snapped): void {
    const [line] = this.lines(this.grip, target.at)
    this.map.show({
      ...(line ? { line: line.line } : {}),
      vertices: [{ at: target.at, active: true }],
      ...(target.to ? { snap: { at: target.at, to: target.to } } : {}),
    })
  }

  private show(): void {
    const line = this.line()?.geometry.coordinates
    if (!line) return this.map.show(null)
    if (this.active !== null && this.active >= line.length) this.active = null
    this.map.show({ line, vertices: line.map((at, index) => ({ at, active: index === this.active })) })
  }

  private tell(): void {
    const reason = this.host.readOnly()
    if (reason) return this.host.say(reason)
    this.host.say(
      this.only()
        ? 'Drag a vertex, or the line itself to put one in; Alt-click takes one out. [ and ] step through them.'
        : 'Click the line whose vertices you want to edit.',
    )
  }
}
