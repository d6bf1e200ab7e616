import { effectScope, watch, type Ref } from 'vue'
import type { XY } from '@shared/units'
import { useMapScene } from '@/composables/useMapScene'
import { usePresence } from '@/composables/usePresence'
import { useSheetEditor } from '@/composables/useSheetEditor'
import type { Editor } from '@/editor/editor'
import { SheetMap, type MapPointer, type PageBoxes, type ViewFrame } from '@/map/sheet-map'
import { fromPx } from '@/map/view-frame'
import { useSheetStore } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'

export interface DeskElements {
  target: HTMLElement
  paper: HTMLElement
  margin: HTMLElement
  where: Ref<'page' | 'docked'>
}

export interface DeskParts {
  map: SheetMap
  editor: Editor
  close(): void
}

/** Puts the open sheet on the desk: map, editor, and the page's paper and margin that follow every frame. */
export function useDesk() {
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()

  function open(elements: DeskElements): DeskParts {
    if (!sheet.sheet || !sheet.projection) throw new TypeError('The desk needs an open sheet.')
    let editor: Editor | undefined
    let seen: ViewFrame | undefined
    const map = new SheetMap({
      target: elements.target,
      sheet: sheet.sheet,
      projection: sheet.projection,
      handlers: {
        move(pointer) {
          follow(map, pointer.at)
          editor?.move(pointer)
        },
        click: (pointer: MapPointer) => editor?.click(pointer),
        doubleClick: (pointer: MapPointer) => editor?.doubleClick(pointer),
        press: (pointer: MapPointer) => editor?.press(pointer) ?? false,
        drag(pointer) {
          follow(map, pointer.at)
          editor?.drag(pointer)
        },
        release: (pointer: MapPointer) => editor?.release(pointer),
        leave,
        frame(view, boxes) {
          seen = view
          lay(elements, boxes)
        },
        rest(view) {
          workplace.viewExtent = extentOf(view)
          workplace.percent = map.percent()
          workplace.viewRests += 1
        },
      },
    })
    const scope = effectScope()
    scope.run(() => {
      useMapScene(map)
      editor = useSheetEditor(map)
      usePresence(() => (seen ? extentOf(seen) : null))
      watch(
        () => sheet.sheet?.number,
        () => map.showPage(false),
      )
    })
    if (!editor) throw new TypeError('The editor could not be set up.')
    map.showPage(false)
    return {
      map,
      editor,
      close() {
        scope.stop()
        map.close()
      },
    }
  }

  function follow(map: SheetMap, at: XY): void {
    workplace.cursor = at
    const unit = map.isOnFace(at) ? map.unitAt(at) : null
    workplace.unitHere = unit
    // With no item under the pointer, the row of the area's unit is lit.
    if (workplace.hovered.length === 0) workplace.hoverOnMap([], unit)
  }

  function leave(): void {
    workplace.cursor = null
    workplace.unitHere = null
    workplace.hoverOnMap([], null)
  }

  return { open }
}

/** What of the sheet is in view, sheet metres: west, south, east, north. */
function extentOf(view: ViewFrame): [number, number, number, number] {
  const [west, south] = fromPx(view, [0, view.height])
  const [east, north] = fromPx(view, [view.width, 0])
  return [west, south, east, north]
}

/** Styles are set directly: this runs in every frame of a pan, and must stay with the canvas to the pixel. */
function lay({ paper, margin, where }: DeskElements, boxes: PageBoxes): void {
  paper.style.transform = `translate(${boxes.paper.left}px, ${boxes.paper.top}px)`
  paper.style.width = `${boxes.paper.width}px`
  paper.style.height = `${boxes.paper.height}px`
  margin.style.transform = `translate(${Math.round(boxes.margin.left)}px, ${Math.round(boxes.margin.top)}px)`
  margin.style.width = `${boxes.margin.width}px`
  margin.style.height = `${Math.round(boxes.margin.height)}px`
  if (where.value !== boxes.margin.where) where.value = boxes.margin.where
}
