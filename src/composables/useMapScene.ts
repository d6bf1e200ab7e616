import { watch } from 'vue'
import { isLineItem, isPointItem, type Item, type LineItem, type PointItem } from '@shared/items/item'
import type { SheetMap } from '@/map/sheet-map'
import { useComparedStore } from '@/stores/compared'
import { usePresenceStore } from '@/stores/presence'
import { useSheetStore } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'
import { legendRowOf } from './useLegend'

/** Keeps the map showing what the stores hold: items, unit areas, what is hidden, selected, hovered or asked for. */
export function useMapScene(map: SheetMap): void {
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()
  const compared = useComparedStore()
  const presence = usePresenceStore()

  const placed = (ids: readonly string[]): (LineItem | PointItem)[] =>
    ids.flatMap((id) => {
      const item = sheet.get(id)
      return item && (isLineItem(item) || isPointItem(item)) ? [item] : []
    })

  /** Everything that a legend row explains on the map. */
  function ofRow(row: string | null): (LineItem | PointItem)[] {
    if (row === null) return []
    return sheet
      .all()
      .filter(
        (item): item is LineItem | PointItem =>
          (isLineItem(item) || isPointItem(item)) && legendRowOf(item) === row,
      )
  }

  watch(
    () => sheet.itemsVersion,
    () => map.setItems(sheet.all()),
    { immediate: true },
  )
  watch(
    () => sheet.faces,
    (faces) => map.setFaces(faces),
    { immediate: true },
  )
  watch(
    () => workplace.hiddenEntries,
    (hidden) =>
      map.setHidden(
        (item) => hidden.size > 0 && hidden.has(legendRowOf(item) ?? ''),
        (unit) => unit !== null && hidden.has(unit),
      ),
    { immediate: true },
  )
  watch(
    () => workplace.symbolSize,
    (size) => map.setSymbolSize(size),
    { immediate: true },
  )
  watch(
    [() => workplace.selected, () => sheet.itemsVersion],
    () => map.setMarks({ selected: placed(workplace.selected) }),
    { immediate: true },
  )
  watch(
    [
      () => workplace.viewRests,
      () => sheet.itemsVersion,
      () => workplace.symbolSize,
      () => workplace.hiddenEntries,
      () => workplace.selected,
    ],
    () => (workplace.thinned = countByRow(map.thinned())),
  )
  watch([() => workplace.hovered, () => workplace.rowInMargin, () => sheet.itemsVersion], () => {
    const row = workplace.rowInMargin
    map.setMarks({
      hovered: row === null ? placed(workplace.hovered) : ofRow(row),
      areas: row === null ? [] : sheet.faces.filter((face) => face.unit === row).map((face) => face.rings),
    })
  })
  watch(
    () => workplace.pendingReadingPlace,
    (place) => map.setMarks({ place }),
    { immediate: true },
  )
  watch(
    [() => presence.others, () => sheet.itemsVersion],
    () =>
      map.setMarks({
        others: presence.others.map(({ person, presence: { items } }) => ({
          items: placed(items),
          initials: person.initials,
        })),
      }),
    { immediate: true },
  )
  watch(
    () => compared.inked,
    (inked) =>
      map.setMarks({
        compared: inked.flatMap(({ item, ink }) =>
          isLineItem(item) || isPointItem(item) ? [{ item, ink }] : [],
        ),
      }),
    { immediate: true },
  )
  watch(
    () => workplace.viewRequest,
    (request) => {
      if (request?.to === 'items') map.showItems(placed(request.ids))
      else if (request?.to === 'place') map.showPlace(request.at, request.percent)
      else if (request?.to === 'ground') map.showGround(request.box)
      else if (request?.to === 'page') map.showPage()
    },
  )
}

function countByRow(items: readonly Item[]): ReadonlyMap<string, number> {
  const counts = new Map<string, number>()
  for (const item of items) {
    const row = legendRowOf(item)
    if (row !== undefined) counts.set(row, (counts.get(row) ?? 0) + 1)
  }
  return counts
}
