import { computed, reactive, ref, watch } from 'vue'
import type { Item } from '@shared/items/item'
import type { Refusal } from '@/composables/useItemEdits'
import { isSame } from '@shared/changes/same-value'
import { useSheetStore } from '@/stores/sheet'
import { useUnfinishedStore } from '@/stores/unfinished'
import type { NorthDraft } from './north-draft'

/** How the draft of a reading becomes an item on the sheet. */
export interface ReadingSource<D> {
  /** The item to change; null for a new one. */
  item: () => Item | null
  /** The draft as the sheet has it. */
  starting: () => D
  /** Puts what the draft says on the sheet; answers why the sheet refused it, or that it says nothing. */
  save: (draft: D) => Refusal | 'unread'
}

/** The draft of a reading: what of it is still to be taken, how it is taken, and how it is kept meanwhile. */
export function useReadingDraft<D extends NorthDraft & { text: string }>(source: ReadingSource<D>) {
  const { item, starting } = source
  const sheet = useSheetStore()
  const unfinished = useUnfinishedStore()

  const key = (): string => `${item()?.id ?? 'new'}/reading`
  // A draft is plain values only: there is nothing in it that Vue would unwrap.
  const draft = reactive(starting()) as D
  /** The draft as the sheet has it: what differs from it is still to be taken. */
  const settled = ref({ ...starting() })
  const refusal = ref('')
  const kept = item() ? unfinished.take(key()) : undefined
  // It was written below, from a draft of the same form.
  if (kept !== undefined) Object.assign(draft, JSON.parse(kept) as D)

  const hasChanges = computed(() => !isSame({ ...draft }, settled.value))

  // Undo, or another person, may change the item under the form.
  watch(
    () => item()?.properties,
    (now, before) => {
      if (!now || isSame(now, before) || hasChanges.value) return
      Object.assign(draft, starting())
      settled.value = { ...starting() }
    },
  )

  /** Takes the reading onto the sheet; false where it does not read or the sheet refuses it. */
  function take(): boolean {
    const refused = source.save(draft)
    if (refused === 'unread') return false
    refusal.value = Object.values(refused ?? {})[0] ?? ''
    if (refused) return false
    unfinished.northReference = draft.northReference
    unfinished.declination = draft.declination
    settled.value = { ...draft }
    return true
  }

  /** Takes what was changed and reads; keeps what does not, so that coming back finds it. */
  function leave(): void {
    if (!item() || !hasChanges.value || !sheet.mayEdit) return
    if (!take()) unfinished.keep(key(), JSON.stringify(draft))
  }

  return { draft, hasChanges, refusal, take, leave }
}
