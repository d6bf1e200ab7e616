import { plainName } from '@shared/intake/choose-column'
import { unreadable, type Unreadable } from './read-outcome'

/** Names of a table's columns, each its own: empty ones by their place, repeated ones with a number. */
export function columnNames(header: readonly string[]): string[] {
  const seen = new Map<string, number>()
  return header.map((cell, index) => {
    const name = cell.trim() || `column ${index + 1}`
    const count = (seen.get(name) ?? 0) + 1
    seen.set(name, count)
    return count === 1 ? name : `${name} (${count})`
  })
}

const lonNames = [
  /^(lon|long|longitude|lng)$/,
  /^(lon|long|longitude)_?(wgs_?84|deg|degrees|dd|decimal)$/,
  /^x$/,
]
const latNames = [/^(lat|latitude)$/, /^(lat|latitude)_?(wgs_?84|deg|degrees|dd|decimal)$/, /^y$/]
const gridNames = /^(utm_?)?(easting|northing|east|north)s?(_m)?$/

/** Where longitude and latitude stand in a row. */
export function placeColumns(
  names: readonly string[],
): { outcome: 'columns'; lon: number; lat: number } | Unreadable {
  const plain = names.map(plainName)
  const at = (patterns: readonly RegExp[]) =>
    patterns.map((pattern) => plain.findIndex((name) => pattern.test(name))).find((index) => index >= 0)
  const [lon, lat] = [at(lonNames), at(latNames)]
  if (lon !== undefined && lat !== undefined) return { outcome: 'columns', lon, lat }
  const grid = names.filter((_, index) => gridNames.test(plain[index] ?? ''))
  const quoted = (list: readonly string[]) => list.map((name) => `“${name.slice(0, 40)}”`).join(', ')
  const found =
    grid.length > 1
      ? `Its columns ${quoted(grid)} are metres of a grid that the file does not name.`
      : `No columns of longitude and latitude are found among ${quoted(names.slice(0, 8))}.`
  return unreadable(`${found} Add columns named “longitude” and “latitude” (WGS 84).`)
}
