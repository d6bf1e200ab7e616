import type { Sheet } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'
import { composeMargin } from '@shared/sheet-face/compose-margin'

/** Why a revision could not be printed as the next edition of its sheet; null if it can. Asked before submission and
 *  approval, while the sheet can still be mended: an approved sheet is read-only. */
export function printObstacle(
  sheet: Sheet,
  items: readonly Item[],
  since: number,
  approvedBy: string,
): string | null {
  const edition = {
    edition: (sheet.edition ?? 0) + 1,
    revision: Math.max(since, sheet.revision),
    released: { at: new Date().toISOString(), approvedBy },
  }
  const outcome = composeMargin({ sheet, items, edition })
  return outcome.outcome === 'cannot-print' ? outcome.reason : null
}
