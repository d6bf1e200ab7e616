import {
  identities,
  locationConfidences,
  type Identity,
  type LocationConfidence,
} from '@shared/items/confidence'
import type { Box } from '@shared/sheet-face/page-layout'
import type { DisplayList } from '@shared/symbols/display-list'
import { lineSymbols } from '@shared/symbols/draw-item'
import { drawLine } from '@shared/symbols/draw-line'
import { upperFirst } from '@shared/words'

/** A drawn sample that stands for a value. */
export interface SampleOption<V extends string> {
  value: V
  title: string
  list: DisplayList
  box: Box
}

/** Wide enough for three long dashes. */
const SAMPLE = { width: 12, height: 3.4 }
const MARGIN = 1

/** The four location confidences as drawn samples: plain lines, heavy enough to be told apart on a slip. */
export const locationOptions: readonly SampleOption<LocationConfidence>[] = locationConfidences.map((value) =>
  option(value, upperFirst(value), { locationConfidence: value }),
)

const identityTitles: Record<Identity, string> = {
  certain: 'Certain to be what it is called',
  questionable: 'Questioned: a query stands in the line',
}

/** Certain and questioned identity as drawn samples. */
export const identityOptions: readonly SampleOption<Identity>[] = identities.map((value) =>
  option(value, identityTitles[value], { identity: value }),
)

function option<V extends string>(
  value: V,
  title: string,
  line: { locationConfidence?: LocationConfidence; identity?: Identity },
): SampleOption<V> {
  return { value, title, list: sampleLine(line), box: { x: 0, y: 0, ...SAMPLE } }
}

function sampleLine({
  locationConfidence = 'certain',
  identity = 'certain',
}: {
  locationConfidence?: LocationConfidence
  identity?: Identity
}): DisplayList {
  const symbol = lineSymbols.find((candidate) => candidate.kind === 'fault')
  const middle = SAMPLE.height / 2
  if (!symbol) return []
  return drawLine(
    symbol,
    [
      [MARGIN, middle],
      [SAMPLE.width - MARGIN, middle],
    ],
    { locationConfidence, identity, attributes: { side: 1 } },
  )
}
