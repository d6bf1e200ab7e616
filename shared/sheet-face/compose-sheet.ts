import type { Face } from '../api/faces'
import type { Page } from '../api/sheets'
import { printed } from '../symbols/one-ink'
import { composeFace, type SheetPart } from './compose-face'
import { composeMargin, sheetFaceOf, type SheetFaceInput } from './compose-margin'

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
  const { printing } = sheetFaceOf(items)
  const parts: SheetPart[] = [
    ...composeFace(sheet, items, faces, printing),
    { words: 'legend and statements', draw: () => margin.marks },
  ]
  return {
    outcome: 'composed',
    page: sheet.page,
    parts: parts.map(({ words, draw }) => ({ words, draw: () => printed(draw(), printing) })),
  }
}
