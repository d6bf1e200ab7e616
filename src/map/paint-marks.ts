import { isLineItem, type LineItem, type PointItem } from '@shared/items/item'
import { inkColour } from '@shared/symbols/ink'
import { palettes } from '@/theme/tokens'
import type { XY } from '@shared/units'
import type { Sketch } from './sketch'
import { toPx, type ViewFrame } from './view-frame'

/** What stands out on the map just now. */
export interface Marks {
  selected: readonly (LineItem | PointItem)[]
  hovered: readonly (LineItem | PointItem)[]
  /** Unit areas that are lit, each a drawing whose ground lies exactly. */
  areas: readonly (readonly XY[])[][]
  sketch: Sketch | null
  /** A place that waits for its attitude. */
  place: XY | null
  /** Versions of items laid over the sheet to be compared: `before` in slate, `after` in oxide. */
  /** What others have selected, with their initials. */
  others: readonly { items: readonly (LineItem | PointItem)[]; initials: string }[]
  compared: readonly { item: LineItem | PointItem; ink: 'before' | 'after' }[]
}

const SLATE = inkColour('selection')
const PAPER = inkColour('paper')
/** Paper stays paper in every theme, and so does the ink of other people on it. */
const MOSS = palettes.light.moss
const COMPARED = { before: SLATE, after: inkColour('fold') } as const
const FULL_TURN = 2 * Math.PI

/** Draws selection, hover and sketch over the sheet. Sizes are screen pixels: these are signs to a person, not symbols.
 *  @param symbolPx size of a symbol millimetre, px: a ring goes round the whole symbol */
export function paintMarks(
  context: CanvasRenderingContext2D,
  marks: Marks,
  { view, ratio, symbolPx }: { view: ViewFrame; ratio: number; symbolPx: number },
): void {
  context.setTransform(1, 0, 0, 1, 0, 0)
  context.clearRect(0, 0, view.width * ratio, view.height * ratio)
  context.setTransform(ratio, 0, 0, ratio, 0, 0)
  context.strokeStyle = SLATE
  context.lineJoin = context.lineCap = 'round'
  for (const rings of marks.areas) light(context, view, rings)
  for (const item of marks.hovered)
    emphasize(context, view, item, { alpha: 0.28, halo: 8, isSelected: false, symbolPx })
  for (const item of marks.selected)
    emphasize(context, view, item, { alpha: 0.2, halo: 8, isSelected: true, symbolPx })
  for (const { items, initials } of marks.others)
    for (const item of items) claim(context, view, item, { initials, symbolPx })
  for (const { item, ink } of marks.compared) overlay(context, view, item, COMPARED[ink])
  context.strokeStyle = SLATE
  if (marks.place) ring(context, toPx(view, marks.place), 9, 2)
  if (marks.sketch) paintSketch(context, view, marks.sketch)
}

/** An item that somebody else has selected: cased in moss, with their initials. */
function claim(
  context: CanvasRenderingContext2D,
  view: ViewFrame,
  item: LineItem | PointItem,
  { initials, symbolPx }: { initials: string; symbolPx: number },
): void {
  context.strokeStyle = MOSS
  context.globalAlpha = 0.45
  if (isLineItem(item)) {
    trace(context, view, item.geometry.coordinates)
    context.lineWidth = 7
    context.stroke()
  } else ring(context, toPx(view, item.geometry.coordinates), 4.6 * symbolPx, 2.5)
  context.globalAlpha = 1
  const at = isLineItem(item)
    ? item.geometry.coordinates[Math.floor(item.geometry.coordinates.length / 2)]
    : item.geometry.coordinates
  if (at) paintLabel(context, toPx(view, at), initials, MOSS)
}

/** A version of an item in one ink, on a paper casing that lifts it off the sheet. */
function overlay(
  context: CanvasRenderingContext2D,
  view: ViewFrame,
  item: LineItem | PointItem,
  colour: string,
): void {
  for (const [style, width] of [
    [PAPER, 5.5],
    [colour, 2.5],
  ] as const) {
    context.strokeStyle = style
    if (isLineItem(item)) {
      trace(context, view, item.geometry.coordinates)
      context.lineWidth = width
      context.stroke()
    } else ring(context, toPx(view, item.geometry.coordinates), 8, width)
  }
}

interface Emphasis {
  alpha: number
  halo: number
  isSelected: boolean
  symbolPx: number
}

