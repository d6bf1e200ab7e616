import type { Path } from '@shared/symbols/display-list'
import type { Paint, Surface, TextRun, Transform } from '@shared/symbols/interpreter'
import type { Millimetres } from '@shared/units'
import { pdfTiles } from './pdf-tiles'

/** PDF's unit: 72 points to the inch. */
export const POINTS_PER_MM = 72 / 25.4

/** From page millimetres, y up, to pdfkit's points, y down. */
export const pdfTransform = (pageHeight: Millimetres): Transform => ({
  scale: POINTS_PER_MM,
  x: 0,
  y: pageHeight * POINTS_PER_MM,
  flipY: true,
})

/** Names under which the fonts of the three weights are registered with the document. */
export const fontName = (weight: TextRun['weight']): string => `lato-${weight}`

/** A surface that draws on the current page of a PDF document, as vectors. */
export function pdfSurface(document: PDFKit.PDFDocument): Surface {
  const patternOf = pdfTiles(document)
  return {
    path(path, paint) {
      if (path.length === 0) return
      tracePath(document, path)
      paintPath(document, paint)
    },
    tile(path, tiling) {
      if (path.length === 0) return
      // Path and paint must not be parted, so the colour comes before both.
      document.fillColor([patternOf(tiling), tiling.colour])
      tracePath(document, path)
      document.fill('even-odd')
    },
    text(run) {
      document.save()
      if (run.turn !== 0) document.rotate(run.turn, { origin: [run.x, run.y] })
      if (run.halo) {
        document.lineJoin('round').lineWidth(run.halo.width).strokeColor(run.halo.colour)
        setText(document, run, { stroke: true, fill: false })
      }
      document.fillColor(run.colour)
      setText(document, run, { stroke: false, fill: true })
      document.restore()
    },
    clip(path) {
      tracePath(document, path)
      document.clip('even-odd')
    },
    group(_name, draw) {
      document.save()
      draw()
      document.restore()
    },
  }
}

function tracePath(document: PDFKit.PDFDocument, path: Path): void {
  for (const step of path) {
    switch (step[0]) {
      case 'move':
        document.moveTo(step[1], step[2])
        break
      case 'line':
        document.lineTo(step[1], step[2])
        break
      case 'curve':
        document.bezierCurveTo(step[1], step[2], step[3], step[4], step[5], step[6])
        break
      case 'close':
        document.closePath()
    }
  }
}

function paintPath(document: PDFKit.PDFDocument, paint: Paint): void {
  if (paint.paint === 'stroke') {
    document.lineWidth(paint.width).lineCap(paint.cap).lineJoin('round').stroke(paint.colour)
    return
  }
  if (paint.opacity === 1) {
    document.fill(paint.colour, 'even-odd')
    return
  }
  // An opacity holds until it is set again, so it gets a state of its own; path and paint must not be parted by it.
  document.fillOpacity(paint.opacity).fill(paint.colour, 'even-odd').fillOpacity(1)
}

function setText(document: PDFKit.PDFDocument, run: TextRun, how: { stroke: boolean; fill: boolean }): void {
  document
    .font(fontName(run.weight))
    .fontSize(run.size)
    .text(run.text, run.x, run.y, {
      lineBreak: false,
      baseline: 'alphabetic',
      characterSpacing: run.tracking,
      ...how,
    })
}
