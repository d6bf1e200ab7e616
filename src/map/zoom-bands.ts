/** Steps of zoom in which drawings are kept ready: a drawing made for a band serves all zooms in it, at most 4.5 % larger
 *  or smaller than the sheet's millimetres. */
const BANDS_PER_OCTAVE = 8

/** Band of a zoom; band 0 is the print itself, whole numbers below zero are farther out. Print size symbols do not leave
 *  band 0 when one zooms in; screen size ones go on to bands above.
 *  @param relative ground millimetres in symbol millimetres, as a share of those of the print */
export const bandOf = (relative: number): number => Math.round(Math.log2(relative) * BANDS_PER_OCTAVE) + 0

/** The zoom that a band's drawings are made for: exactly 1 for band 0. */
export const bandScale = (band: number): number => 2 ** (band / BANDS_PER_OCTAVE)
