import type { Degrees } from '../units'

/** A figure as a person typed it, or why it cannot be read, as a sentence; empty fields are neither. */
export type TypedFigure =
  { outcome: 'figure'; value: number } | { outcome: 'empty' } | { outcome: 'refused'; reason: string }

const refused = (reason: string): TypedFigure => ({ outcome: 'refused', reason })
const figure = (value: number): TypedFigure => ({ outcome: 'figure', value })

/** Minus signs and spaces of every kind become plain ones. */
const plain = (text: string): string =>
  text
    .replace(/[−–]/g, '-')
    .replace(/[\s\u00a0\u2009\u202f]+/g, ' ')
    .trim()

/** Decimal degrees, or degrees, minutes and seconds, with a sign or the letter of the side:
 *  `-35.875`, `35.875 W`, `35°52'30"W`, `35 52 30 W`, `47°40′N`.
 *  @returns degrees, east and north positive, −180…180 or −90…90 */
export function parseDegrees(text: string, axis: 'longitude' | 'latitude'): TypedFigure {
  const written = plain(text).toUpperCase()
  if (written === '') return { outcome: 'empty' }
  const [positive, negative, limit] = axis === 'longitude' ? ['E', 'W', 180] : ['N', 'S', 90]
  const example = axis === 'longitude' ? '-35.875 or 35°52\'30" W' : '47.625 or 47°37\'30" N'
  const parts =
    /^(-?)(\d+(?:[.,]\d+)?) ?°? ?(?:(\d+(?:[.,]\d+)?) ?['′’]? ?)?(?:(\d+(?:[.,]\d+)?) ?(?:["″”]|'')? ?)?([NSEW]?)$/.exec(
      written,
    )
  if (!parts) return refused(`A ${axis} is written like ${example}.`)
  const [, sign, degree, minute, second, side] = parts
  if (side && side !== positive && side !== negative)
    return refused(`A ${axis} ends in ${positive} or ${negative}, not in ${side}.`)
  if (sign && side) return refused('Write either a minus sign or the letter of the side, not both.')
  const [minutes, seconds] = [toNumber(minute), toNumber(second)]
  if (minutes >= 60 || seconds >= 60) return refused('Minutes and seconds are less than 60.')
  const value: Degrees = toNumber(degree) + minutes / 60 + seconds / 3600
  if (value > limit) return refused(`A ${axis} is at most ${limit}°.`)
  return figure(sign || side === negative ? -value : value)
}

const toNumber = (text: string | undefined): number => Number((text ?? '0').replace(',', '.'))

/** Metres of a grid, with or without spaces between thousands: `284000`, `284 000.5`. */
export function parseMetres(text: string): TypedFigure {
  const written = plain(text)
  if (written === '') return { outcome: 'empty' }
  const digits = written.replace(/ ?m$/i, '').replace(/ /g, '').replace(',', '.')
  if (!/^-?\d+(\.\d+)?$/.test(digits))
    return refused('A grid coordinate is a number of metres, for example 284 000.')
  return figure(Number(digits))
}

/** The denominator of a scale: `24000`, `24 000`, `1:24 000`, `1 : 24,000`. */
export function parseScale(text: string): TypedFigure {
  const written = plain(text)
  if (written === '') return { outcome: 'empty' }
  const digits = written.replace(/^1 ?[:/] ?/, '').replace(/[ ,.'’](?=\d{3}(\D|$))/g, '')
  if (!/^\d+$/.test(digits)) return refused('A scale is written like 1:24 000, or as 24000.')
  const value = Number(digits)
  if (value < 500 || value > 10_000_000) return refused('A scale lies between 1:500 and 1:10 000 000.')
  return figure(value)
}

/** A side of the page: whole or decimal millimetres. */
export function parseMillimetres(text: string): TypedFigure {
  const written = plain(text).replace(/ ?mm$/i, '')
  if (written === '') return { outcome: 'empty' }
  const value = Number(written.replace(',', '.'))
  if (!Number.isFinite(value)) return refused('A side of the page is a number of millimetres.')
  if (value < 100 || value > 2000) return refused('A side of the page is between 100 and 2000 mm.')
  return figure(value)
}
