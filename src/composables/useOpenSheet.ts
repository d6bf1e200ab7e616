import { ref, watch } from 'vue'
import { onBeforeRouteLeave, useRoute } from 'vue-router'
import type { Problem } from '@shared/api/problems'
import { ApiProblem } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'

/** Opens the sheet that the address names, and keeps it open while one goes from place to place within it. */
export function useOpenSheet() {
  const route = useRoute()
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()
  const problem = ref<Problem | null>(null)
  /** A sentence where there was no answer at all. */
  const unreachable = ref(false)

  const numberIn = (param: unknown): string => (typeof param === 'string' ? param : '')

  async function openSheet(number: string): Promise<void> {
    if (number === '' || sheet.sheet?.number === number) return
    problem.value = null
    unreachable.value = false
    workplace.reset()
    try {
      await sheet.open(number)
    } catch (error) {
      if (error instanceof ApiProblem) problem.value = error.problem
      else unreachable.value = true
    }
  }

  watch(
    () => numberIn(route.params['sheet']),
    (number) => void openSheet(number),
    { immediate: true },
  )

  onBeforeRouteLeave((to) => {
    if (to.params['sheet'] !== sheet.sheet?.number) sheet.close()
  })

  return { problem, unreachable, retry: () => openSheet(numberIn(route.params['sheet'])) }
}
