import { onBeforeUnmount, onMounted } from 'vue'
import type { Editor } from '@/editor/editor'
import type { SheetMap } from '@/map/sheet-map'
import { useSheetStore } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'
import { instruments, type InstrumentId } from './instruments'

/** Step of one arrow key, px. */
const PAN_PX = 80
const ZOOM_STEP = 1.25

const arrows: Record<string, [number, number]> = {
  ArrowLeft: [-PAN_PX, 0],
  ArrowRight: [PAN_PX, 0],
  ArrowUp: [0, -PAN_PX],
  ArrowDown: [0, PAN_PX],
}

/** Whether keys go to a field or control of their own. */
function isTakenBy(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false
  return target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName)
}

/** Keys of the workplace. Escape, Enter, Delete and the like go to the gesture first; a focused control keeps its own. */
export function useWorkplaceKeys(ports: {
  editor: () => Editor | undefined
  map: () => SheetMap | undefined
  act: (id: InstrumentId) => void
}): void {
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()

  function onKey(event: KeyboardEvent): void {
    if (event.defaultPrevented || isTakenBy(event.target)) return
    if (handle(event)) event.preventDefault()
  }

  function handle(event: KeyboardEvent): boolean {
    if (event.ctrlKey || event.metaKey) return handleUndo(event)
    const onControl =
      event.target instanceof HTMLElement && event.target.closest('button, a, [role=menu]') !== null
    // Enter and space press a focused button; they must not end a line besides.
    if (onControl && (event.key === 'Enter' || event.key === ' ')) return false
    const input = { key: event.key, shift: event.shiftKey, alt: event.altKey }
    if (ports.editor()?.key(input)) return true
    if (event.key === 'Escape' && workplace.tool !== 'select') {
      workplace.choose('select')
      return true
    }
    return handleView(event, onControl) || handleInstrument(event)
  }

  function handleUndo(event: KeyboardEvent): boolean {
    const key = event.key.toLowerCase()
    if (key !== 'z' && key !== 'y') return false
    if (key === 'y' || event.shiftKey) ports.act('redo')
    else if (!ports.editor()?.undoStep()) ports.act('undo')
    return true
  }

  function handleView(event: KeyboardEvent, onControl: boolean): boolean {
    const map = ports.map()
    const arrow = arrows[event.key]
    if (!map) return false
    // Inside the legend arrows move from row to row.
    if (arrow && !onControl) map.panBy(...arrow)
    else if (event.key === '+' || event.key === '=') map.zoomBy(ZOOM_STEP)
    else if (event.key === '-') map.zoomBy(1 / ZOOM_STEP)
    else return false
    return true
  }

  function handleInstrument(event: KeyboardEvent): boolean {
    if (event.altKey) return false
    const key = event.key.toUpperCase()
    const instrument = instruments.find((each) => each.key === key)
    if (!instrument || (!sheet.mayEdit && instrument.changes)) return false
    ports.act(instrument.id)
    return true
  }

  onMounted(() => window.addEventListener('keydown', onKey))
  onBeforeUnmount(() => window.removeEventListener('keydown', onKey))
}
