import { computed, ref } from 'vue'
import { isSame } from '@shared/changes/same-value'
import type { ItemOf } from '@shared/items/item'
import type { AttitudeProperties } from '@shared/items/points'
import type { XY } from '@shared/units'
import { useItemEdits } from '@/composables/useItemEdits'
import { newId } from '@/offline/new-id'
import { useUnfinishedStore } from '@/stores/unfinished'
import { draftOf, readDraft, type AttitudeDraft } from './attitude-draft'
import { useReadingDraft } from './useReadingDraft'
import { useWords } from './useWords'

/** What a new attitude starts with; of one on the sheet, what plane it is. */
export type StartingAttitude = Pick<
  AttitudeProperties,
  'type' | 'overturned' | 'undulating' | 'topsKnown' | 'station'
> & { text: string }

export interface AttitudeSource {
  /** The attitude to change; null for a new one. */
  item: ItemOf<'attitude'> | null
  place: XY
  start: StartingAttitude
}

/** The draft of an attitude's reading, what it says, and how it becomes an attitude on the sheet. */
export function useAttitudeEntry(source: () => AttitudeSource) {
  const unfinished = useUnfinishedStore()
  const { change, add } = useItemEdits()
  const { context, convention } = useWords()

  const read = (draft: AttitudeDraft) => readDraft(draft, convention(), context.convergenceAt(source().place))

  const entry = useReadingDraft<AttitudeDraft>({
    item: () => source().item,
    starting() {
      const { item, start } = source()
      if (item) return draftOf(item.properties, convention())
      const { text, overturned, undulating, topsKnown } = start
      const { northReference, declination } = unfinished
      return { text, overturned, undulating, topsKnown, northReference, declination }
    },
    save(draft) {
      const said = read(draft)
      if (said.outcome === 'refused') return 'unread'
      const { undulating, topsKnown } = draft
      const { item, place, start } = source()
      // What is seen of the plane beside its reading leaves the reading as it is.
      const isReadAlike = item && isSame(read(draftOf(item.properties, convention())), said)
      if (isReadAlike) return change(item, { undulating, topsKnown })
      const values = { ...said.plane, undulating, topsKnown, reading: said.reading }
      if (item) return change(item, values)
      const { type, station } = start
      return add({
        id: newId(),
        kind: 'attitude',
        geometry: { type: 'Point', coordinates: place },
        properties: { type, station, note: '', ...values },
      })
    },
  })
  const outcome = computed(() => read(entry.draft))

  return { ...entry, outcome, convention, wantsReason: ref(false) }
}
