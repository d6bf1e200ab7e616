import type { XY } from '@shared/units'
import { useSheetStore, type CommitOutcome } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'
import type { InstrumentId } from './instruments'
import type { DeskParts } from './useDesk'

/** What the instruments do, from the rail or by key. */
export function useInstruments(desk: () => DeskParts | undefined) {
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()

  function tell(outcome: CommitOutcome, done: string): void {
    workplace.hint = outcome.outcome === 'done' ? done : outcome.errors.map((error) => error.detail).join(' ')
  }

  function turnBack(which: 'undo' | 'redo'): void {
    const label = which === 'undo' ? sheet.undoLabel : sheet.redoLabel
    tell(sheet[which](), which === 'undo' ? `Taken back: ${label}.` : `Done again: ${label}.`)
    workplace.select(workplace.selected.filter((id) => sheet.get(id)))
  }

  function act(id: InstrumentId): void {
    switch (id) {
      case 'select':
      case 'vertices':
      case 'measure':
        return workplace.choose(id)
      case 'draw':
        return workplace.drawAgain()
      case 'reverse':
        return desk()?.editor.reverseSelected()
      case 'remove':
        return desk()?.editor.removeSelected()
      case 'undo':
      case 'redo':
        return turnBack(id)
      case 'go':
        return workplace.zoomTo(workplace.selected)
      case 'page':
        return workplace.showPage()
      case 'snap':
        workplace.snapping = !workplace.snapping
        return
      case 'symbol-size':
        workplace.toggleSymbolSize()
    }
  }

  /** A typed place goes to the gesture, as a click there would; and into view. */
  function place(at: XY): void {
    const parts = desk()
    if (!parts) return
    if (!parts.editor.typed(at)) workplace.hint ||= 'This instrument takes no places.'
    parts.map.bringIntoView(at)
  }

  function toPrintSize(): void {
    const parts = desk()
    if (parts) workplace.showPlace(parts.map.place().at, 100)
  }

  return { act, place, toPrintSize }
}
