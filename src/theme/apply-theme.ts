import { FONT_FAMILY, onPaper, palettes, type, type ThemeName } from './tokens'

/** CSS custom properties of a theme, names without the two hyphens. */
export const cssVariables = (theme: ThemeName): Record<string, string> => ({
  ...palettes[theme],
  ...onPaper,
  font: FONT_FAMILY,
  capitals: `${type.capitals}px`,
  dense: `${type.dense}px`,
  body: `${type.body}px`,
})

/** Puts a theme on the page: its custom properties on the root element, and its name for rules and for the browser's own
 *  parts (scroll bars, lists of choices). Properties are set one by one, which a strict content policy allows. */
export function applyTheme(theme: ThemeName, root: HTMLElement = document.documentElement): void {
  root.dataset['theme'] = theme
  root.style.colorScheme = theme
  for (const [name, value] of Object.entries(cssVariables(theme))) root.style.setProperty(`--${name}`, value)
}
