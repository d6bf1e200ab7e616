import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { composeSpecimenPages, specimenPage } from '@shared/specimen/compose-pages'
import { enlarge } from '@shared/specimen/enlarge'
import { composeSpecimen } from '@shared/specimen/specimen'
import type { DisplayList } from '@shared/symbols/display-list'
import { comparePictures } from '../support/surface-pictures/compare'
import { openSurfacePictures, type SurfacePictures } from '../support/surface-pictures/pictures'
import { textsOf } from '../support/printed-sheet'

/** 203 dpi. */
const PX_PER_MM = 8
/** Share of a page's pixels that may differ beyond smoothed edges. Canvas and SVG are drawn by one browser; PDF by poppler,
 *  which smooths edges in another way: there a fifth of the way between two colours counts as none. Measured: a tenth of the
 *  first, four fifths of the second. */
const SAME_BROWSER = 0.0001
const ANOTHER_RENDERER = { share: 0.002, tolerance: 0.2 }
/** On pages with area patterns cells begin between two pixels, where each renderer smooths them as it likes. Patterns are
 *  compared more closely, on whole pixels, in patterns.test.ts. */
const PATTERNED = 0.008

let pictures: SurfacePictures
beforeAll(async () => {
  pictures = await openSurfacePictures()
})
afterAll(() => pictures.close())

/** Every symbol and case at true size, in colour and in one ink: enlarged ones are the same marks. */
const pages = composeSpecimenPages(composeSpecimen())
  .map((list, index) => ({ number: index + 1, list }))
  .filter(({ list }) => textsOf(list).some(({ text }) => text.startsWith('True size')))

const hasPatterns = (list: DisplayList): boolean =>
  list.some((mark) => mark.mark === 'pattern' || (mark.mark === 'group' && hasPatterns(mark.marks)))

describe('the specimen on canvas, in SVG and in PDF', () => {
  it.each(pages)('is one picture on page $number', async ({ list }) => {
    const request = { list, size: specimenPage, pxPerMm: PX_PER_MM }
    const canvas = await pictures.draw('canvas', request)
    const svg = comparePictures(canvas, await pictures.draw('svg', request))
    expect(svg.share).toBeLessThanOrEqual(hasPatterns(list) ? PATTERNED : SAME_BROWSER)
    const pdf = comparePictures(canvas, await pictures.draw('pdf', request), ANOTHER_RENDERER.tolerance)
    expect(pdf.share).toBeLessThanOrEqual(hasPatterns(list) ? PATTERNED : ANOTHER_RENDERER.share)
  })

  it('would not be, were its symbols a third of a millimetre off', async () => {
    const [first] = pages
    if (!first) throw new Error('The specimen has no page.')
    const request = { list: first.list, size: specimenPage, pxPerMm: PX_PER_MM }
    const moved = enlarge(first.list, 1, [0.3, 0])
    const off = await pictures.draw('canvas', { ...request, list: moved })
    const { share } = comparePictures(await pictures.draw('svg', request), off, ANOTHER_RENDERER.tolerance)
    expect(share).toBeGreaterThan(5 * ANOTHER_RENDERER.share)
  })
})
