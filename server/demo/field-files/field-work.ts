import type { Degrees } from '@shared/units'
import { gannetHead, makeSheet, merrowTruth } from '../merrow-island'
import { seededRandom } from '../truth/random'
import type { Station } from '../truth/stations'
import { readAll, walkLevel, type Reading, type Walked } from './party'

/** Magnetic declination that the party with the unset compass had, degrees, east positive; invented for the island. */
export const fieldDeclination: Degrees = -8.5

/** What the parties measured, before it was written down. */
export interface FieldWork {
  ridge: Reading[]
  valley: Reading[]
  burn: Reading[]
  coast: Reading[]
  walk: Reading[]
  strikes: Reading[]
  dipDirections: Reading[]
  magnetic: Reading[]
  /** An ash band in the Eider Formation, and the boundary within the Razorbill Siltstone. */
  ashBand: Walked[]
  siltBoundary: Walked[]
}

const PER_PARTY = 16

/** What several people brought from sheet MI-14, none of it on the sheet yet; the same on every machine. */
export function doFieldWork(): FieldWork {
  const { survey } = makeSheet(gannetHead)
  const random = seededRandom(gannetHead.options.seed + 100)
  const party = (letters: string, passes?: (station: Station) => boolean): Reading[] =>
    readAll(
      merrowTruth,
      survey.places.take(PER_PARTY, { apart: 110, ...(passes ? { passes } : {}) }),
      letters,
      random,
    )
  return {
    ridge: party('RT'),
    valley: party('VT'),
    burn: party('SB', ({ at: [x] }) => x < 5000),
    coast: party('CM', ({ at: [, y] }) => y > 7500),
    walk: party('BW', ({ at: [x, y] }) => Math.abs(y - 0.4 * x - 3000) < 900).sort(
      (a, b) => a.at[0] - b.at[0],
    ),
    strikes: party('FG'),
    dipDirections: party('US'),
    magnetic: party('AV'),
    ashBand: walkLevel(survey.bounds, -830, 'ash band', random),
    siltBoundary: walkLevel(survey.bounds, -190, 'top of the banded silts', random),
  }
}
