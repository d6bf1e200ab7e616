import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import type { Person } from '@shared/api/common'
import type { Presence } from '@shared/api/events'
import { newId } from '@/offline/new-id'

/** An open page of somebody else on this sheet. */
export interface OtherPage {
  person: Person
  presence: Presence
  /** When it was last heard of, milliseconds since 1970. */
  heardAt: number
}

/** A page that has not been heard of for this long is gone: it tells itself three times as often. */
const GONE_AFTER_MS = 60_000

/** Who else is on the open sheet just now, and where they are at work. Nothing of it is stored anywhere. */
export const usePresenceStore = defineStore('presence', () => {
  /** By which the others know this page. */
  const page = newId()
  const others = shallowRef<readonly OtherPage[]>([])
  /** Counts pages that were heard for the first time: they do not know of this one either. */
  const newcomers = ref(0)

  /** Takes in what a page told of itself; its own word comes back to every page too. */
  function hear(person: Person, presence: Presence, now: number): void {
    if (presence.page === page) return
    const rest = others.value.filter((other) => other.presence.page !== presence.page)
    if (presence.extent === null) {
      others.value = rest
      return
    }
    if (rest.length === others.value.length) newcomers.value += 1
    others.value = [...rest, { person, presence, heardAt: now }]
  }

  /** Lets go of pages that were closed without a word. */
  function forgetGone(now: number): void {
    const here = others.value.filter((other) => now - other.heardAt < GONE_AFTER_MS)
    if (here.length < others.value.length) others.value = here
  }

  const clear = (): void => {
    others.value = []
  }

  return { page, others, newcomers, hear, forgetGone, clear }
})
