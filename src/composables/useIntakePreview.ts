import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import { previewIntake, type Intake, type IntakePreview } from '@shared/api/intake'
import type { Problem } from '@shared/api/problems'
import type { Mapping } from '@shared/intake/mapping'
import { call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'
import { problemOf } from './useIntakes'

/** A person changes several fields in a row; the server is asked when the hand rests. */
const REST_MS = 350

/** What a mapping makes of a file, kept up to date while the mapping is worked on. */
export function useIntakePreview(of: () => { intake: Intake; mapping: Mapping } | null) {
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
      const answer = await call(previewIntake, {
        params: { sheet: number, intake: subject.intake.id },
        body: { mapping: subject.mapping },
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
    () => JSON.stringify(of()?.mapping),
    () => later(REST_MS),
  )
  onScopeDispose(() => {
    turn += 1
    clearTimeout(timer)
  })

  return { preview, problem, isCurrent, again: () => later(0) }
}
