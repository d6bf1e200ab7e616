import type { AttitudeConvention } from '../items/points'
import type { Degrees } from '../units'
import { azimuthFigure, compassWords } from './compass'
import { azimuthFor, dipDirectionOf, type Plane } from './plane'

/** A dip or plunge as maps print it: two digits, a tenth only where it has one. */
export function dipFigure(dip: Degrees): string {
  const tenths = Math.round(dip * 10) / 10
  return Number.isInteger(tenths) ? String(tenths).padStart(2, '0') : tenths.toFixed(1).padStart(4, '0')
}

/** A plane as the team writes it, `045/40` or `135/40`, with ` overturned` where it is; `horizontal` without a dip.
 *  `parseAttitude` reads it back. */
export function formatAttitude(plane: Plane, convention: AttitudeConvention): string {
  if (plane.strike === null || plane.dip === 0) return 'horizontal'
  const figures = `${azimuthFigure(azimuthFor(plane.strike, convention))}/${dipFigure(plane.dip)}`
  return plane.overturned ? `${figures} overturned` : figures
}

/** What else is seen of a plane. */
export interface PlaneTraits {
  undulating?: boolean
  topsKnown?: boolean
}

/** A plane in words: `Strikes 045°, dips 40° toward 135° (south-east), overturned, tops known`. */
export function describeAttitude(plane: Plane & PlaneTraits): string {
  const traits = `${plane.undulating ? ', undulating' : ''}${plane.topsKnown ? ', tops known' : ''}`
  if (plane.strike === null || plane.dip === 0) return `Horizontal${traits}`
  const strike = `Strikes ${azimuthFigure(plane.strike)}°`
  const overturned = `${plane.overturned ? ', overturned' : ''}${traits}`
  if (plane.dip === 90) return `${strike}, vertical${overturned}`
  const toward = dipDirectionOf(plane.strike)
  const dip = `dips ${bareFigure(plane.dip)}° toward ${azimuthFigure(toward)}° (${compassWords(toward)})`
  return `${strike}, ${dip}${overturned}`
}

const bareFigure = (value: Degrees): string => String(Math.round(value * 10) / 10)
