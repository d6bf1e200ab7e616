import { defineStore } from 'pinia'
import { computed, ref, watch } from 'vue'
import { applyTheme } from '@/theme/apply-theme'
import type { ThemeName } from '@/theme/tokens'

const KEY = 'sheetwright-theme'

/** Light or dark: as the system is, until a person chooses; the choice is kept in this browser. */
export const useAppearanceStore = defineStore('appearance', () => {
  const system = window.matchMedia('(prefers-color-scheme: dark)')
  const systemIsDark = ref(system.matches)
  system.addEventListener('change', (event) => (systemIsDark.value = event.matches))

  const chosen = ref<ThemeName | null>(readChoice())
  const theme = computed<ThemeName>(() => chosen.value ?? (systemIsDark.value ? 'dark' : 'light'))
  watch(theme, (name) => applyTheme(name), { immediate: true })

  /** Chooses a theme; null follows the system again. */
  function choose(name: ThemeName | null): void {
    chosen.value = name
    try {
      if (name) localStorage.setItem(KEY, name)
      else localStorage.removeItem(KEY)
    } catch {
      // A browser that keeps nothing still shows the choice until the page is closed.
    }
  }

  return { chosen, theme, choose }
})

function readChoice(): ThemeName | null {
  try {
    const kept = localStorage.getItem(KEY)
    return kept === 'light' || kept === 'dark' ? kept : null
  } catch {
    return null
  }
}
