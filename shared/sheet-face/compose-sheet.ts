import type { Face } from '../api/faces'
import type { Page } from '../api/sheets'
import { composeFace, type SheetPart } from './compose-face'
import { composeMargin, type SheetFaceInput } from './compose-margin'

export type { SheetPart } from './compose-face'

/** The whole printed page, ready to be drawn by any surface: page millimetres, y up, origin at the lower left. */
export type SheetComposition =
  | { outcome: 'composed'; page: Page; parts: SheetPart[] }
  /** The page cannot hold what must stand on it. The reason is a plain sentence; it stops a release. */
  | { outcome: 'cannot-print'; reason: string }

/** Composes the printed page of a sheet: the map face at its scale within its frame, and everything around it. */
export function composeSheet(input: SheetFaceInput & { faces: readonly Face[] }): SheetComposition {
  const margin = composeMargin(input)
  if (margin.outcome === 'cannot-print') return margin
  const { sheet, items, faces } = input
  return {
    outcome: 'composed',
    page: sheet.page,
    parts: [
      ...composeFace(sheet, items, faces),
      { words: 'legend and statements', draw: () => margin.marks },
    ],
  }
}
