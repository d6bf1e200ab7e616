import { snapToGrid } from '@shared/geometry/grid'
import { gridDistance } from '@shared/geometry/bearings'
import type { Metres, XY } from '@shared/units'

/** Spaces of every kind, as people and our own foot write them inside a number. */
const spaces = /[\s\u2009\u00a0\u202f']/g

/** The ground of the sheet, sheet metres. */
export interface MapFace {
  min: XY
  max: XY
}

export type TypedPlace = { outcome: 'place'; at: XY } | { outcome: 'refused'; reason: string }

/** A place typed as easting and northing in sheet metres: `288430 5283107`, `288 430, 5 283 107`, `E 288430 N 5283107`.
 *  @param face where given, a place far outside it is refused
 *  @returns on the 1 mm grid, or why it cannot be taken, as a sentence */
export function parsePlace(text: string, face?: MapFace): TypedPlace {
  const numbers = pairOf(text.trim())
  if (!numbers) {
    return {
      outcome: 'refused',
      reason: 'Type easting and northing in metres, for example 288430 5283107, or with a comma between.',
    }
  }
  const at = snapToGrid(numbers)
  const reason = face && farAway(at, face)
  return reason === undefined ? { outcome: 'place', at } : { outcome: 'refused', reason }
}

/** How far beyond the map face a typed place may lie, as a share of the face's longer side: lines are drawn over the edge
 *  a little, not over the next sheet. */
const BEYOND = 0.1

/** Why a place is not on this sheet; undefined where it is, or nearly. */
function farAway(at: XY, { min, max }: MapFace): string | undefined {
  const away = awayFrom(at, { min, max })
  const most = BEYOND * Math.max(max[0] - min[0], max[1] - min[1])
  if (away <= most) return undefined
  const [east, north] = at
  if (awayFrom([north, east], { min, max }) <= most) {
    return `Easting and northing look exchanged: ${north} ${east} lies on the map face.`
  }
  return `This place lies ${distanceWords(away)} outside the map face. Eastings run from ${min[0]} to ${max[0]}, northings from ${min[1]} to ${max[1]}.`
}

function awayFrom([east, north]: XY, { min, max }: MapFace): Metres {
  const nearest: XY = [Math.min(Math.max(east, min[0]), max[0]), Math.min(Math.max(north, min[1]), max[1])]
  return gridDistance([east, north], nearest)
}

const distanceWords = (metres: Metres): string =>
  metres < 10_000 ? `${Math.round(metres)} m` : `${Math.round(metres / 1000)} km`

function pairOf(text: string): XY | undefined {
  const plain = text
    .replace(/(\d)\s*m\b/gi, '$1')
    .replace(/[EN]/gi, ' ')
    .trim()
  const halves = /[,;]/.test(plain)
    ? plain.split(/[,;]/)
    : plain.split(/ +/).length === 2
      ? plain.split(/ +/)
      : cutGroups(plain)
  const [east, north, ...more] = halves.map((half) => Number(half.replace(spaces, '')))
  if (east === undefined || north === undefined || more.length > 0) return undefined
  const written = halves.every((half) => half.trim() !== '')
  return written && Number.isFinite(east) && Number.isFinite(north) ? [east, north] : undefined
}

/** Cuts two numbers written in groups of three: a group of fewer than three figures, or the first, begins a number. */
function cutGroups(text: string): string[] {
  const groups = text.split(/\s+/)
  const second = groups.findIndex((group, index) => index > 0 && group.replace(/\..*$/, '').length < 3)
  return second > 0 ? [groups.slice(0, second).join(''), groups.slice(second).join('')] : [text]
}
