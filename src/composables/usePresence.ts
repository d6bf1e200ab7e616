import { onScopeDispose, watch } from 'vue'
import { MOST_ITEMS_AT_HAND, tellPresence, type Presence } from '@shared/api/events'
import { call } from '@/api/client'
import { usePresenceStore } from '@/stores/presence'
import { useSheetStore } from '@/stores/sheet'
import { useWorkplaceStore } from '@/stores/workplace'

/** How often a page says that it is still there. */
const AGAIN_MS = 20_000
/** How long a page waits for more to tell. */
const COLLECT_MS = 600

/** Tells the others on the sheet what this page sees and has selected, and hears the same of them.
 *  @param extent what of the sheet is in view, sheet metres: west, south, east, north */
export function usePresence(extent: () => Presence['extent']): void {
  const sheet = useSheetStore()
  const workplace = useWorkplaceStore()
  const presence = usePresenceStore()
  let pending: ReturnType<typeof setTimeout> | undefined

  const tell = (seen: Presence['extent']): void => {
    const number = sheet.sheet?.number
    // Administrators may read any sheet without belonging to it; the server takes word of members only.
    if (number === undefined || sheet.roles.length === 0) return
    const body = { page: presence.page, extent: seen, items: workplace.selected.slice(0, MOST_ITEMS_AT_HAND) }
    // Without an answer nothing is lost: the next telling says it all again.
    call(tellPresence, { params: { sheet: number }, body }).catch(() => undefined)
  }
  const tellSoon = (): void => {
    pending ??= setTimeout(() => {
      pending = undefined
      tell(extent())
    }, COLLECT_MS)
  }

  watch([() => workplace.viewRests, () => workplace.selected], tellSoon, { immediate: true })
  watch(() => presence.newcomers, tellSoon)

  const timer = setInterval(() => {
    presence.forgetGone(Date.now())
    if (!document.hidden) tellSoon()
  }, AGAIN_MS)
  const leave = (): void => tell(null)
  window.addEventListener('pagehide', leave)
  onScopeDispose(() => {
    clearTimeout(pending)
    clearInterval(timer)
    window.removeEventListener('pagehide', leave)
    leave()
  })
}
