import { onScopeDispose, watch } from 'vue'
import { legendEntries, legendEntryOf, type LegendEntry } from '@shared/symbols/legend-entries'
import type { XY } from '@shared/units'
import { Editor } from '@/editor/editor'
import type { EditorHost, Pen } from '@/editor/host'
import type { CursorShape, MapPort } from '@/editor/map-port'
import type { SheetMap } from '@/map/sheet-map'
import { newId } from '@/offline/new-id'
import { keepSketch, readKeptSketch } from '@/stores/kept-sketch'
import { useSessionStore } from '@/stores/session'
import { useSheetStore } from '@/stores/sheet'
import { isUnitPen, useWorkplaceStore } from '@/stores/workplace'

/** What browsers call the pointer's shapes. */
const cursors: Record<CursorShape, string> = {
  default: 'default',
  pointer: 'pointer',
  crosshair: 'crosshair',
  move: 'move',
  grabbing: 'grabbing',
}

/** The editor of the open sheet, between the map and the stores: gestures become edits through the one door. */
export function useSheetEditor(map: SheetMap) {
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()
  const session = useSessionStore()

  const neatline = (sheet.sheet?.neatline ?? []).map(([east, north]): XY => [east, north])
  const owner = { account: session.account?.id ?? '', sheet: sheet.sheet?.number ?? '' }
  const port: MapPort = {
    metresPerPx: () => map.metresPerPx(),
    linesNear: (at, radius) => [
      ...map.linesNear(at, radius).map((item) => ({ id: item.id, line: item.geometry.coordinates })),
      { id: null, line: neatline },
    ],
    pointsNear: (at, radius) =>
      map.pointsNear(at, radius).map((item) => ({ id: item.id, at: item.geometry.coordinates })),
    pick: (at) => map.pick(at).map((item) => item.id),
    show: (sketch) => map.setMarks({ sketch }),
    cursor: (shape) => map.setCursor(cursors[shape]),
  }

  const heldEntry = (): LegendEntry | null => {
    const held = workplace.drawWith
    return held && !isUnitPen(held) ? held : null
  }

  function pen(): Pen | null {
    const held = workplace.drawWith
    if (!held) return null
    if (!isUnitPen(held)) return { kind: held.kind, title: held.title, properties: { ...held.properties } }
    const unit = sheet.get(held.unit)
    if (unit?.kind !== 'unit') return null
    return {
      kind: 'unit-label',
      title: `Label of ${unit.properties.name}`,
      properties: { unit: unit.id },
    }
  }

  /** Row of the legend that explains what the pointer is on. */
  function entryOf(id: string | undefined): string | null {
    const item = id === undefined ? undefined : sheet.get(id)
    if (!item) return null
    return item.kind === 'unit-label' ? item.properties.unit : (legendEntryOf(item)?.id ?? null)
  }

  const host: EditorHost = {
    item: sheet.get,
    selected: () => workplace.selected,
    select: workplace.select,
    hover: (ids) => workplace.hoverOnMap(ids, entryOf(ids[0])),
    commit(draft) {
      const outcome = sheet.commit(draft.label, draft.edits)
      return outcome.outcome === 'done' ? null : outcome.errors.map((error) => error.detail).join(' ')
    },
    pen,
    keepSketch(line) {
      const entry = heldEntry()
      if (entry) keepSketch(owner, line.length > 0 ? { entry: entry.id, line: [...line] } : null)
    },
    keptSketch() {
      const kept = readKeptSketch(owner)
      return kept && kept.entry === heldEntry()?.id ? kept.line : []
    },
    askReading: (at) => (workplace.pendingReadingPlace = at),
    say: (sentence) => (workplace.hint = sentence),
    isSnapping: () => workplace.snapping,
    readOnly: () => sheet.readOnly,
    convergenceAt: (xy) => sheet.projection?.convergenceAt(xy) ?? 0,
    newId,
  }

  const editor = new Editor(port, host, (error) => {
    // The person is told by the hint; the cause goes to whoever watches for errors, as an uncaught one would.
    reportError(error)
    workplace.choose('select')
  })
  watch([() => workplace.tool, () => workplace.drawWith], () => editor.take(workplace.tool))
  takeUp()

  /** Goes on with the instrument that is held, or with the line that was left unfinished. */
  function takeUp(): void {
    const kept = sheet.readOnly === null ? readKeptSketch(owner) : null
    const entry = kept && legendEntries.find(({ id }) => id === kept.entry)
    if (entry && heldEntry()?.id !== entry.id) workplace.draw(entry)
    else if (workplace.tool !== 'select') editor.take(workplace.tool)
  }

  watch([() => sheet.itemsVersion, () => workplace.selected], () => editor.refresh())
  onScopeDispose(() => editor.close())
  return editor
}
