/** A plain decimal number, perhaps with a decimal comma and a degree sign: `40`, `40.5`, `40,5`, `40°`. */
const plainNumber = /^([+-]?\d+(?:[.,]\d+)?|[+-]?[.,]\d+)\s*°?$/

/** The number that a text states, or undefined. Nothing is read into units, ranges or words. */
export function parseNumber(text: string): number | undefined {
  const match = plainNumber.exec(text.trim())
  return match?.[1] === undefined ? undefined : Number(match[1].replace(',', '.'))
}
