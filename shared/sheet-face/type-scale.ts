import type { TextStyle } from './text-block'
import type { Millimetres } from '../units'

/** The printed page's type, all from one factor: 1 is 8-point names and 7-point descriptions. */
export interface TypeScale {
  factor: number
  subtitle: TextStyle
  section: TextStyle
  age: TextStyle
  name: TextStyle
  text: TextStyle
  small: TextStyle
  swatch: { width: Millimetres; height: Millimetres }
}

/** A unit's sample at factor 1. */
export const SWATCH = { width: 12, height: 7 } as const

/** @param factor 0.8 (smallest readable: 5.9-point descriptions) to 1.65   @param leading distance of base lines in ems */
export function typeScale(factor: number, leading: number): TypeScale {
  const style = (size: Millimetres, weight: TextStyle['weight'], ink: TextStyle['ink']): TextStyle => ({
    size: size * factor,
    weight,
    ink,
    leading,
  })
  return {
    factor,
    subtitle: style(3.1, 400, 'quiet'),
    section: { ...style(2.7, 900, 'black'), tracking: 0.34 * factor },
    age: { ...style(2.2, 700, 'quiet'), tracking: 0.28 * factor },
    name: style(2.9, 700, 'black'),
    text: style(2.6, 400, 'quiet'),
    small: style(2.4, 400, 'black'),
    swatch: { width: SWATCH.width * factor, height: SWATCH.height * factor },
  }
}

/** Settings tried in turn, most comfortable first, until the legend fits: smaller type, then closer lines. */
export const typeLadder: readonly TypeScale[] = [
  ...[1.65, 1.5, 1.35, 1.2, 1.1, 1, 0.9, 0.8].map((factor) => typeScale(factor, 1.28)),
  typeScale(0.8, 1.12),
]
