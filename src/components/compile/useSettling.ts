import { computed, type ComputedRef, type Ref } from 'vue'

interface TakenEntry {
  draft: { text: string }
  outcome: ComputedRef<{ outcome: string } | { outcome: 'refused'; field: string; reason: string }>
  hasChanges: ComputedRef<boolean>
  /** Whether a reason is shown: once a person has paused on the field, not while the first digits are typed. */
  wantsReason: Ref<boolean>
  take(): boolean
}

/** When the form of a reading takes it, and when it says why it cannot. */
export function useSettling({
  isNew,
  entry: { draft, outcome, hasChanges, wantsReason, take },
  taken,
}: {
  isNew: () => boolean
  entry: TakenEntry
  taken: () => void
}) {
  const reason = computed(() => (wantsReason.value && 'reason' in outcome.value ? outcome.value : null))

  /** On leaving a field: what is on the sheet takes what reads, a new reading waits for Enter. */
  function settle(): void {
    if (isNew()) wantsReason.value = draft.text !== ''
    else if (hasChanges.value && !take()) wantsReason.value = true
  }

  function enter(): void {
    wantsReason.value = true
    if (!isNew() && !hasChanges.value) return
    if (take()) taken()
  }

  return { reason, settle, enter }
}
