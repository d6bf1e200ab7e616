import { gridDistance } from '@shared/geometry/bearings'
import { nearestOnLine } from '@shared/geometry/nearest'
import { isLineItem, isPointItem, type Item } from '@shared/items/item'
import type { XY } from '@shared/units'
import type { ChangeDraft } from '@/editor/commands/change-draft'
import type { EditorHost, Pen } from '@/editor/host'
import type { PointerInput } from '@/editor/input'
import type { MapPort, Sketch } from '@/editor/map-port'
import { anId } from './sheet-items'

/** The pointer at a place. */
export const at = (east: number, north: number, keys: Partial<PointerInput> = {}): PointerInput => ({
  at: [east, north],
  alt: false,
  shift: false,
  ...keys,
})

export const key = (name: string) => ({ key: name, shift: false, alt: false })

/** A map and a workplace without either: items in a list, one metre to the pixel, and a note of all that was said and done. */
export function aWorkbench(items: readonly Item[] = [], pen: Pen | null = null) {
  const sheet = new Map(items.map((item) => [item.id, item]))
  const bench = {
    sheet,
    commits: [] as ChangeDraft[],
    sketches: [] as (Sketch | null)[],
    said: [] as string[],
    places: [] as XY[],
    selected: [] as readonly string[],
    pen,
    snapping: true,
    readOnly: null as string | null,
    refusal: null as string | null,
    kept: [] as readonly XY[],
    get sketch(): Sketch | null | undefined {
      return bench.sketches.at(-1)
    },
  }
  const map: MapPort = {
    metresPerPx: () => 1,
    linesNear: (place, radius) =>
      [...sheet.values()]
        .filter(isLineItem)
        .filter((item) => nearestOnLine(item.geometry.coordinates, place).distance <= radius)
        .map((item) => ({ id: item.id, line: item.geometry.coordinates })),
    pointsNear: (place, radius) =>
      [...sheet.values()]
        .filter(isPointItem)
        .filter((item) => gridDistance(item.geometry.coordinates, place) <= radius)
        .map((item) => ({ id: item.id, at: item.geometry.coordinates })),
    pick: (place) => [
      ...map.pointsNear(place, 8).map(({ id }) => id),
      ...map.linesNear(place, 7).flatMap(({ id }) => id ?? []),
    ],
    show: (sketch) => void bench.sketches.push(sketch),
    cursor: () => undefined,
  }
  const host: EditorHost = {
    item: (id) => sheet.get(id),
    selected: () => bench.selected,
    select: (ids) => void (bench.selected = ids),
    hover: () => undefined,
    commit(draft) {
      if (bench.refusal) return bench.refusal
      bench.commits.push(draft)
      for (const { before, after } of draft.edits) {
        if (after) sheet.set(after.id, after)
        else if (before) sheet.delete(before.id)
      }
      return null
    },
    pen: () => bench.pen,
    keepSketch: (line) => void (bench.kept = line),
    keptSketch: () => bench.kept,
    askReading: (place) => void bench.places.push(place),
    say: (sentence) => void bench.said.push(sentence),
    isSnapping: () => bench.snapping,
    readOnly: () => bench.readOnly,
    convergenceAt: () => -2,
    newId: anId,
  }
  return { bench, map, host }
}
