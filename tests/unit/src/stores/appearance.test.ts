import { createPinia, setActivePinia } from 'pinia'
import { nextTick } from 'vue'
import { beforeEach, expect, it } from 'vitest'
import { useAppearanceStore } from '@/stores/appearance'

const root = document.documentElement

beforeEach(() => {
  localStorage.clear()
  setActivePinia(createPinia())
})

it('follows the system until a person chooses, and keeps the choice', async () => {
  const appearance = useAppearanceStore()
  expect(root.dataset['theme']).toBe('light')
  appearance.choose('dark')
  await nextTick()
  expect(root.dataset['theme']).toBe('dark')
  setActivePinia(createPinia())
  expect(useAppearanceStore().theme).toBe('dark')
  useAppearanceStore().choose(null)
  expect(localStorage.length).toBe(0)
})

it('turns the desk dark and leaves the paper paper', async () => {
  const appearance = useAppearanceStore()
  const value = (name: string) => root.style.getPropertyValue(name)
  const [desk, paper] = [value('--desk'), value('--paper')]
  appearance.choose('dark')
  await nextTick()
  expect(value('--desk')).not.toBe(desk)
  expect(value('--paper')).toBe(paper)
})

it('takes nothing but the two names from what the browser kept', () => {
  localStorage.setItem('sheetwright-theme', 'purple')
  expect(useAppearanceStore().chosen).toBeNull()
})
