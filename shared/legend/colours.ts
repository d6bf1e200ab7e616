import { luminance, mixColours } from '../colour'
import { inkColour } from '../symbols/ink'

const LABEL_INK = inkColour('black')
const PAPER = inkColour('paper')

/** Least contrast of small text on its ground. Source: WCAG 2.2, 1.4.3. */
export const READABLE_CONTRAST = 4.5

/** How strongly a chart colour is mixed into paper so that linework reads on it. */
const FILL_STRENGTH = 0.5

/** Contrast of two #rrggbb colours, 1–21. Source: WCAG 2.2, definition of contrast ratio. */
export function contrast(a: string, b: string): number {
  const first = luminance(a)
  const second = luminance(b)
  return (Math.max(first, second) + 0.05) / (Math.min(first, second) + 0.05)
}

/** Whether a unit's label reads on its own fill. */
export const labelReadsOn = (colour: string): boolean => contrast(LABEL_INK, colour) >= READABLE_CONTRAST

/** A chart colour made light enough for a map fill: mixed with paper. */
export const mutedColour = (hex: string): `#${string}` => mixColours(hex, PAPER, FILL_STRENGTH)
