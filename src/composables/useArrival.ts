import { nextTick, ref } from 'vue'
import { useRouter } from 'vue-router'

/** On arriving at another page its name is announced and its main part takes the focus, as when a document is loaded. */
export function useArrival() {
  const announcement = ref('')
  const router = useRouter()
  let isFirst = true
  router.afterEach(async (to, from) => {
    if (!isFirst && to.name === from.name) return
    announcement.value = to.meta.title
    const wasFirst = isFirst
    isFirst = false
    if (wasFirst) return
    await nextTick()
    const main = document.querySelector('main')
    // A field that asks for the focus itself keeps it.
    if (!main || main.contains(document.activeElement)) return
    main.setAttribute('tabindex', '-1')
    main.focus({ preventScroll: true })
  })
  return { announcement }
}
