import type { AttitudeConvention, AttitudeProperties, Reading } from '@shared/items/points'
import { parseAttitude } from '@shared/structure/attitude-text'
import { formatAttitude } from '@shared/structure/attitude-words'
import type { Plane } from '@shared/structure/plane'
import type { Degrees } from '@shared/units'
import { northOf, readNorth, type NorthDraft } from './north-draft'

/** A reading as it is being written, with what else is seen of the plane. */
export interface AttitudeDraft extends NorthDraft {
  text: string
  overturned: boolean
  undulating: boolean
  topsKnown: boolean
}

/** What a draft says: a plane against true north with the reading kept beside it, or why it says none. */
export type DraftOutcome =
  | {
      outcome: 'plane'
      plane: Plane
      reading: Reading
      /** Degrees added to come to true north. */
      turned: Degrees
    }
  | { outcome: 'refused'; field: 'text' | 'declination'; reason: string }

/** Reads a draft.
 *  @param convention how the sheet writes attitudes   @param convergence grid convergence at the place, degrees */
export function readDraft(
  draft: Omit<AttitudeDraft, 'undulating' | 'topsKnown'>,
  convention: AttitudeConvention,
  convergence: Degrees,
): DraftOutcome {
  const parsed = parseAttitude(withFacing(draft), convention)
  if (parsed.outcome === 'refused') return { outcome: 'refused', field: 'text', reason: parsed.reason }
  const north = readNorth(draft, convergence)
  if (north.outcome === 'refused') return north
  const { strike, dip, overturned } = parsed
  return {
    outcome: 'plane',
    plane: { strike: strike === null ? null : north.toTrue(strike), dip, overturned },
    turned: north.turned,
    reading: { text: withFacing(draft), convention: parsed.convention, ...north.stated },
  }
}

const FACING = /[\s,(]*\b(overturned|overt|ot|o\/t)\b\.?\)?\s*$/i

/** Whether the text itself says that the bed is overturned. */
export const saysOverturned = (text: string): boolean => FACING.test(text)

/** The text without the word that says so. */
export const withoutFacing = (text: string): string => text.replace(FACING, '')

const withFacing = ({ text, overturned }: Pick<AttitudeDraft, 'text' | 'overturned'>): string =>
  overturned && text.trim() !== '' && !saysOverturned(text) ? `${text.trim()} overturned` : text.trim()

/** An attitude as a draft to go on with: its reading as it was written, where the sheet's convention reads it the same
 *  way; else the values written in the sheet's convention against true north. */
export function draftOf(properties: AttitudeProperties, convention: AttitudeConvention): AttitudeDraft {
  const { reading, overturned, undulating, topsKnown } = properties
  const seen = { overturned, undulating, topsKnown }
  if (reading && (reading.convention === 'quadrant' || reading.convention === convention)) {
    return { text: reading.text, ...seen, ...northOf(reading) }
  }
  return { text: formatAttitude(properties, convention), ...seen, ...northOf(null) }
}

/** Azimuth and dip as separate fields, from a text that reads; empty where it does not. */
export function fieldsOf(text: string, convention: AttitudeConvention): [azimuth: string, dip: string] {
  const parsed = parseAttitude(text, convention)
  if (parsed.outcome === 'refused') return ['', '']
  if (parsed.strike === null) return ['', '0']
  const [azimuth = '', dip = ''] = formatAttitude({ ...parsed, overturned: false }, convention).split('/')
  return [azimuth, dip]
}

/** The text that two fields stand for. */
export const textOf = ([azimuth, dip]: readonly [azimuth: string, dip: string]): string =>
  azimuth.trim() === '' && (dip.trim() === '0' || dip.trim() === '')
    ? dip.trim()
    : `${azimuth.trim()}/${dip.trim()}`
