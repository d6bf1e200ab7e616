import { lineationWords, type LineationProperties } from '../items/points'
import { describeAttitude } from './attitude-words'
import { azimuthFigure, compassWords } from './compass'
import { lowerFirst, upperFirst } from '../words'

/** What a lineation's words depend on. */
export type DescribedLineation = Pick<LineationProperties, 'type' | 'trend' | 'plunge' | 'plane'>

/** A lineation in words: `Lineation, plunges 35° toward 120° (south-east), on foliation that strikes 045°, dips 40° toward
 *  135° (south-east)`. */
export function describeLineation({ type, trend, plunge, plane }: DescribedLineation): string {
  const line = `${upperFirst(lineationWords[type])}, ${describePlunge(trend, plunge)}`
  if (!plane) return line
  const words = describeAttitude(plane)
  return `${line}, on ${plane.type} that ${words === 'Horizontal' ? 'is horizontal' : lowerFirst(words)}`
}

function describePlunge(trend: number | null, plunge: number): string {
  if (trend === null || plunge === 90) return 'vertical'
  if (plunge === 0) return `horizontal, trending ${azimuthFigure(trend)}°`
  return `plunges ${Math.round(plunge * 10) / 10}° toward ${azimuthFigure(trend)}° (${compassWords(trend)})`
}
