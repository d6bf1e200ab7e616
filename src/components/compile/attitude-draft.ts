import type { AttitudeConvention, AttitudeProperties, NorthReference, Reading } from '@shared/items/points'
import { parseAttitude } from '@shared/structure/attitude-text'
import { formatAttitude } from '@shared/structure/attitude-words'
import { toTrueAzimuth } from '@shared/structure/north-reference'
import type { Plane } from '@shared/structure/plane'
import type { Degrees } from '@shared/units'

/** A reading as it is being written. */
export interface AttitudeDraft {
  text: string
  overturned: boolean
  northReference: NorthReference
  /** As typed, degrees, east positive, or with E or W. */
  declination: string
}

/** What a draft says: a plane against true north with the reading kept beside it, or why it says none. */
export type DraftOutcome =
  | {
      outcome: 'plane'
      plane: Plane
      reading: Reading
      /** Degrees added to come to true north. */ turned: Degrees
    }
  | { outcome: 'refused'; field: 'text' | 'declination'; reason: string }

/** Reads a draft.
 *  @param convention how the sheet writes attitudes   @param convergence grid convergence at the place, degrees */
export function readDraft(
  draft: AttitudeDraft,
  convention: AttitudeConvention,
  convergence: Degrees,
): DraftOutcome {
  const parsed = parseAttitude(withFacing(draft), convention)
  if (parsed.outcome === 'refused') return { outcome: 'refused', field: 'text', reason: parsed.reason }
  const declination = draft.northReference === 'magnetic' ? parseDeclination(draft.declination) : 0
  if (declination === undefined) {
    const reason =
      'A magnetic reading needs the declination, degrees, east positive, for example −14.5 or 14.5 W.'
    return { outcome: 'refused', field: 'declination', reason }
  }
  const { strike, dip, overturned } = parsed
  const toTrue = (azimuth: Degrees) =>
    toTrueAzimuth(azimuth, draft.northReference, { declination, convergence })
  return {
    outcome: 'plane',
    plane: { strike: strike === null ? null : toTrue(strike), dip, overturned },
    turned: { true: 0, grid: convergence, magnetic: declination }[draft.northReference],
    reading: {
      text: withFacing(draft),
      convention: parsed.convention,
      northReference: draft.northReference,
      declination: draft.northReference === 'magnetic' ? declination : null,
    },
  }
}

const FACING = /[\s,(]*\b(overturned|overt|ot|o\/t)\b\.?\)?\s*$/i

/** Whether the text itself says that the bed is overturned. */
export const saysOverturned = (text: string): boolean => FACING.test(text)

/** The text without the word that says so. */
export const withoutFacing = (text: string): string => text.replace(FACING, '')

const withFacing = ({ text, overturned }: AttitudeDraft): string =>
  overturned && text.trim() !== '' && !saysOverturned(text) ? `${text.trim()} overturned` : text.trim()

/** A declination as typed: `-14.5`, `−14.5°`, `14.5 W`. Undefined for anything else and beyond 180. */
export function parseDeclination(text: string): Degrees | undefined {
  const match = /^([+\-−–])?\s*(\d{1,3}(?:[.,]\d+)?)\s*°?\s*([EW])?$/i.exec(text.trim())
  if (!match?.[2]) return undefined
  const size = Number(match[2].replace(',', '.'))
  if (size > 180) return undefined
  const west = match[3]?.toUpperCase() === 'W'
  const minus = match[1] !== undefined && match[1] !== '+'
  return west !== minus ? -size : size
}

/** A declination as people write it: `14.5 W`, `3 E`. */
const declinationWords = (degrees: Degrees): string =>
  degrees === 0 ? '0' : `${Math.abs(degrees)} ${degrees < 0 ? 'W' : 'E'}`

/** An attitude as a draft to go on with: its reading as it was written, where the sheet's convention reads it the same
 *  way; else the values written in the sheet's convention against true north. */
export function draftOf(properties: AttitudeProperties, convention: AttitudeConvention): AttitudeDraft {
  const { reading } = properties
  if (reading && (reading.convention === 'quadrant' || reading.convention === convention)) {
    return {
      text: reading.text,
      overturned: properties.overturned,
      northReference: reading.northReference,
      declination: reading.declination === null ? '' : declinationWords(reading.declination),
    }
  }
  return {
    text: formatAttitude(properties, convention),
    overturned: properties.overturned,
    northReference: 'true',
    declination: '',
  }
}

/** Azimuth and dip as separate fields, from a text that reads; empty where it does not. */
export function fieldsOf(text: string, convention: AttitudeConvention): { azimuth: string; dip: string } {
  const parsed = parseAttitude(text, convention)
  if (parsed.outcome === 'refused') return { azimuth: '', dip: '' }
  if (parsed.strike === null) return { azimuth: '', dip: '0' }
  const [azimuth = '', dip = ''] = formatAttitude({ ...parsed, overturned: false }, convention).split('/')
  return { azimuth, dip }
}

/** The text that two fields stand for. */
export const textOf = ({ azimuth, dip }: { azimuth: string; dip: string }): string =>
  azimuth.trim() === '' && (dip.trim() === '0' || dip.trim() === '')
    ? dip.trim()
    : `${azimuth.trim()}/${dip.trim()}`
