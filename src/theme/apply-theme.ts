import { cssVariables, type ThemeName } from './tokens'

/** Puts a theme on the page: its custom properties on the root element, and its name for rules and for the browser's own
 *  parts (scroll bars, date pickers). Properties are set one by one, which a strict content policy allows. */
export function applyTheme(theme: ThemeName, root: HTMLElement = document.documentElement): void {
  root.dataset['theme'] = theme
  root.style.colorScheme = theme
  for (const [name, value] of Object.entries(cssVariables(theme))) root.style.setProperty(`--${name}`, value)
}
