import type { Metres, XY } from '@shared/units'

/** Screen pixels (CSS pixels). */
export type Px = number
/** A place on screen: px right of and below the map's upper left corner. */
export type PxPoint = [x: Px, y: Px]

/** Pixels of one printed millimetre at 100 %: CSS defines 96 px as an inch of 25.4 mm. Source: CSS Values 4, section 6.2. */
export const PRINT_PX_PER_MM = 96 / 25.4
/** Symbols shrink with the sheet only down to a share of print size at which they can still be read: with the whole sheet
 *  on a large screen the numerals of a 2.5 mm type are some 9 px high. Farther out they give way a little more. */
const LEAST_SYMBOL_SHARE = { least: 0.78, most: 0.95, base: 0.55, perShare: 0.9 } as const

/** What of the sheet is on screen. North is up; the view never turns. */
export interface ViewFrame {
  center: XY
  pxPerMetre: number
  width: Px
  height: Px
}

/** Sheet metres → px. */
export const toPx = (view: ViewFrame, [east, north]: readonly [Metres, Metres]): PxPoint => [
  view.width / 2 + (east - view.center[0]) * view.pxPerMetre,
  view.height / 2 - (north - view.center[1]) * view.pxPerMetre,
]

/** px → sheet metres. */
export const fromPx = (view: ViewFrame, [x, y]: PxPoint): XY => [
  view.center[0] + (x - view.width / 2) / view.pxPerMetre,
  view.center[1] - (y - view.height / 2) / view.pxPerMetre,
]

/** Share of print size at which the ground is shown; 1 is 100 %. */
export const printShare = (pxPerMetre: number, scaleDenominator: number): number =>
  (pxPerMetre * scaleDenominator) / 1000 / PRINT_PX_PER_MM

/** Ground pixels at a share of print size. */
export const pxPerMetreAt = (share: number, scaleDenominator: number): number =>
  (share * 1000 * PRINT_PX_PER_MM) / scaleDenominator

/** Pixels of one symbol millimetre: as the sheet's own down to where symbols could no longer be read. Above print size
 *  they grow with the sheet, or keep the size they have at 100 %. */
export function symbolPxPerMm(share: number, above: 'print' | 'screen'): number {
  const { least, most, base, perShare } = LEAST_SYMBOL_SHARE
  const readable = Math.min(most, Math.max(least, base + perShare * share))
  const shown = Math.max(readable, above === 'screen' ? Math.min(1, share) : share)
  return PRINT_PX_PER_MM * shown
}

/** How large the ground is shown beside its symbols: 1 where both are as in print, less where the ground is the smaller.
 *  @returns also the size of a symbol millimetre, px */
export function relativeScale(
  view: Pick<ViewFrame, 'pxPerMetre'>,
  scaleDenominator: number,
  above: 'print' | 'screen',
): { scale: number; symbolPx: number } {
  const share = printShare(view.pxPerMetre, scaleDenominator)
  const symbolPx = symbolPxPerMm(share, above)
  return { scale: (share * PRINT_PX_PER_MM) / symbolPx, symbolPx }
}