function emphasize(
  context: CanvasRenderingContext2D,
  view: ViewFrame,
  item: LineItem | PointItem,
  { alpha, halo, isSelected, symbolPx }: Emphasis,
): void {
  if (!isLineItem(item)) {
    context.globalAlpha = isSelected ? 1 : 0.55
    ring(context, toPx(view, item.geometry.coordinates), 4.6 * symbolPx, isSelected ? 2 : 1.5)
    context.globalAlpha = 1
    return
  }
  trace(context, view, item.geometry.coordinates)
  if (isSelected) {
    // A casing: the symbol itself stays to be seen between its two edges.
    context.lineWidth = halo + 3
    context.stroke()
    context.globalCompositeOperation = 'destination-out'
    context.lineWidth = halo
    context.stroke()
    context.globalCompositeOperation = 'source-over'
  }
  context.globalAlpha = alpha
  context.lineWidth = halo
  context.stroke()
  context.globalAlpha = 1
}

function trace(context: CanvasRenderingContext2D, view: ViewFrame, line: readonly XY[]): void {
  context.beginPath()
  addLine(context, view, line)
}

function addLine(context: CanvasRenderingContext2D, view: ViewFrame, line: readonly XY[]): void {
  line.forEach((vertex, index) => {
    const [x, y] = toPx(view, vertex)
    if (index === 0) context.moveTo(x, y)
    else context.lineTo(x, y)
  })
}

/** Lights a unit area: outer ring and holes. */
function light(context: CanvasRenderingContext2D, view: ViewFrame, rings: readonly (readonly XY[])[]): void {
  context.beginPath()
  for (const line of rings) addLine(context, view, line)
  context.globalAlpha = 0.24
  context.fillStyle = SLATE
  context.fill('evenodd')
  context.globalAlpha = 1
  context.lineWidth = 1
  context.stroke()
}

function ring(
  context: CanvasRenderingContext2D,
  [x, y]: [number, number],
  radius: number,
  width: number,
): void {
  context.beginPath()
  context.arc(x, y, radius, 0, FULL_TURN)
  context.lineWidth = width
  context.stroke()
}

function paintSketch(context: CanvasRenderingContext2D, view: ViewFrame, sketch: Sketch): void {
  context.lineWidth = 1.6
  if (sketch.line) {
    trace(context, view, sketch.line)
    context.stroke()
  }
  if (sketch.preview) {
    context.setLineDash([5, 4])
    trace(context, view, sketch.preview)
    context.stroke()
    context.setLineDash([])
  }
  for (const vertex of sketch.vertices ?? []) handle(context, toPx(view, vertex.at), vertex.active)
  if (sketch.snap) paintSnap(context, toPx(view, sketch.snap.at), sketch.snap.to)
  if (sketch.label) paintLabel(context, toPx(view, sketch.label.at), sketch.label.text)
}

function handle(context: CanvasRenderingContext2D, [x, y]: [number, number], active: boolean): void {
  const half = active ? 4.5 : 3
  context.fillStyle = active ? SLATE : PAPER
  context.lineWidth = 1.4
  context.beginPath()
  context.rect(x - half, y - half, 2 * half, 2 * half)
  context.fill()
  context.stroke()
}

/** The shape says what was caught: a square for a vertex or end, a ring for a point, a diamond for a line's side. */
function paintSnap(
  context: CanvasRenderingContext2D,
  [x, y]: [number, number],
  to: NonNullable<Sketch['snap']>['to'],
): void {
  context.lineWidth = 2
  if (to === 'point') return ring(context, [x, y], 7, 2)
  const reach = to === 'end' ? 7 : 6
  context.beginPath()
  if (to === 'line') {
    context.moveTo(x, y - reach)
    context.lineTo(x + reach, y)
    context.lineTo(x, y + reach)
    context.lineTo(x - reach, y)
    context.closePath()
  } else context.rect(x - reach, y - reach, 2 * reach, 2 * reach)
  context.stroke()
}

function paintLabel(
  context: CanvasRenderingContext2D,
  [x, y]: [number, number],
  text: string,
  colour: string = SLATE,
): void {
  context.font = '700 12.5px Lato, sans-serif'
  context.textAlign = 'left'
  context.textBaseline = 'alphabetic'
  context.lineWidth = 4
  context.strokeStyle = PAPER
  context.strokeText(text, x + 12, y - 10)
  context.fillStyle = colour
  context.fillText(text, x + 12, y - 10)
  context.strokeStyle = SLATE
}
