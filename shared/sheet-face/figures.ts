import type { Degrees, LonLat, Metres } from '../units'

// Lato has no primes and no thin space: apostrophe, quotation mark and no-break space stand for them in print.
const NO_BREAK_SPACE = '\u00a0'

/** A whole number with thin spaces between thousands: 24 000. */
export function groupThousands(value: number): string {
  const digits = Math.abs(Math.round(value)).toString()
  return (value < 0 ? '−' : '') + digits.replace(/\B(?=(\d{3})+$)/g, NO_BREAK_SPACE)
}

/** A grid figure in kilometres: 286, or 286.5 where the interval is finer than a kilometre. */
export function kilometreFigure(metres: Metres): string {
  return (Math.round(metres * 1000) / 1_000_000).toString().replace('-', '−')
}

/** Degrees, minutes and seconds, to the nearest second; zero seconds are left out where `short` asks for it. */
function sexagesimal(value: Degrees, short: boolean): string {
  const seconds = Math.round(Math.abs(value) * 3600)
  const [degree, minute, second] = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60]
  const two = (part: number): string => part.toString().padStart(2, '0')
  return `${degree}°${two(minute)}'${short && second === 0 ? '' : `${two(second)}"`}`
}

/** 47°37'30" N */
export const latitudeFigure = (latitude: Degrees, short = false): string =>
  `${sexagesimal(latitude, short)}${NO_BREAK_SPACE}${latitude < 0 ? 'S' : 'N'}`

/** 35°52'30" W */
export const longitudeFigure = (longitude: Degrees, short = false): string =>
  `${sexagesimal(longitude, short)}${NO_BREAK_SPACE}${longitude < 0 ? 'W' : 'E'}`

/** Latitude and longitude of a corner, one line each. */
export const cornerFigures = ([longitude, latitude]: LonLat): [string, string] => [
  latitudeFigure(latitude),
  longitudeFigure(longitude),
]

/** An angle to the nearest minute with its side in words: 1°59' west; 0°00' where it is less than half a minute. */
export function angleInWords(value: Degrees): string {
  const minutes = Math.round(Math.abs(value) * 60)
  const text = `${Math.floor(minutes / 60)}°${(minutes % 60).toString().padStart(2, '0')}'`
  if (minutes === 0) return text
  return `${text} ${value < 0 ? 'west' : 'east'}`
}
