/** Words that may stand in a reading and say nothing that its figures do not. */
const FILLERS = /(?<![A-Z])(STRIKE|STR|DIPPING|DIPS|DIP|TOWARDS?|TO THE|DEGREES?|DEG)(?![A-Z])\.?/g
const OVERTURNED = /(?<![A-Z])(OVERTURNED|OVERT|O\.?\/?T)\.?\s*\)?\s*$/

/** One spelling for the many of notebooks: capitals, plain hyphens, letters for compass words, figures for `vertical` and
 *  `horizontal`, no degree signs; and whether the bed is called overturned. */
export function normalizeAttitudeText(text: string): { body: string; overturned: boolean } {
  const plain = text
    .replace(/[°º˚]/g, ' ')
    .normalize('NFKC')
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .toUpperCase()
    .trim()
  const overturned = OVERTURNED.test(plain)
  const body = compassLettersFor(decimalPoints(plain.replace(OVERTURNED, '')))
    .replace(/(?<![A-Z])VERT(ICAL)?(?![A-Z])\.?/g, ' 90 ')
    .replace(/(?<![A-Z])(HORIZ(ONTAL)?|FLAT|LEVEL)(?![A-Z])\.?/g, ' 0 ')
    .replace(FILLERS, ' ')
    .replace(/\s+/g, ' ')
    .replace(/\s*[,;/(]\s*$/, '')
    .trim()
  return { body, overturned }
}

/** A comma between figures is a decimal comma where something else parts azimuth and dip: `045,5/40,5`. */
const decimalPoints = (text: string): string =>
  /[/;]/.test(text) ? text.replace(/(\d),(\d)/g, '$1.$2') : text

const opposite: Record<string, string> = { N: 'N-S', S: 'S-N', E: 'E-W', W: 'W-E' }

/** `NORTH-EAST` → `NE`, `DUE EAST` → `E-W`: a strike that is due somewhere runs both ways. */
function compassLettersFor(text: string): string {
  return text
    .replace(
      /(NORTH|SOUTH)[- ]?(EAST|WEST)/g,
      (_, first: string, second: string) => first.charAt(0) + second.charAt(0),
    )
    .replace(/NORTH|SOUTH|EAST|WEST/g, (word) => word.charAt(0))
    .replace(/(?<![A-Z])DUE\s+([NESW])(?!\s*-|[A-Z])/g, (_, letter: string) => opposite[letter] ?? letter)
    .replace(/(?<![A-Z])DUE\s+/g, '')
}
