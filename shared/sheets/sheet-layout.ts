import type { Area, Crs, Page } from '../api/sheets'
import { sheetProjection } from '../geometry/projection'
import { faceSize, fitsPage, proposePage } from '../sheet-face/page-layout'
import type { LonLat, Millimetres, XY } from '../units'
import { sheetArea } from './sheet-area'
import { upperFirst } from '../words'

/** Smallest side of a map face that is still a map. */
export const SMALLEST_FACE: Millimetres = 10

/** How a new sheet would lie on its page; where something stands in the way, a sentence says what and how to mend it. */
export interface SheetLayout {
  /** Closed ring, sheet metres. */
  neatline: XY[]
  /** Closed ring, WGS 84 degrees. */
  footprint: LonLat[]
  face: { width: Millimetres; height: Millimetres }
  page: Page | undefined
  /** Why this page, or why it does not do. */
  reason: string
  fits: boolean
}

export type Layout =
  { outcome: 'layout'; layout: SheetLayout } | { outcome: 'refused'; field: 'srid' | 'area'; reason: string }

/** Lays out a sheet that is being created.
 *  @param scale denominator   @param chosen the page a person chose; undefined proposes one */
export function layOutSheet(area: Area, crs: Crs, scale: number, chosen: Page | undefined): Layout {
  let projection
  try {
    projection = sheetProjection(crs.proj4)
  } catch {
    return {
      outcome: 'refused',
      field: 'srid',
      reason: `${crs.name} uses a projection that is not supported.`,
    }
  }
  const found = sheetArea(area, projection, crs.proj4, scale)
  if (found.outcome === 'refused') return { outcome: 'refused', field: 'area', reason: found.reason }
  const face = faceSize(found.neatline, scale)
  if (face.width < SMALLEST_FACE || face.height < SMALLEST_FACE) {
    return {
      outcome: 'refused',
      field: 'area',
      reason: `The map face would be only ${sizeWords(face)}: choose a larger area or a larger scale.`,
    }
  }
  const footprint = found.neatline.map((corner) => projection.toLonLat(corner))
  return {
    outcome: 'layout',
    layout: { neatline: found.neatline, footprint, face, ...choosePage(face, chosen) },
  }
}

const sizeWords = ({ width, height }: { width: Millimetres; height: Millimetres }): string =>
  `${Math.round(width)} × ${Math.round(height)} mm`

function choosePage(
  face: SheetLayout['face'],
  chosen: Page | undefined,
): Pick<SheetLayout, 'page' | 'reason' | 'fits'> {
  const proposed = proposePage(face)
  const needs = `The map face is ${sizeWords(face)}`
  if (chosen) {
    const fits = fitsPage(face, chosen)
    const mend = proposed ? `${proposed.name} does` : 'no ISO page does: choose a smaller area or scale'
    return {
      page: chosen,
      fits,
      reason: fits
        ? `${needs} and fits with its legend column.`
        : `${needs}; with its legend column it does not fit this page. ${upperFirst(mend)}.`,
    }
  }
  if (!proposed) {
    return {
      page: undefined,
      fits: false,
      reason: `${needs}: larger than any ISO page holds with a legend. Choose a smaller area or a smaller scale.`,
    }
  }
  return {
    page: { width: proposed.width, height: proposed.height },
    fits: true,
    reason: `${needs}. ${proposed.name} (${sizeWords(proposed)}) is the smallest ISO page that holds it with its edges and a legend column.`,
  }
}
