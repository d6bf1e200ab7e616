import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import type { LegendEntry } from '@shared/symbols/legend-entries'
import type { XY } from '@shared/units'
import { useSessionStore } from './session'
import { useSymbolSize } from './symbol-size'

/** Instruments of the workplace; `draw` draws with what is picked in the legend margin. */
export type Tool = 'select' | 'draw' | 'vertices' | 'measure'

/** What one draws with: a legend entry, or the label of a unit. */
export type DrawWith = LegendEntry | { unit: string }

export const isUnitPen = (pen: DrawWith): pen is { unit: string } => 'unit' in pen

/** Where to move the view: to some items, to the whole page, to a place at a percentage of print size, or to a piece of
 *  ground, sheet metres. */
export type ViewRequest =
  | { to: 'items'; ids: readonly string[] }
  | { to: 'page' }
  | { to: 'place'; at: XY; percent: number }
  | { to: 'ground'; box: { min: XY; max: XY } }

/** What is going on in the workplace just now: instrument, pen, selection, what is hovered. Nothing here is stored. */
export const useWorkplaceStore = defineStore('workplace', () => {
  const session = useSessionStore()
  const tool = ref<Tool>('select')
  const drawWith = shallowRef<DrawWith | null>(null)
  const selected = shallowRef<readonly string[]>([])
  /** Items under the pointer on the map. */
  const hovered = shallowRef<readonly string[]>([])
  /** Legend entry, or unit, of what is under the pointer on the map or in the margin. */
  const hoveredEntry = ref<string | null>(null)
  /** The row that the map lit last; another one than this in `hoveredEntry` was lit by the margin. */
  const mapRow = ref<string | null>(null)
  /** Row that is pointed at in the margin, whose items the map lights. */
  const rowInMargin = computed(() => (hoveredEntry.value === mapRow.value ? null : hoveredEntry.value))
  /** Entries and units that are not drawn on the map now. */
  const hiddenEntries = ref<ReadonlySet<string>>(new Set())
  /** What was drawn with last, for drawing again by one key. */
  const lastPen = shallowRef<DrawWith | null>(null)
  const snapping = ref(true)
  /** Symbols above 100 %: grow with the sheet (print size), or stay as at 100 % (screen size). */
  const symbolSize = useSymbolSize(() => session.account?.id)
  /** Legend rows of which some symbols give way to others at this zoom, and how many. */
  const thinned = shallowRef<ReadonlyMap<string, number>>(new Map())
  /** A place was clicked for an attitude; the reading is asked for beside the map. */
  const pendingReadingPlace = shallowRef<XY | null>(null)
  /** Pointer on the sheet, sheet metres; null outside. */
  const cursor = shallowRef<XY | null>(null)
  /** Unit under the pointer. */
  const unitHere = ref<string | null>(null)
  /** Scale of the view, per cent of print size. */
  const percent = ref(100)
  /** Counts how often the view has come to rest, for whoever follows it. */
  const viewRests = ref(0)
  /** Ground in view when it last came to rest, sheet metres: west, south, east, north; null before. */
  const viewExtent = shallowRef<readonly [number, number, number, number] | null>(null)
  const viewRequest = shallowRef<ViewRequest | null>(null)
  /** One plain sentence for the foot: what the instrument expects, or why it refused. */
  const hint = ref('')

  function choose(next: Tool): void {
    tool.value = next
    if (next !== 'draw') drawWith.value = null
    pendingReadingPlace.value = null
  }

  /** Picks what to draw with, or puts the pen down where the same is picked again. */
  function draw(pen: DrawWith | null): void {
    if (!pen || isSamePen(pen, drawWith.value)) return choose('select')
    drawWith.value = lastPen.value = pen
    tool.value = 'draw'
    pendingReadingPlace.value = null
    selected.value = []
  }

  /** The pointer on the map is over these items, or over an area of a unit.
   *  @param row legend entry or unit that explains it */
  function hoverOnMap(ids: readonly string[], row: string | null): void {
    hovered.value = ids
    hoveredEntry.value = mapRow.value = row
  }

  /** Takes up the last pen again. */
  function drawAgain(): void {
    if (lastPen.value && tool.value !== 'draw') draw(lastPen.value)
  }

  function select(ids: readonly string[]): void {
    selected.value = [...ids]
  }

  function zoomTo(ids: readonly string[]): void {
    viewRequest.value = { to: 'items', ids: [...ids] }
  }

  function showPage(): void {
    viewRequest.value = { to: 'page' }
  }

  function showPlace(at: XY, toPercent: number): void {
    viewRequest.value = { to: 'place', at, percent: toPercent }
  }

  function toggleSymbolSize(): void {
    symbolSize.value = symbolSize.value === 'print' ? 'screen' : 'print'
  }

  function toggleHidden(entry: string): void {
    const next = new Set(hiddenEntries.value)
    if (!next.delete(entry)) next.add(entry)
    hiddenEntries.value = next
  }

  /** Back to how the workplace opens, for another sheet. */
  function reset(): void {
    choose('select')
    lastPen.value = null
    selected.value = []
    hovered.value = []
    hoveredEntry.value = mapRow.value = null
    hiddenEntries.value = new Set()
    thinned.value = new Map()
    viewRequest.value = null
    viewExtent.value = null
    cursor.value = null
    unitHere.value = null
    hint.value = ''
  }

  return {
    tool,
    drawWith,
    lastPen,
    selected,
    hovered,
    hoveredEntry,
    mapRow,
    rowInMargin,
    hiddenEntries,
    snapping,
    symbolSize,
    thinned,
    pendingReadingPlace,
    cursor,
    unitHere,
    percent,
    viewRests,
    viewExtent,
    viewRequest,
    hint,
    choose,
    draw,
    drawAgain,
    hoverOnMap,
    select,
    zoomTo,
    showPage,
    showPlace,
    toggleSymbolSize,
    toggleHidden,
    reset,
  }
})

function isSamePen(a: DrawWith, b: DrawWith | null): boolean {
  if (!b) return false
  if (isUnitPen(a)) return isUnitPen(b) && a.unit === b.unit
  return !isUnitPen(b) && a.id === b.id
}
