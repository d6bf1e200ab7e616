// Writes shared/symbols/lato-widths.ts: advance widths of the Lato fonts that the sheet is printed with.
// Run it after changing the version of @expo-google-fonts/lato:  node server/scripts/make-text-metrics.mjs
import { writeFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { fileURLToPath } from 'node:url'
import { openSync } from 'fontkit'

const require = createRequire(import.meta.url)
const weights = {
  400: '400Regular/Lato_400Regular.ttf',
  700: '700Bold/Lato_700Bold.ttf',
  900: '900Black/Lato_900Black.ttf',
}
const fonts = Object.entries(weights).map(([weight, file]) => [
  weight,
  openSync(require.resolve(`@expo-google-fonts/lato/${file}`)),
])
const [, regular] = fonts[0]
const characters = regular.characterSet.filter(
  (code) => code >= 0x20 && code !== 0xffff && fonts.every(([, font]) => font.hasGlyphForCodePoint(code)),
)
const table = fonts.map(([weight, font]) => {
  const widths = characters.map((code) => font.glyphForCodePoint(code).advanceWidth)
  return `  ${weight}: { capHeight: ${font.capHeight}, widths: [${widths.join(', ')}] },`
})

const text = `// Generated from the Lato fonts by server/scripts/make-text-metrics.mjs; not edited by hand.

/** Font units in one em. */
export const LATO_UNITS_PER_EM = ${regular.unitsPerEm}

/** Code points whose widths are listed, in the order of the lists. */
// prettier-ignore
export const latoCodePoints: readonly number[] = [${characters.join(', ')}]

/** Height of capitals and figures, and advance widths without kerning, in font units, by weight. */
// prettier-ignore
export const latoWeights: Record<400 | 700 | 900, { capHeight: number; widths: readonly number[] }> = {
${table.join('\n')}
}
`
writeFileSync(fileURLToPath(new URL('../../shared/symbols/lato-widths.ts', import.meta.url)), text)
