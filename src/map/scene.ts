import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import { drawSheetFrame, facePath } from '@shared/sheet-face/graticule'
import { neatlineBounds } from '@shared/sheet-face/page-layout'
import type { SheetProjection } from '@shared/geometry/projection'
import { isLineItem, type Item, type LineItem, type PointItem } from '@shared/items/item'
import type { UnitProperties } from '@shared/items/legend'
import { drawFace } from '@shared/symbols/draw-face'
import { drawItem } from '@shared/symbols/draw-item'
import { arrowOf } from '@shared/symbols/draw-lineation'
import { mmPerMetreAtScale, toMm, type DrawingFrame } from '@shared/symbols/frame'
import { polyline } from '@shared/symbols/paths'
import type { Metres, XY } from '@shared/units'
import { makeDrawing, type Drawing } from './drawing'
import { ItemIndex, type GroundBox } from './item-index'
import { screenScaleBar } from './screen-scale-bar'
import { thinLine } from './thin-line'

/** Vertices nearer than this to the one before are left out of a line's drawing, millimetres: a third of a hairline. */
const LEAST_STEP_MM = 0.05

/** Everything that the map shows of a sheet, with its drawings kept ready. Drawings of lines depend on the scale they were
 *  made for; those of points and unit areas do not. */
export class Scene {
  readonly bounds: GroundBox
  index = new ItemIndex([])
  faces: readonly Face[] = []
  private units = new Map<string, UnitProperties>()
  private lines = new WeakMap<Item, Drawing>()
  private points = new WeakMap<Item, Drawing>()
  private areas = new WeakMap<Face, Drawing>()
  private frameDrawing: Drawing | undefined

  constructor(
    readonly sheet: Sheet,
    private readonly projection: SheetProjection,
  ) {
    this.bounds = neatlineBounds(sheet.neatline)
  }

  /** Takes over all items; drawings of items that are still the same objects are kept. */
  setItems(items: readonly Item[]): void {
    this.index = new ItemIndex(items)
    const units = new Map<string, UnitProperties>()
    for (const item of items) if (item.kind === 'unit') units.set(item.id, item.properties)
    if (!isSameLegend(units, this.units)) {
      this.points = new WeakMap()
      this.areas = new WeakMap()
    }
    this.units = units
  }

  setFaces(faces: readonly Face[]): void {
    this.faces = faces
  }

  /** Letters were measured or drawn with another font before Lato was there. */
  forgetDrawings(): void {
    this.lines = new WeakMap()
    this.points = new WeakMap()
    this.frameDrawing = undefined
  }

  /** An item's drawing for a scale.
   *  @param settle false where a drawing made for another scale will do for now, as in the middle of a zoom */
  drawingOf(item: LineItem | PointItem, mmPerMetre: number, settle: boolean): Drawing {
    const cache = isLineItem(item) ? this.lines : this.points
    const known = cache.get(item)
    if (known && (!settle || !isLineItem(item) || known.mmPerMetre === mmPerMetre)) return known
    const made = this.make(item, mmPerMetre)
    cache.set(item, made)
    return made
  }

  private make(item: LineItem | PointItem, mmPerMetre: number): Drawing {
    const frame = this.frameAt(originOf(item), mmPerMetre)
    const list = drawItem(isLineItem(item) ? thinned(item, LEAST_STEP_MM / mmPerMetre) : item, frame, {
      unitOf: (id) => this.units.get(id),
    })
    return makeDrawing(list, frame)
  }

  /** The area of a unit; undefined where no unit, or one that is gone, claims it. */
  areaOf(face: Face): Drawing | undefined {
    const known = this.areas.get(face)
    if (known) return known
    const unit = face.unit === null ? undefined : this.units.get(face.unit)
    if (!unit) return undefined
    const frame = this.frameAt(this.bounds.min, mmPerMetreAtScale(this.sheet.scale))
    const rings = face.rings.flatMap((ring) =>
      polyline(
        ring.slice(0, -1).map((xy) => toMm(frame, xy)),
        true,
      ),
    )
    const made = makeDrawing(drawFace(rings, unit), frame)
    this.areas.set(face, made)
    return made
  }

  /** Neatline, grid and graticule, and the scale bar below the map face. */
  frame(mmPerMetre: number, settle: boolean): Drawing {
    const known = this.frameDrawing
    if (known && (!settle || known.mmPerMetre === mmPerMetre)) return known
    const frame = this.frameAt(this.bounds.min, mmPerMetre)
    this.frameDrawing = makeDrawing(
      [...drawSheetFrame(this.sheet, this.projection, frame), ...screenScaleBar(this.bounds, frame)],
      frame,
    )
    return this.frameDrawing
  }

  /** The arrow of a lineation on the ground, at the size its symbol is shown; undefined for what has none. */
  arrowOf(item: PointItem, metresPerMm: Metres): XY[] | undefined {
    if (item.kind !== 'lineation') return undefined
    const [east, north] = item.geometry.coordinates
    const arrow = arrowOf(item.properties, this.projection.convergenceAt([east, north]))
    return arrow?.map(([x, y]): XY => [east + x * metresPerMm, north + y * metresPerMm])
  }

  /** The neatline as a path to clip to, in the frame's millimetres. */
  facePath = (mmPerMetre: number) => facePath(this.sheet, this.frameAt(this.bounds.min, mmPerMetre))

  private frameAt(origin: XY, mmPerMetre: number): DrawingFrame {
    return { origin, mmPerMetre, convergenceAt: (xy) => this.projection.convergenceAt(xy) }
  }
}

const originOf = (item: LineItem | PointItem): XY =>
  isLineItem(item) ? (item.geometry.coordinates[0] ?? [0, 0]) : item.geometry.coordinates

const thinned = (item: LineItem, step: Metres): LineItem => ({
  ...item,
  geometry: { ...item.geometry, coordinates: thinLine(item.geometry.coordinates, step) },
})

function isSameLegend(
  a: ReadonlyMap<string, UnitProperties>,
  b: ReadonlyMap<string, UnitProperties>,
): boolean {
  return (
    a.size === b.size &&
    [...a].every(([id, unit]) => b.get(id)?.label === unit.label && b.get(id)?.colour === unit.colour)
  )
}
