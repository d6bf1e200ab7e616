import { onScopeDispose, ref, type Ref } from 'vue'

/** The present moment, milliseconds since 1970, renewed every half minute while the component lives. */
export function useNow(): Ref<number> {
  const now = ref(Date.now())
  const timer = setInterval(() => (now.value = Date.now()), 30_000)
  onScopeDispose(() => clearInterval(timer))
  return now
}
