import { gridDistance } from '@shared/geometry/bearings'
import type { XY } from '@shared/units'
import { removeItems } from '../commands/change-items'
import type { EditorHost } from '../host'
import type { KeyInput, PointerInput } from '../input'
import type { MapPort } from '../map-port'
import { QuietMode } from './mode'

/** Clicks this near to each other are at the same place, pixels. */
const SAME_PLACE_PX = 4

/** Selects: a click takes the likeliest item, another click at the same place the next one beneath, shift adds. */
export class SelectMode extends QuietMode {
  private last: { at: XY; turn: number } | null = null

  constructor(
    private readonly map: MapPort,
    private readonly host: EditorHost,
  ) {
    super()
  }

  begin(): void {
    this.map.cursor('default')
    this.host.say('')
  }

  end(): void {
    this.last = null
    this.host.hover([])
  }

  override move(pointer: PointerInput): void {
    const [first] = this.map.pick(pointer.at)
    this.map.cursor(first ? 'pointer' : 'default')
    this.host.hover(first ? [first] : [])
  }

  override click(pointer: PointerInput): void {
    const candidates = this.map.pick(pointer.at)
    if (pointer.shift) return this.toggle(candidates[0])
    const turn = this.isSamePlace(pointer.at) ? (this.last?.turn ?? 0) + 1 : 0
    this.last = { at: pointer.at, turn }
    const picked = candidates[turn % Math.max(1, candidates.length)]
    this.host.select(picked ? [picked] : [])
    if (candidates.length > 1 && turn === 0) {
      this.host.say(`${candidates.length} items lie here: click again for the one beneath.`)
    } else this.host.say('')
  }

  override key(input: KeyInput): boolean {
    if (input.key === 'Escape') {
      this.host.select([])
      return true
    }
    if (input.key === 'Delete' || input.key === 'Backspace') return removeSelected(this.host)
    return false
  }

  private toggle(id: string | undefined): void {
    if (!id) return
    const selected = this.host.selected()
    this.host.select(selected.includes(id) ? selected.filter((each) => each !== id) : [...selected, id])
  }

  private isSamePlace(at: XY): boolean {
    return this.last !== null && gridDistance(this.last.at, at) <= SAME_PLACE_PX * this.map.metresPerPx()
  }
}

/** Removes what is selected; says why where that may not be. */
export function removeSelected(host: EditorHost): boolean {
  if (host.selected().length === 0) return false
  const answer = removeItems(host, host.selected())
  const reason = answer.outcome === 'drafted' ? host.commit(answer.draft) : answer.reason
  if (reason) host.say(reason)
  else host.select([])
  return true
}
