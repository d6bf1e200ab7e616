import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import { drawSheetFrame, facePath } from '@shared/sheet-face/graticule'
import { neatlineBounds } from '@shared/sheet-face/page-layout'
import { standLabels } from '@shared/sheet-face/stand-labels'
import type { SheetProjection } from '@shared/geometry/projection'
import { isLineItem, type Item, type ItemOf, type LineItem, type PointItem } from '@shared/items/item'
import type { UnitProperties } from '@shared/items/legend'
import { facePathOf } from '@shared/sheet-face/compose-face'
import { sheetFaceOf } from '@shared/sheet-face/compose-margin'
import { drawFace } from '@shared/symbols/draw-face'
import { drawItem } from '@shared/symbols/draw-item'
import type { Ink } from '@shared/symbols/display-list'
import { unitLabelSize, unitLabelText, type LabelStand } from '@shared/symbols/draw-unit-label'
import { arrowOf } from '@shared/symbols/draw-lineation'
import { mmPerMetreAtScale, toMm, type DrawingFrame } from '@shared/symbols/frame'
import { printed } from '@shared/symbols/one-ink'
import { simplifyStrokes } from '@shared/symbols/simplify'
import { unitFills, type Printing, type UnitFill } from '@shared/symbols/unit-fill'
import type { Metres, Millimetres, MM, XY } from '@shared/units'
import { makeDrawing, type Drawing } from './drawing'
import { inInk } from './in-ink'
import { ItemIndex, type GroundBox } from './item-index'
import { KeptDrawings } from './kept-drawings'
import { screenScaleBar } from './screen-scale-bar'
import { thinOut } from './thinning'
import { bandScale } from './zoom-bands'

/** How far a line's drawing may leave the line when the sheet is shown smaller than print, millimetres: a quarter of a
 *  pixel. At print size and above nothing is left out. */
const SIMPLER_BY: Millimetres = 0.07

/** Everything that the map shows of a sheet, with its drawings kept ready. */
export class Scene {
  readonly bounds: GroundBox
  index = new ItemIndex([])
  faces: readonly Face[] = []
  /** In colour or in one ink: the map shows what will be printed. */
  printing: Printing = 'colour'
  private units = new Map<string, UnitProperties>()
  private fills = new Map<string, UnitFill>()
  private labels: readonly ItemOf<'unit-label'>[] = []
  private stands: Map<string, LabelStand> | undefined
  private readonly kept = new KeptDrawings()
  private steps: ReadonlyMap<Item, number> | undefined
  private areas = new WeakMap<Face, Drawing>()
  private frameDrawing: Drawing | undefined

  /** @param ink the one ink that everything is drawn in; by its own inks unless given */
  constructor(
    readonly sheet: Sheet,
    private readonly projection: SheetProjection,
    private readonly ink?: Ink,
  ) {
    this.bounds = neatlineBounds(sheet.neatline)
  }

  /** Takes over all items; drawings of items that are still the same objects are kept. */
  setItems(items: readonly Item[]): void {
    const points = this.index.points
    this.index = new ItemIndex(items)
    if (!isSameList(points, this.index.points)) this.steps = undefined
    this.setPrinting(sheetFaceOf(items).printing)
    this.setUnits(items.filter((item) => item.kind === 'unit'))
    this.setLabels(items.filter((item) => item.kind === 'unit-label'))
  }

  private setPrinting(printing: Printing): void {
    if (printing === this.printing) return
    this.printing = printing
    this.forgetDrawings()
    this.areas = new WeakMap()
  }

  private setUnits(legend: readonly ItemOf<'unit'>[]): void {
    const units = new Map(legend.map(({ id, properties }) => [id, properties]))
    if (!isSameLegend(units, this.units)) {
      this.forgetLabels()
      this.areas = new WeakMap()
    }
    this.units = units
    this.fills = unitFills(legend, this.printing)
  }

  private setLabels(labels: readonly ItemOf<'unit-label'>[]): void {
    if (!isSameList(labels, this.labels)) this.forgetLabels()
    this.labels = labels
  }

  setFaces(faces: readonly Face[]): void {
    this.faces = faces
    this.forgetLabels()
  }

  /** Where letters stand depends on all areas and labels: worked out anew when next they are drawn. */
  private forgetLabels(): void {
    this.kept.forgetLabels()
    this.stands = undefined
  }

  private standOf(label: string): LabelStand | undefined {
    const frame = this.frameAt(this.bounds.min, mmPerMetreAtScale(this.sheet.scale))
    this.stands ??= standLabels(this.faces, this.labels, frame, (id) => this.units.get(id))
    return this.stands.get(label)
  }

  /** Letters were measured or drawn with another font before Lato was there. */
  forgetDrawings(): void {
    this.kept.forget()
    this.frameDrawing = undefined
  }

