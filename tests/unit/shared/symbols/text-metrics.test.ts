import { createRequire } from 'node:module'
import { openSync } from 'fontkit'
import { describe, expect, it } from 'vitest'
import { latoCodePoints } from '@shared/symbols/lato-widths'
import { capHeight, measureText } from '@shared/symbols/text-metrics'

const require = createRequire(import.meta.url)
const files = {
  400: '400Regular/Lato_400Regular.ttf',
  700: '700Bold/Lato_700Bold.ttf',
  900: '900Black/Lato_900Black.ttf',
} as const

describe.each([400, 700, 900] as const)('widths of Lato %d', (weight) => {
  const font = openSync(require.resolve(`@expo-google-fonts/lato/${files[weight]}`))

  it('are those that fontkit reads from the font that is printed', () => {
    for (const code of latoCodePoints) {
      const width = font.glyphForCodePoint(code).advanceWidth / font.unitsPerEm
      expect(measureText(String.fromCodePoint(code), 1, weight)).toBeCloseTo(width, 12)
    }
    expect(capHeight(1, weight)).toBeCloseTo(font.capHeight / font.unitsPerEm, 12)
  })

  it('cover every character that the font has', () => {
    const printable = font.characterSet.filter((code) => code >= 0x20 && code !== 0xffff)
    expect(printable.filter((code) => !latoCodePoints.includes(code))).toEqual([])
  })
})

describe('the width of a text', () => {
  it('adds its letters and follows the size', () => {
    expect(measureText('35', 2, 700)).toBeCloseTo(2 * 2 * 0.58, 12)
    expect(measureText('', 2, 700)).toBe(0)
    expect(measureText('Sv', 6, 400)).toBeCloseTo(2 * measureText('Sv', 3, 400), 12)
  })

  it('takes a figure’s width for a character that Lato lacks, one for each', () => {
    expect(measureText('\u{1f30b}', 1, 400)).toBeCloseTo(0.58, 12)
  })
})
