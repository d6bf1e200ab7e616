import { locationConfidences } from '../items/confidence'
import { itemSchema, type LineItem } from '../items/item'
import { doublyPlunging } from '../items/lines'
import type { LineSymbol } from '../symbols/definition'
import { drawItem } from '../symbols/draw-item'
import type { DrawingFrame } from '../symbols/frame'
import type { Millimetres, XY } from '../units'
import { specimenCase, type SpecimenCase } from './entry'

/** Length of a specimen line: room for a decoration of every symbol and a question mark. */
const LENGTH: Millimetres = 29
/** How far it waves to either side: decorations must follow it. */
const WAVE: Millimetres = 0.9
/** A frame in which a metre is a millimetre and true north is up. */
export const specimenFrame: DrawingFrame = { origin: [0, 0], mmPerMetre: 1, convergenceAt: () => 0 }
const ID = '00000000-0000-4000-8000-000000000000'

const forward = Array.from({ length: 59 }, (_, index): XY => {
  const along = (index / 58) * LENGTH
  return [along, WAVE * Math.sin((along / LENGTH) * 2 * Math.PI)]
})
const backward = forward.toReversed()

/** What is set for one case, beside the symbol's type or form. */
interface CaseOf {
  caption: string
  set: object
  line?: XY[]
}

/** Cases that show what an attribute does to a line's drawing. An attribute that is not here would go unshown: a test
 *  asks for each that some symbol names. */
export const lineAttributeCases: Readonly<Record<string, readonly CaseOf[]>> = {
  locationConfidence: locationConfidences.map((locationConfidence) => ({
    caption: locationConfidence,
    set: { locationConfidence },
  })),
  identity: locationConfidences.map((locationConfidence) => ({
    caption: `${locationConfidence}, questioned`,
    set: { locationConfidence, identity: 'questionable' },
  })),
  side: [
    { caption: 'side left', set: { side: 'left' } },
    { caption: 'side right', set: { side: 'right' } },
    { caption: 'side right, drawn back', set: { side: 'right' }, line: backward },
  ],
  dip: [
    { caption: 'dips 35° to the left', set: { dip: 35, side: 'left' } },
    { caption: 'dips 70° to the right', set: { dip: 70, side: 'right' } },
    { caption: 'vertical', set: { dip: 90 } },
  ],
  plunge: [
    { caption: 'plunges 21° toward 090°', set: { plunge: 21, trend: 90 } },
    { caption: 'horizontal axis', set: { plunge: 0, trend: 90 } },
  ],
  trend: [{ caption: 'plunges 21° toward 270°', set: { plunge: 21, trend: 270 } }],
  doubly: doublyPlunging
    .filter((doubly) => doubly !== 'no')
    .map((doubly) => ({ caption: `plunges ${doubly}`, set: { doubly } })),
  otherPlunge: doublyPlunging
    .filter((doubly) => doubly !== 'no')
    .map((doubly) => ({
      caption: `plunges ${doubly}, 14° and 32°`,
      set: { doubly, plunge: 14, trend: 90, otherPlunge: 32 },
    })),
}

/** All cases of a line symbol: its attributes one after the other. A side says nothing of a line without decoration but
 *  where its dip goes, and the cases of the dip show that. */
export const lineCases = (symbol: LineSymbol): SpecimenCase[] =>
  symbol.drivenBy
    .filter((attribute) => attribute !== 'side' || symbol.decoration)
    .flatMap((attribute) =>
      (lineAttributeCases[attribute] ?? []).map(({ caption, set, line }) =>
        specimenCase(caption, drawItem(lineOf(symbol, set, line), specimenFrame)),
      ),
    )

function lineOf({ kind, variant }: LineSymbol, set: object, coordinates = forward): LineItem {
  const picks = variant === '' ? {} : kind === 'axial-trace' ? { form: variant } : { type: variant }
  const item = itemSchema.parse({
    id: ID,
    kind,
    geometry: { type: 'LineString', coordinates },
    properties: { ...picks, ...set },
  })
  return item as LineItem // The kind is a line's.
}
