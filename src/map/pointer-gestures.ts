import PointerInteraction from 'ol/interaction/Pointer'
import type MapBrowserEvent from 'ol/MapBrowserEvent'
import type { XY } from '@shared/units'

/** The pointer on the map, in sheet metres. */
export interface MapPointer {
  at: XY
  alt: boolean
  shift: boolean
}

export interface GestureHandlers {
  move(pointer: MapPointer): void
  click(pointer: MapPointer): void
  doubleClick(pointer: MapPointer): void
  /** True takes the drag; false leaves it to panning. */
  press(pointer: MapPointer): boolean
  drag(pointer: MapPointer): void
  release(pointer: MapPointer): void
}

/** Passes pointer events on in sheet metres, before OpenLayers' own interactions see them. */
export class PointerGestures extends PointerInteraction {
  constructor(handlers: GestureHandlers) {
    super({
      handleDownEvent: (event) => isMainButton(event) && handlers.press(pointerOf(event)),
      handleDragEvent: (event) => handlers.drag(pointerOf(event)),
      handleUpEvent(event) {
        handlers.release(pointerOf(event))
        return false
      },
      handleMoveEvent: (event) => handlers.move(pointerOf(event)),
    })
  }
}

const isMainButton = ({ originalEvent }: MapBrowserEvent): boolean =>
  !(originalEvent instanceof PointerEvent) || originalEvent.button === 0

/** An OpenLayers event in our words. */
export function pointerOf(event: MapBrowserEvent): MapPointer {
  const [east = 0, north = 0] = event.coordinate
  const source = event.originalEvent
  const pressed = source instanceof MouseEvent ? source : undefined
  return { at: [east, north], alt: pressed?.altKey ?? false, shift: pressed?.shiftKey ?? false }
}
