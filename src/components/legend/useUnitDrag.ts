import { ref } from 'vue'
import type { ItemOf } from '@shared/items/item'

type Unit = ItemOf<'unit'>

/** Moves units of the legend by dragging a row onto the upper or lower half of another. The keyboard has Alt and arrows.
 *  @param move puts a unit at a place of the list   @param sorted the units in their order */
export function useUnitDrag(move: (unit: Unit, place: number) => unknown, sorted: () => Unit[]) {
  const dragged = ref<Unit | null>(null)
  const over = ref<{ unit: string; half: 'top' | 'foot' } | null>(null)

  function end(): void {
    dragged.value = null
    over.value = null
  }

  function hover(event: DragEvent, unit: Unit): void {
    if (!dragged.value || !(event.currentTarget instanceof HTMLElement)) return
    event.preventDefault()
    const box = event.currentTarget.getBoundingClientRect()
    over.value = { unit: unit.id, half: event.clientY < box.top + box.height / 2 ? 'top' : 'foot' }
  }

  function drop(event: DragEvent, onto: Unit): void {
    event.preventDefault()
    const unit = dragged.value
    const half = over.value?.half ?? 'top'
    end()
    if (!unit || unit.id === onto.id) return
    const others = sorted().filter((each) => each.id !== unit.id)
    move(unit, others.findIndex((each) => each.id === onto.id) + (half === 'foot' ? 1 : 0))
  }

  const listenersOf = (unit: Unit) => ({
    dragstart: (event: DragEvent) => {
      dragged.value = unit
      event.dataTransfer?.setData('text/plain', unit.properties.label)
    },
    dragover: (event: DragEvent) => hover(event, unit),
    drop: (event: DragEvent) => drop(event, unit),
    dragend: end,
  })

  const classOf = (unit: Unit): string | undefined =>
    over.value?.unit === unit.id && dragged.value?.id !== unit.id ? `over-${over.value.half}` : undefined

  return { listenersOf, classOf }
}
