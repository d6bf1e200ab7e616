import { defineStore } from 'pinia'
import { computed, ref, watchEffect } from 'vue'
import { applyPalette } from '@/theme/css-variables'
import type { ThemeName } from '@/theme/tokens'

const KEPT = 'sheetwright-theme'

/** Light or dark: what the system says, until a person chooses otherwise in this browser. */
export const useThemeStore = defineStore('theme', () => {
  const system = window.matchMedia('(prefers-color-scheme: dark)')
  const systemIsDark = ref(system.matches)
  const chosen = ref(keptChoice())
  const theme = computed<ThemeName>(() => chosen.value ?? (systemIsDark.value ? 'dark' : 'light'))

  system.addEventListener('change', (event) => {
    systemIsDark.value = event.matches
  })
  watchEffect(() => applyPalette(document.documentElement, theme.value))

  function choose(name: ThemeName): void {
    chosen.value = name
    localStorage.setItem(KEPT, name)
  }

  return { theme, chosen, choose }
})

function keptChoice(): ThemeName | undefined {
  const kept = localStorage.getItem(KEPT)
  return kept === 'light' || kept === 'dark' ? kept : undefined
}
