import type { useSheetStore } from '@/stores/sheet'

/** Labels of the open sheet's legend units by their ids; undefined for a unit that is gone. */
export const unitLabels =
  (sheet: Pick<ReturnType<typeof useSheetStore>, 'get'>) =>
  (id: string): string | undefined => {
    const item = sheet.get(id)
    return item?.kind === 'unit' ? item.properties.label : undefined
  }
