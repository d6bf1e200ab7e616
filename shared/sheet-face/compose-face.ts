import type { Face } from '../api/faces'
import type { Sheet } from '../api/sheets'
import { sheetProjection } from '../geometry/projection'
import { kindWords, type Item, type ItemOf } from '../items/item'
import type { UnitProperties } from '../items/legend'
import type { DisplayList, Path } from '../symbols/display-list'
import { drawFace } from '../symbols/draw-face'
import { drawItem } from '../symbols/draw-item'
import type { LabelStand } from '../symbols/draw-unit-label'
import { drawingOrder } from '../symbols/drawing-order'
import { mmPerMetreAtScale, toMm, type DrawingFrame } from '../symbols/frame'
import { polyline } from '../symbols/paths'
import { unitFills, type Printing } from '../symbols/unit-fill'
import { drawSheetFrame, facePath } from './graticule'
import { neatlineBounds, pageLayout } from './page-layout'
import { standLabels } from './stand-labels'

/** A part of the page, drawn when asked for, so that a large sheet can be drawn a little at a time. */
export interface SheetPart {
  /** What is drawn, in words for a progress message. */
  words: string
  draw(): DisplayList
}

/** Items of one part: few enough to draw in a moment, enough that parts stay few. */
const ITEMS_PER_PART = 100

type GroundOfSheet = Pick<Sheet, 'crs' | 'neatline' | 'page' | 'scale'>

/** How the ground lies on the printed page: the map face stands where the page's layout has it. */
export function printFrame(sheet: GroundOfSheet): DrawingFrame {
  const { face } = pageLayout(sheet)
  const { min } = neatlineBounds(sheet.neatline)
  const mmPerMetre = mmPerMetreAtScale(sheet.scale)
  return {
    origin: [min[0] - face.x / mmPerMetre, min[1] - face.y / mmPerMetre],
    mmPerMetre,
    convergenceAt: sheetProjection(sheet.crs.proj4).convergenceAt,
  }
}

/** The map face in drawing order: unit areas, linework, attitudes, labels, all within the neatline; then the frame. */
export function composeFace(
  sheet: GroundOfSheet,
  items: readonly Item[],
  faces: readonly Face[],
  printing: Printing,
): SheetPart[] {
  const frame = printFrame(sheet)
  const clip = facePath(sheet, frame)
  const clipped = (name: string, marks: DisplayList): DisplayList => [{ mark: 'group', name, clip, marks }]
  const units = unitsById(items)
  const fills = unitFills(
    items.filter((item) => item.kind === 'unit'),
    printing,
  )
  const anchor = toMm(frame, neatlineBounds(sheet.neatline).min)
  const unitOf = (id: string): UnitProperties | undefined => units.get(id)
  const standOf = labelStands(faces, items, frame, unitOf)
  return [
    ...inParts(faces).map((some) => ({
      words: 'unit areas',
      draw: () =>
        clipped(
          'unit areas',
          some.flatMap((face) => {
            const fill = face.unit === null ? undefined : fills.get(face.unit)
            return fill ? drawFace(facePathOf(face, frame), fill, anchor) : []
          }),
        ),
    })),
    ...drawingOrder.flatMap((kind) =>
      inParts(items.filter((item) => item.kind === kind)).map((some) => ({
        words: kindWords[kind].many,
        draw: () =>
          clipped(
            kindWords[kind].many,
            some.flatMap((item) => drawItem(item, frame, { unitOf, standOf })),
          ),
      })),
    ),
    { words: 'frame', draw: () => drawSheetFrame(sheet, sheetProjection(sheet.crs.proj4), frame) },
  ]
}

/** Where unit labels stand, worked out when the first of them is drawn. */
function labelStands(
  faces: readonly Face[],
  items: readonly Item[],
  frame: DrawingFrame,
  unitOf: (id: string) => UnitProperties | undefined,
): (label: string) => LabelStand | undefined {
  let stands: Map<string, LabelStand> | undefined
  return (label) => {
    const labels = (): ItemOf<'unit-label'>[] => items.filter((item) => item.kind === 'unit-label')
    stands ??= standLabels(faces, labels(), frame, unitOf)
    return stands.get(label)
  }
}

export const unitsById = (items: readonly Item[]): Map<string, UnitProperties> =>
  new Map(items.flatMap((item) => (item.kind === 'unit' ? [[item.id, item.properties] as const] : [])))

/** A unit's area as one path, outer ring and holes, in the frame's millimetres. */
export const facePathOf = (face: Face, frame: DrawingFrame): Path =>
  face.rings.flatMap((ring) =>
    polyline(
      ring.slice(0, -1).map((xy) => toMm(frame, xy)),
      true,
    ),
  )

function inParts<T>(all: readonly T[]): T[][] {
  return Array.from({ length: Math.ceil(all.length / ITEMS_PER_PART) }, (_, index) =>
    all.slice(index * ITEMS_PER_PART, (index + 1) * ITEMS_PER_PART),
  )
}
