import { describe, expect, it } from 'vitest'
import { fitPage, pageBoxes, type PageGround } from '@/map/page-boxes'
import { fromPx, printShare, pxPerMetreAt, symbolPxPerMm, toPx, type ViewFrame } from '@/map/view-frame'

const ground: PageGround = { min: [284_000, 5_278_000], max: [294_000, 5_289_000], scale: 24_000 }
/** Desk left of the slips at 1680 × 1050 and at 1280 × 800. */
const desks = [
  { width: 1240, height: 970 },
  { width: 934, height: 720 },
]
/** A pixel: where things lie is rounded by nobody, so that this is generous. */
const PIXEL = 1

describe('the page on its desk', () => {
  it.each(desks)('fits whole, centred, with its margin column, on %o', (size) => {
    const view: ViewFrame = { ...size, ...fitPage(size, ground, 'print') }
    const { paper, face, margin } = pageBoxes(view, ground, 'print')
    expect(paper.left).toBeGreaterThan(0)
    expect(paper.top).toBeGreaterThan(0)
    expect(Math.abs(paper.left - (size.width - paper.left - paper.width))).toBeLessThan(PIXEL)
    expect(Math.abs(paper.top - (size.height - paper.top - paper.height))).toBeLessThan(PIXEL)
    expect(margin.where).toBe('page')
    expect(margin.left).toBeGreaterThan(face.left + face.width)
    expect(margin.left + margin.width).toBeLessThan(paper.left + paper.width)
    expect(face.width).toBeGreaterThan(size.width * 0.4)
  })

  it.each(desks)('without its margin has the map face in its middle, and larger, on %o', (size) => {
    const bare = { ...ground, bare: true }
    const fit = fitPage(size, bare, 'print')
    const { paper, face } = pageBoxes({ ...size, ...fit }, bare, 'print')
    const [left, right] = [face.left - paper.left, paper.left + paper.width - face.left - face.width]
    expect(Math.abs(left - right)).toBeLessThan(PIXEL)
    expect(Math.abs(paper.left - (size.width - paper.left - paper.width))).toBeLessThan(PIXEL)
    expect(fit.pxPerMetre).toBeGreaterThanOrEqual(fitPage(size, ground, 'print').pxPerMetre)
  })

  it('docks the margin at the right edge once the page’s own has left the view', () => {
    const [size = { width: 0, height: 0 }] = desks
    const fit = fitPage(size, ground, 'print')
    const near: ViewFrame = { ...size, center: [289_000, 5_283_000], pxPerMetre: fit.pxPerMetre * 4 }
    const { margin } = pageBoxes(near, ground, 'print')
    expect(margin).toMatchObject({ where: 'docked', top: 0, height: size.height })
    expect(margin.left + margin.width).toBe(size.width)
  })
})

describe('places and sizes on screen', () => {
  const view: ViewFrame = { center: [289_000, 5_283_500], pxPerMetre: 0.05, width: 800, height: 600 }

  it('go there and back', () => {
    expect(toPx(view, [289_000, 5_283_500])).toEqual([400, 300])
    expect(fromPx(view, toPx(view, [285_432.1, 5_279_876.5]))).toEqual([
      expect.closeTo(285_432.1, 6),
      expect.closeTo(5_279_876.5, 6),
    ])
  })

  it('show 1 km of a 1:24 000 sheet as 41.67 mm at 100 %, 96 px to the inch', () => {
    expect(pxPerMetreAt(1, 24_000) * 1000).toBeCloseTo((41.6667 * 96) / 25.4, 2)
    expect(printShare(pxPerMetreAt(1, 24_000), 24_000)).toBeCloseTo(1, 12)
  })

  it('keep symbols readable far out, and above 100 % follow the choice', () => {
    const print = 96 / 25.4
    expect(symbolPxPerMm(0.1, 'print')).toBeGreaterThan(0.7 * print)
    expect(symbolPxPerMm(3, 'print')).toBeCloseTo(3 * print, 9)
    expect(symbolPxPerMm(3, 'screen')).toBeCloseTo(print, 9)
  })
})
