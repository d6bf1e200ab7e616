import { onPaper, palettes, type ThemeName } from './tokens'

/** Sets the palette's CSS variables on an element. Through the style object, so that the page needs no inline style text. */
export function applyPalette(element: HTMLElement, theme: ThemeName): void {
  for (const [name, value] of Object.entries({ ...palettes[theme], ...onPaper })) {
    element.style.setProperty(`--${name}`, value)
  }
  element.style.colorScheme = theme
  element.dataset['theme'] = theme
}