  /** Whether a point symbol gives way to its neighbours at a step of zooming out (see `thinOut`). */
  isThinned(item: Item, step: number): boolean {
    if (step === 0) return false
    this.steps ??= thinOut(this.index.points, this.sheet.scale)
    return (this.steps.get(item) ?? step) < step
  }

  /** An item's drawing for a band of zooms. */
  drawingOf(item: LineItem | PointItem, band: number): Drawing {
    return this.kept.of(item, band, () => this.make(item, band))
  }

  /** Whether an item's drawing for a band is there already. */
  isReady(item: LineItem | PointItem, band: number): boolean {
    return this.kept.has(item, band)
  }

  private make(item: LineItem | PointItem, band: number): Drawing {
    const frame = this.frameAt(originOf(item), mmPerMetreAtScale(this.sheet.scale) * bandScale(band))
    const list = drawItem(item, frame, {
      unitOf: (id) => this.units.get(id),
      standOf: (label) => this.standOf(label),
    })
    const shown = this.ink ? inInk(list, this.ink) : printed(list, this.printing)
    return makeDrawing(isLineItem(item) && band < 0 ? simplifyStrokes(shown, SIMPLER_BY) : shown, frame)
  }

  /** The area of a unit; undefined where no unit, or one that is gone, claims it. */
  areaOf(face: Face): Drawing | undefined {
    const known = this.areas.get(face)
    if (known) return known
    const fill = face.unit === null ? undefined : this.fills.get(face.unit)
    if (!fill) return undefined
    const frame = this.frameAt(this.bounds.min, mmPerMetreAtScale(this.sheet.scale))
    const list = drawFace(facePathOf(face, frame), fill, toMm(frame, this.bounds.min))
    const made = makeDrawing(printed(list, this.printing), frame)
    this.areas.set(face, made)
    return made
  }

  /** Neatline, grid and graticule, and the scale bar below the map face. */
  frame(mmPerMetre: number, settle: boolean): Drawing {
    const known = this.frameDrawing
    if (known && (!settle || known.mmPerMetre === mmPerMetre)) return known
    const frame = this.frameAt(this.bounds.min, mmPerMetre)
    const list = [
      ...drawSheetFrame(this.sheet, this.projection, frame),
      ...screenScaleBar(this.bounds, frame),
    ]
    this.frameDrawing = makeDrawing(printed(list, this.printing), frame)
    return this.frameDrawing
  }

  /** What a symbol has beside its place, as a line on the ground at the size it is shown: the arrow of a lineation, and unit
   *  letters that stand elsewhere with their leader; undefined for what has neither. */
  arrowOf(item: PointItem, metresPerMm: Metres): XY[] | undefined {
    const [east, north] = item.geometry.coordinates
    return this.besideOf(item)?.map(([x, y]): XY => [east + x * metresPerMm, north + y * metresPerMm])
  }

  private besideOf(item: PointItem): readonly MM[] | undefined {
    if (item.kind === 'lineation') {
      return arrowOf(item.properties, this.projection.convergenceAt(item.geometry.coordinates))
    }
    const stand = item.kind === 'unit-label' ? this.standOf(item.id) : undefined
    if (!stand || item.kind !== 'unit-label') return undefined
    const text = unitLabelText(item.properties, (id) => this.units.get(id))
    const half = unitLabelSize(text).width / 2
    const [x, y] = stand.offset
    return [[0, 0], ...[x - half, x + half].map((end): MM => [end, y])]
  }

  /** The neatline as a path to clip to, in the frame's millimetres. */
  facePath = (mmPerMetre: number) => facePath(this.sheet, this.frameAt(this.bounds.min, mmPerMetre))

  private frameAt(origin: XY, mmPerMetre: number): DrawingFrame {
    return { origin, mmPerMetre, convergenceAt: (xy) => this.projection.convergenceAt(xy) }
  }
}

const originOf = (item: LineItem | PointItem): XY =>
  isLineItem(item) ? (item.geometry.coordinates[0] ?? [0, 0]) : item.geometry.coordinates

const isSameList = <T>(a: readonly T[], b: readonly T[]): boolean =>
  a.length === b.length && a.every((each, index) => each === b[index])

function isSameLegend(
  a: ReadonlyMap<string, UnitProperties>,
  b: ReadonlyMap<string, UnitProperties>,
): boolean {
  const shown = ({ label, colour, pattern, rank }: UnitProperties): string =>
    [label, colour, pattern, rank].join(' ')
  return (
    a.size === b.size &&
    [...a].every(([id, unit]) => {
      const other = b.get(id)
      return other !== undefined && shown(other) === shown(unit)
    })
  )
}
