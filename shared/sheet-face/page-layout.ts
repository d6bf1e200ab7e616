import type { Box } from '../geometry/box'
import type { Millimetres, XY } from '../units'

export type { Box } from '../geometry/box'

/** White edges around the map face: room for its figures (latitudes on the right are the widest), and for the scale
 *  bar below. */
export const EDGE = { left: 18, top: 18, bottom: 36, gutter: 22, right: 14 } as const
/** Narrowest column that a legend can be read in. */
export const LEGEND_WIDTH: Millimetres = 110

/** Bounding box of a neatline, sheet metres. */
export function neatlineBounds(neatline: readonly (readonly [number, number])[]): { min: XY; max: XY } {
  const east = neatline.map((point) => point[0])
  const north = neatline.map((point) => point[1])
  return { min: [Math.min(...east), Math.min(...north)], max: [Math.max(...east), Math.max(...north)] }
}

/** Size of the map face on paper. */
export function faceSize(
  neatline: readonly (readonly [number, number])[],
  scale: number,
): { width: Millimetres; height: Millimetres } {
  const { min, max } = neatlineBounds(neatline)
  return { width: ((max[0] - min[0]) * 1000) / scale, height: ((max[1] - min[1]) * 1000) / scale }
}

/** Where things lie on the printed page. The map face stands at the upper left, the legend column right of it. */
export interface PageLayout {
  page: { width: Millimetres; height: Millimetres }
  face: Box
  margin: Box
}

/** Lays out the page of a sheet. */
export function pageLayout(sheet: {
  neatline: readonly (readonly [number, number])[]
  scale: number
  page: { width: Millimetres; height: Millimetres }
}): PageLayout {
  const { width, height } = faceSize(sheet.neatline, sheet.scale)
  const face = { x: EDGE.left, y: sheet.page.height - EDGE.top - height, width, height }
  const x = face.x + width + EDGE.gutter
  return {
    page: sheet.page,
    face,
    margin: {
      x,
      y: EDGE.right,
      width: sheet.page.width - x - EDGE.right,
      height: sheet.page.height - EDGE.top - EDGE.right,
    },
  }
}

/** ISO 216 A sizes, millimetres, short side first. */
export const isoPages = {
  A4: [210, 297],
  A3: [297, 420],
  A2: [420, 594],
  A1: [594, 841],
  A0: [841, 1189],
} as const

/** Whether a map face of this size, with its edges and a legend column, fits a page. */
export const fitsPage = (
  face: { width: Millimetres; height: Millimetres },
  page: { width: Millimetres; height: Millimetres },
): boolean =>
  face.width + EDGE.left + EDGE.gutter + LEGEND_WIDTH + EDGE.right <= page.width &&
  face.height + EDGE.top + EDGE.bottom <= page.height

/** The smallest ISO page, lying or standing, on which a map face of this size fits; undefined if none is large enough. */
export function proposePage(face: {
  width: Millimetres
  height: Millimetres
}): { name: string; width: Millimetres; height: Millimetres } | undefined {
  const pages = Object.entries(isoPages).flatMap(([name, [short, long]]) => [
    { name: `${name} landscape`, width: long, height: short },
    { name: `${name} portrait`, width: short, height: long },
  ])
  return pages.find((page) => fitsPage(face, page))
}
