import {
  identities,
  locationConfidences,
  type Identity,
  type LocationConfidence,
} from '@shared/items/confidence'
import type { ItemKind } from '@shared/items/item'
import type { Box } from '@shared/sheet-face/page-layout'
import type { DisplayList } from '@shared/symbols/display-list'
import { lineSymbols } from '@shared/symbols/draw-item'
import { drawLine } from '@shared/symbols/draw-line'

/** A drawn sample that stands for a value. */
export interface SampleOption<V extends string> {
  value: V
  title: string
  list: DisplayList
  box: Box
}

const SAMPLE = { width: 13, height: 3 }
const MARGIN = 1.5

/** The four location confidences as drawn samples: plain lines of the weight of the kind.
 *  @param kind a line kind; faults are heavy, all others light */
export const locationOptions = (kind: ItemKind): SampleOption<LocationConfidence>[] =>
  locationConfidences.map((value) => option(value, capital(value), { kind, locationConfidence: value }))

const identityTitles: Record<Identity, string> = {
  certain: 'Certain to be what it is called',
  questionable: 'Questioned: a query stands in the line',
}

/** Certain and questioned identity as drawn samples. */
export const identityOptions = (kind: ItemKind): SampleOption<Identity>[] =>
  identities.map((value) => option(value, identityTitles[value], { kind, identity: value }))

function option<V extends string>(
  value: V,
  title: string,
  line: { kind: ItemKind; locationConfidence?: LocationConfidence; identity?: Identity },
): SampleOption<V> {
  return { value, title, list: sampleLine(line), box: { x: 0, y: 0, ...SAMPLE } }
}

function sampleLine({
  kind,
  locationConfidence = 'certain',
  identity = 'certain',
}: {
  kind: ItemKind
  locationConfidence?: LocationConfidence
  identity?: Identity
}): DisplayList {
  const plainKind = kind === 'fault' ? 'fault' : 'contact'
  const symbol = lineSymbols.find((candidate) => candidate.kind === plainKind)
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

const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1)
