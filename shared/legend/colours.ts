import { inkColour } from '../symbols/ink'

const LABEL_INK = inkColour('black')
const PAPER = inkColour('paper')

/** Least contrast of small text on its ground. Source: WCAG 2.2, 1.4.3. */
export const READABLE_CONTRAST = 4.5

/** How strongly a chart colour is mixed into paper so that linework reads on it. */
const FILL_STRENGTH = 0.5

type Channels = readonly [red: number, green: number, blue: number]

/** Red, green and blue of #rrggbb, 0–255. */
function channels(hex: string): Channels {
  const value = Number.parseInt(hex.slice(1), 16)
  return [(value >> 16) & 255, (value >> 8) & 255, value & 255]
}

/** Light of one channel, 0–1. Source: WCAG 2.2, definition of relative luminance. */
function linear(channel: number): number {
  const share = channel / 255
  return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4
}

/** Relative luminance, 0–1. Source: as above. */
function luminance(hex: string): number {
  const [red, green, blue] = channels(hex)
  return 0.2126 * linear(red) + 0.7152 * linear(green) + 0.0722 * linear(blue)
}

/** Contrast of two #rrggbb colours, 1–21. Source: WCAG 2.2, definition of contrast ratio. */
export function contrast(a: string, b: string): number {
  const first = luminance(a)
  const second = luminance(b)
  return (Math.max(first, second) + 0.05) / (Math.min(first, second) + 0.05)
}

/** Whether a unit's label reads on its own fill. */
export const labelReadsOn = (colour: string): boolean => contrast(LABEL_INK, colour) >= READABLE_CONTRAST

/** A chart colour made light enough for a map fill: mixed with paper. */
export function mutedColour(hex: string): `#${string}` {
  const paper = channels(PAPER)
  const mixed = channels(hex).map((channel, index) =>
    Math.round(channel * FILL_STRENGTH + (paper[index] ?? 255) * (1 - FILL_STRENGTH))
      .toString(16)
      .padStart(2, '0'),
  )
  return `#${mixed.join('')}`
}
