import { watch } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { XY } from '@shared/units'
import type { SheetMap } from '@/map/sheet-map'
import { useSheetStore } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'

/** `at` in the address: easting, northing and per cent of print size, for example 288430,5283107,120. */
function parseAt(text: unknown): { at: XY; percent: number } | undefined {
  if (typeof text !== 'string') return undefined
  const [east, north, percent] = text.split(',').map(Number)
  if (east === undefined || north === undefined || percent === undefined) return undefined
  const usable = [east, north, percent].every(Number.isFinite) && percent > 0
  return usable ? { at: [east, north], percent } : undefined
}

/** Keeps address and view together, so that a link shows another person the same item and place. */
export function useViewAddress() {
  const route = useRoute()
  const router = useRouter()
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()
  let map: SheetMap | undefined

  /** Shows what the address asks for, once the map is there. */
  function begin(with_: SheetMap): void {
    map = with_
    const { item, at } = route.query
    if (typeof item === 'string' && sheet.get(item)) workplace.select([item])
    const place = parseAt(at)
    if (place) map.showPlace(place.at, place.percent)
  }

  /** Writes the present view into the address, without a step in the browser's history. */
  function write(): void {
    if (!map || !route.path.endsWith('/compile')) return
    const [only, ...more] = workplace.selected
    const view = map.isPageShown() ? undefined : map.place()
    const query = {
      ...(only !== undefined && more.length === 0 ? { item: only } : {}),
      ...(view ? { at: [...view.at.map(Math.round), Number(view.percent.toPrecision(4))].join(',') } : {}),
    }
    if (query.item !== route.query['item'] || query.at !== route.query['at']) void router.replace({ query })
  }

  watch([() => workplace.selected, () => workplace.percent, () => workplace.viewRests], write)

  return { begin }
}
