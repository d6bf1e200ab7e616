import { pointOnFeature, polygon } from '@turf/turf'
import type { Face } from '../api/faces'
import type { Item } from '../items/item'
import type { XY } from '../units'

/** Something that would look wrong on the printed sheet, to be known before it is submitted and approved. */
export interface Doubt {
  sentence: string
  /** Where it is, sheet metres; empty where it is nowhere on the map. */
  places: XY[]
}

/** What is doubtful about a sheet as it would be printed. Doubts never stop anyone: a sheet may be meant so. */
export function doubtsOf(faces: readonly Face[], items: readonly Item[]): Doubt[] {
  const nameless = faces.filter((face) => face.unit === null)
  const hasUnits = items.some((item) => item.kind === 'unit')
  const hasAuthors = items.some((item) => item.kind === 'sheet-face' && item.properties.authors !== '')
  return [
    ...(nameless.length > 0
      ? [{ sentence: namelessSentence(nameless.length), places: nameless.map(placeIn) }]
      : []),
    ...(hasUnits ? [] : [{ sentence: 'The legend has no units.', places: [] }]),
    ...(hasAuthors ? [] : [{ sentence: 'No authors are named in the title block.', places: [] }]),
  ]
}

const namelessSentence = (count: number): string =>
  count === 1
    ? '1 area has no unit label, or labels that disagree: it is printed white.'
    : `${count} areas have no unit label, or labels that disagree: they are printed white.`

const placeIn = (face: Face): XY => {
  const [east = 0, north = 0] = pointOnFeature(polygon(face.rings)).geometry.coordinates
  return [east, north]
}
