import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, expect, it } from 'vitest'
import { usePresenceStore } from '@/stores/presence'

const tove = { id: '00000000-0000-4000-9000-000000000002', name: 'Tove Orr', initials: 'TO' }
const at = (page: string, extent: [number, number, number, number] | null = [0, 0, 10, 10]) => ({
  page: `00000000-0000-4000-8000-00000000000${page}`,
  extent,
  items: [],
})

beforeEach(() => setActivePinia(createPinia()))

it('knows each page once, where it was last, until it says that it leaves', () => {
  const presence = usePresenceStore()
  presence.hear(tove, at('1'), 0)
  presence.hear(tove, at('2'), 0)
  presence.hear(tove, at('1', [5, 5, 6, 6]), 1)
  expect(presence.others.map(({ presence: { extent } }) => extent)).toEqual([
    [0, 0, 10, 10],
    [5, 5, 6, 6],
  ])
  presence.hear(tove, at('1', null), 2)
  expect(presence.others.map(({ presence: { page } }) => page)).toEqual([at('2').page])
})

it('counts pages that it has not known: those are told of this one in turn', () => {
  const presence = usePresenceStore()
  presence.hear(tove, at('1'), 0)
  presence.hear(tove, at('1'), 20_000)
  presence.hear(tove, at('2', null), 20_000)
  expect(presence.newcomers).toBe(1)
})

it('does not meet itself', () => {
  const presence = usePresenceStore()
  presence.hear(tove, { ...at('1'), page: presence.page }, 0)
  expect([presence.others, presence.newcomers]).toEqual([[], 0])
})

it('lets go of a page that is silent for a minute', () => {
  const presence = usePresenceStore()
  presence.hear(tove, at('1'), 0)
  presence.hear(tove, at('2'), 30_000)
  presence.forgetGone(60_000)
  expect(presence.others.map(({ presence: { page } }) => page)).toEqual([at('2').page])
})
