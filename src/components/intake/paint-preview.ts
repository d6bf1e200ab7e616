import type { IntakePreview } from '@shared/api/intake'
import type { XY } from '@shared/units'

/** What lies on the preview: sheet metres. */
export interface PreviewScene {
  neatline: readonly XY[]
  /** Linework that is on the sheet already. */
  existing: Iterable<readonly XY[]>
  incoming: IntakePreview['sample']
}

/** Colours as the canvas takes them. */
export interface PreviewInks {
  frame: string
  existing: string
  incoming: string
}

/** Longest that one slice of drawing keeps the page, milliseconds: well below what a hand notices. */
const SLICE_MS = 8
const MARGIN_PX = 12

/** Draws a preview in slices, so that the page answers meanwhile; stops as soon as `isStale`.
 *  @param size CSS pixels; the context is scaled to them */
export async function paintPreview(
  context: CanvasRenderingContext2D,
  size: { width: number; height: number },
  scene: PreviewScene,
  inks: PreviewInks,
  isStale: () => boolean,
): Promise<void> {
  const toPx = fit(scene.neatline, size)
  context.clearRect(0, 0, size.width, size.height)
  context.lineJoin = 'round'
  strokeStyle(context, inks.existing, 0.8)
  if (!(await inSlices(scene.existing, (line) => strokeLine(context, line.map(toPx)), isStale))) return
  strokeStyle(context, inks.frame, 1)
  strokeLine(context, scene.neatline.map(toPx))
  strokeStyle(context, inks.incoming, 1.2)
  context.fillStyle = inks.incoming
  await inSlices(scene.incoming, ({ places }) => drawIncoming(context, places, toPx), isStale)
}

/** Height that a sheet's face takes at a width, CSS pixels. */
export function heightFor(neatline: readonly XY[], width: number): number {
  const { west, south, east, north } = boundsOf(neatline)
  const inner = Math.max(1, width - 2 * MARGIN_PX)
  return Math.round((inner * (north - south)) / Math.max(1, east - west)) + 2 * MARGIN_PX
}

function fit(neatline: readonly XY[], { width, height }: { width: number; height: number }): (xy: XY) => XY {
  const { west, south, east, north } = boundsOf(neatline)
  const scale = Math.min((width - 2 * MARGIN_PX) / (east - west), (height - 2 * MARGIN_PX) / (north - south))
  const left = (width - scale * (east - west)) / 2
  const top = (height - scale * (north - south)) / 2
  return ([x, y]) => [left + (x - west) * scale, top + (north - y) * scale]
}

function boundsOf(ring: readonly XY[]): { west: number; south: number; east: number; north: number } {
  const easts = ring.map(([east]) => east)
  const norths = ring.map(([, north]) => north)
  return {
    west: Math.min(...easts),
    south: Math.min(...norths),
    east: Math.max(...easts),
    north: Math.max(...norths),
  }
}

/** True when all is done, false when it was stopped. */
async function inSlices<T>(
  things: Iterable<T>,
  draw: (thing: T) => void,
  isStale: () => boolean,
): Promise<boolean> {
  let start = performance.now()
  for (const thing of things) {
    if (performance.now() - start > SLICE_MS) {
      await new Promise((resolve) => requestAnimationFrame(resolve))
      if (isStale()) return false
      start = performance.now()
    }
    draw(thing)
  }
  return true
}

function drawIncoming(
  context: CanvasRenderingContext2D,
  places: readonly number[],
  toPx: (xy: XY) => XY,
): void {
  const line: XY[] = []
  for (let at = 0; at + 1 < places.length; at += 2) line.push(toPx([places[at] ?? 0, places[at + 1] ?? 0]))
  const [only] = line
  if (line.length > 1) return strokeLine(context, line)
  if (!only) return
  context.beginPath()
  context.arc(only[0], only[1], 2.2, 0, 2 * Math.PI)
  context.fill()
}

/** A stroked line without the vertices that fall within half a pixel of the one before. */
function strokeLine(context: CanvasRenderingContext2D, line: readonly XY[]): void {
  let last: XY | undefined
  context.beginPath()
  line.forEach((point, index) => {
    const near = last && Math.abs(point[0] - last[0]) < 0.5 && Math.abs(point[1] - last[1]) < 0.5
    if (near && index < line.length - 1) return
    if (last) context.lineTo(...point)
    else context.moveTo(...point)
    last = point
  })
  context.stroke()
}

function strokeStyle(context: CanvasRenderingContext2D, colour: string, width: number): void {
  context.strokeStyle = colour
  context.lineWidth = width
}
