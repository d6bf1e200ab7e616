import { computed } from 'vue'
import { unitFills, type Printing, type UnitFill } from '@shared/symbols/unit-fill'
import { useSheetStore } from '@/stores/sheet'

/** How the open sheet is printed, and its units' areas are filled: for everything that shows a unit beside the map. */
export function useUnitFills() {
  const sheet = useSheetStore()

  const printing = computed<Printing>(
    () => (void sheet.itemsVersion, sheet.ofKind('sheet-face')[0]?.properties.printing ?? 'colour'),
  )
  const fills = computed(() => (void sheet.itemsVersion, unitFills(sheet.ofKind('unit'), printing.value)))
  const fillOf = (unit: string): UnitFill => fills.value.get(unit) ?? {}

  return { printing, fillOf }
}
