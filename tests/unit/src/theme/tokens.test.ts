import { describe, expect, it } from 'vitest'
import { onPaper, palettes, type Palette } from '@/theme/tokens'

/** Relative luminance of a #rrggbb colour. Source: WCAG 2.2, "relative luminance". */
function luminance(colour: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = parseInt(colour.slice(at, at + 2), 16) / 255
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

/** Contrast ratio. Source: WCAG 2.2, "contrast ratio". */
function contrast(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y)
  return (light + 0.05) / (dark + 0.05)
}

it('measures black on white as 21 : 1', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 6)
})

describe.each(['light', 'dark'] as const)('in the %s theme', (name) => {
  const palette = palettes[name]
  const texts: [keyof Palette, keyof Palette][] = [
    ['ink', 'slip'],
    ['ink', 'desk'],
    ['ink', 'hover'],
    ['ink', 'field'],
    ['quiet', 'slip'],
    ['quiet', 'field'],
    ['slate', 'slip'],
    ['oxide', 'slip'],
    ['on-oxide', 'oxide'],
    ['paper', 'moss'],
  ]

  it.each(texts)('%s is readable on %s (4.5 : 1)', (text, ground) => {
    expect(contrast(palette[text], palette[ground])).toBeGreaterThanOrEqual(4.5)
  })

  it.each(['slip', 'field'] as const)('the edge of an input shows on %s (3 : 1)', (ground) => {
    expect(contrast(palette['field-edge'], palette[ground])).toBeGreaterThanOrEqual(3)
  })
})

it.each(['ink', 'quiet', 'oxide', 'slate'] as const)('%s is readable on paper and on the wash', (ink) => {
  const colour = onPaper[`${ink}-on-paper`]
  expect(contrast(colour, palettes.light.paper)).toBeGreaterThanOrEqual(4.5)
  expect(contrast(colour, palettes.light.wash)).toBeGreaterThanOrEqual(4.5)
})
