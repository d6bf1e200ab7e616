import { computed, ref } from 'vue'
import type { ItemOf } from '@shared/items/item'
import type { LineationProperties } from '@shared/items/points'
import type { XY } from '@shared/units'
import { useItemEdits } from '@/composables/useItemEdits'
import { newId } from '@/offline/new-id'
import { useUnfinishedStore } from '@/stores/unfinished'
import { lineationDraftOf, readLineation, type LineationDraft } from './lineation-draft'
import { useReadingDraft } from './useReadingDraft'
import { useWords } from './useWords'

/** What a new lineation starts with; of one on the sheet, what line it is. */
export type StartingLineation = Pick<LineationProperties, 'type' | 'station'> &
  Pick<LineationDraft, 'text' | 'planeType'>

export interface LineationSource {
  /** The lineation to change; null for a new one. */
  item: ItemOf<'lineation'> | null
  place: XY
  start: StartingLineation
}

/** The draft of a lineation's reading, what it says, and how it becomes a lineation on the sheet. */
export function useLineationEntry(source: () => LineationSource) {
  const unfinished = useUnfinishedStore()
  const { change, add } = useItemEdits()
  const { context, convention } = useWords()

  const convergence = () => context.convergenceAt(source().place)
  const read = (draft: LineationDraft) => readLineation(draft, convention(), convergence())

  const entry = useReadingDraft<LineationDraft>({
    item: () => source().item,
    starting() {
      const { item, start } = source()
      if (item) return lineationDraftOf(item.properties, convention(), convergence())
      const { northReference, declination } = unfinished
      return { text: start.text, planeType: start.planeType, planeText: '', northReference, declination }
    },
    save(draft) {
      const said = read(draft)
      if (said.outcome === 'refused') return 'unread'
      const values = { ...said.line, plane: said.plane, reading: said.reading }
      const { item, place, start } = source()
      if (item) return change(item, values)
      const { type, station } = start
      return add({
        id: newId(),
        kind: 'lineation',
        geometry: { type: 'Point', coordinates: place },
        properties: { type, station, note: '', ...values },
      })
    },
  })
  const outcome = computed(() => read(entry.draft))

  return { ...entry, outcome, convention, wantsReason: ref(false) }
}
