import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import { previewIntake, type Intake, type IntakePreview } from '@shared/api/intake'
import type { Problem } from '@shared/api/problems'
import { call } from '@/api/client'
import type { IntakeDraft } from '@/stores/intake'
import { useSheetStore } from '@/stores/sheet'
import { problemOf } from './useIntakes'

/** A person changes several fields in a row; the server is asked when the hand rests. */
const REST_MS = 350

/** What the mapping as it now stands would take in, kept up to date. */
export function useIntakePreview(of: () => { intake: Intake; draft: IntakeDraft } | null) {
  const sheet = useSheetStore()
  const preview = shallowRef<IntakePreview | null>(null)
  const problem = shallowRef<Problem | null>(null)
  /** Whether the preview belongs to the mapping as it is. */
  const isCurrent = ref(false)
  let turn = 0
  let timer: ReturnType<typeof setTimeout> | undefined

  async function ask(): Promise<void> {
    const subject = of()
    const number = sheet.sheet?.number
    if (!subject || number === undefined) return
    const mine = ++turn
    try {
      const { mapping } = subject.draft
      const answer = await call(previewIntake, {
        params: { sheet: number, intake: subject.intake.id },
        body: { mapping },
      })
      if (mine !== turn) return
      preview.value = answer
      isCurrent.value = true
    } catch (error) {
      const found = problemOf(error)
      if (mine === turn) problem.value = found
    }
  }

  function later(delayMs: number): void {
    turn += 1
    clearTimeout(timer)
    isCurrent.value = false
    problem.value = null
    timer = setTimeout(() => void ask(), delayMs)
  }

  watch(
    () => of()?.intake.id,
    () => {
      preview.value = null
      later(0)
    },
    { immediate: true },
  )
  watch(
    () => JSON.stringify(of()?.draft.mapping),
    () => later(REST_MS),
  )
  onScopeDispose(() => {
    turn += 1
    clearTimeout(timer)
  })

  return { preview, problem, isCurrent, again: () => later(0) }
}
