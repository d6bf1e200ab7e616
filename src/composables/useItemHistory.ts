import { onScopeDispose, ref, shallowRef, watch, type Ref } from 'vue'
import type { z } from 'zod'
import { getItemHistory, type itemVersionSchema } from '@shared/api/ledger'
import type { Problem } from '@shared/api/problems'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'

export type ItemVersion = z.infer<typeof itemVersionSchema>

/** Selecting one thing after another should not ask about each. */
const SETTLE_MS = 200

/** Every version of an item, newest first, asked for anew once the item has changed. Waits while changes are unsent: an item just
 *  drawn is not on the server before. Empty until the answer is there. */
export function useItemHistory(id: () => string): {
  versions: Readonly<Ref<readonly ItemVersion[]>>
  problem: Readonly<Ref<Problem | null>>
} {
  const sheet = useSheetStore()
  const versions = shallowRef<readonly ItemVersion[]>([])
  const problem = ref<Problem | null>(null)
  let timer: ReturnType<typeof setTimeout> | undefined
  let asked = ''

  async function ask(number: string, item: string): Promise<void> {
    asked = item
    try {
      const answer = await call(getItemHistory, { params: { sheet: number, item } })
      if (asked === item) versions.value = answer
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      if (asked === item) problem.value = error.problem
    }
  }

  watch(
    [id, () => sheet.saved.waiting === 0, () => (void sheet.itemsVersion, sheet.get(id()))],
    ([item, isSaved, version], before) => {
      clearTimeout(timer)
      if (item !== before[0]) {
        versions.value = []
        problem.value = null
        asked = ''
      } else if (version !== before[2]) asked = ''
      const number = sheet.sheet?.number
      if (isSaved && number && asked !== item) timer = setTimeout(() => void ask(number, item), SETTLE_MS)
    },
    { immediate: true },
  )
  onScopeDispose(() => {
    clearTimeout(timer)
    asked = ''
  })

  return { versions, problem }
}
