import { computed, reactive, ref, watch } from 'vue'
import type { ItemOf } from '@shared/items/item'
import type { AttitudeProperties } from '@shared/items/points'
import type { XY } from '@shared/units'
import { useItemEdits } from '@/composables/useItemEdits'
import { newId } from '@/offline/new-id'
import { isSame } from '@/stores/same-item'
import { useSheetStore } from '@/stores/sheet'
import { useUnfinishedStore } from '@/stores/unfinished'
import { draftOf, readDraft, type AttitudeDraft } from './attitude-draft'
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

const startingProperties = ({ type, undulating, topsKnown, station }: StartingAttitude) => ({
  type,
  undulating,
  topsKnown,
  station,
  note: '',
})

/** The draft of a reading, what it says, and how it becomes an attitude on the sheet. */
export function useAttitudeEntry(source: () => AttitudeSource) {
  const sheet = useSheetStore()
  const unfinished = useUnfinishedStore()
  const { change, add } = useItemEdits()
  const { context, convention } = useWords()

  const key = (): string => `${source().item?.id ?? 'new'}/reading`
  const draft = reactive<AttitudeDraft>(startingDraft())
  /** The draft as the sheet has it: what differs from it is still to be taken. */
  const settled = ref<AttitudeDraft>({ ...startingDraft() })
  const refusal = ref('')
  const kept = source().item ? unfinished.take(key()) : undefined
  if (kept !== undefined) draft.text = kept

  function startingDraft(): AttitudeDraft {
    const { item, start } = source()
    if (item) return draftOf(item.properties, convention())
    const { northReference, declination } = unfinished
    return { text: start.text, overturned: start.overturned, northReference, declination }
  }

  // Undo, or another person, may change the attitude under the form.
  watch(
    () => source().item?.properties,
    (now, before) => {
      if (!now || isSame(now, before) || hasChanges.value) return
      Object.assign(draft, startingDraft())
      settled.value = { ...draft }
    },
  )

  const outcome = computed(() => readDraft(draft, convention(), context.convergenceAt(source().place)))
  const hasChanges = computed(() => !isSame({ ...draft }, settled.value))

  /** Takes the reading onto the sheet; false where it says no plane or the sheet refuses it. */
  function take(): boolean {
    const read = outcome.value
    if (read.outcome === 'refused') return false
    const { item, place, start } = source()
    const values = { ...read.plane, reading: read.reading }
    const refused = item
      ? change(item, values)
      : add({
          id: newId(),
          kind: 'attitude',
          geometry: { type: 'Point', coordinates: place },
          properties: { ...startingProperties(start), ...values },
        })
    refusal.value = Object.values(refused ?? {})[0] ?? ''
    if (refused) return false
    unfinished.northReference = draft.northReference
    unfinished.declination = draft.declination
    settled.value = { ...draft }
    return true
  }

  /** Takes what was changed and reads; keeps what does not, so that coming back finds it. */
  function leave(): void {
    if (!source().item || !hasChanges.value || !sheet.mayEdit) return
    if (!take()) unfinished.keep(key(), draft.text)
  }

  return { draft, outcome, hasChanges, refusal, convention, take, leave }
}
