import { foldWords, isSidedFold, type AxialTraceProperties, type FoldForm } from '../items/lines'
import { normalizeAzimuth, type Azimuth, type Degrees } from '../units'
import { azimuthFigure } from './compass'
import { upperFirst } from '../words'

/** What the side of a fold is, where its form has one. */
export const foldSideMeaning = (form: FoldForm): string | undefined => {
  if (!isSidedFold(form)) return undefined
  return form.startsWith('overturned') ? 'limbs dip to the' : 'steep limb dips to the'
}

type Axis = Pick<AxialTraceProperties, 'form' | 'plunge' | 'trend' | 'doubly' | 'otherPlunge'>

/** A fold and its axis in words: `Anticline, plunging 21° toward 028°`; the form alone where no plunge is stated.
 *  @param side the side of a sided fold as the ground has it: `east` */
export function describeFold(axis: Axis, side?: string): string {
  const meaning = foldSideMeaning(axis.form)
  return [
    upperFirst(foldWords[axis.form]),
    ...(meaning && side ? [`${meaning} ${side}`] : []),
    ...axisWords(axis),
  ].join(', ')
}

function axisWords({ plunge, trend, doubly, otherPlunge }: Axis): string[] {
  if (doubly !== 'no') {
    const way = doubly === 'outward' ? 'from a culmination' : 'into a depression'
    const figures = [
      ...(plunge === null || trend === null ? [] : [plungeWords(plunge, trend)]),
      ...(otherPlunge === null || trend === null
        ? []
        : [plungeWords(otherPlunge, normalizeAzimuth(trend + 180))]),
    ]
    return [`plunging both ways ${way}${figures.length > 0 ? `: ${figures.join(', ')}` : ''}`]
  }
  if (plunge === null || trend === null) return []
  if (plunge === 0) return [`axis horizontal, trending ${azimuthFigure(trend)}°`]
  if (plunge === 90) return ['axis vertical']
  return [`plunging ${plungeWords(plunge, trend)}`]
}

const plungeWords = (plunge: Degrees, trend: Azimuth): string =>
  `${Math.round(plunge * 10) / 10}° toward ${azimuthFigure(trend)}°`
