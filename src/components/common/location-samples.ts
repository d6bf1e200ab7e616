import { locationConfidences, type LocationConfidence } from '@shared/items/confidence'
import type { ItemKind } from '@shared/items/item'
import type { DisplayList } from '@shared/symbols/display-list'
import { drawItem } from '@shared/symbols/draw-item'
import type { Box } from '@shared/sheet-face/page-layout'

const SAMPLE = { width: 13, height: 3 }

/** The four location confidences as drawn samples: plain lines of the weight of the kind.
 *  @param kind a line kind; faults are heavy, all others light */
export function locationOptions(
  kind: ItemKind,
): { value: LocationConfidence; title: string; list: DisplayList; box: Box }[] {
  return locationConfidences.map((value) => ({
    value,
    title: value.charAt(0).toUpperCase() + value.slice(1),
    list: sampleLine(kind, value),
    box: { x: 0, y: 0, ...SAMPLE },
  }))
}

function sampleLine(kind: ItemKind, locationConfidence: LocationConfidence): DisplayList {
  const shared = {
    id: '',
    geometry: {
      type: 'LineString' as const,
      coordinates: [
        [1.5, SAMPLE.height / 2],
        [SAMPLE.width - 1.5, SAMPLE.height / 2],
      ] as [number, number][],
    },
  }
  const basis = { locationConfidence, identity: 'certain', name: '', note: '' } as const
  const frame = { origin: [0, 0] as [number, number], mmPerMetre: 1, convergenceAt: () => 0 }
  return drawItem(
    kind === 'fault'
      ? { ...shared, kind, properties: { ...basis, type: 'unspecified', side: 'right' } }
      : { ...shared, kind: 'contact', properties: basis },
    frame,
  )
}
