import type { ItemOf } from '@shared/items/item'
import type { AttitudeConvention } from '@shared/items/points'
import { useSheetStore } from '@/stores/sheet'
import type { WordsContext } from './item-words'

/** What slips need to know of the open sheet to put its items into words and draw them. */
export function useWords() {
  const sheet = useSheetStore()

  const context: WordsContext = {
    unitOf(id) {
      const item = sheet.get(id)
      return item?.kind === 'unit' ? item.properties : undefined
    },
    convergenceAt: (xy) => sheet.projection?.convergenceAt(xy) ?? 0,
  }
  const sheetFace = (): ItemOf<'sheet-face'> | undefined => sheet.ofKind('sheet-face')[0]
  /** How this sheet's team writes attitudes. */
  const convention = (): AttitudeConvention => sheetFace()?.properties.attitudeConvention ?? 'strike-dip'

  return { context, convention }
}
