import { describe, expect, it } from 'vitest'
import { composeSpecimenPages, settings, specimenPage } from '@shared/specimen/compose-pages'
import { enlarge } from '@shared/specimen/enlarge'
import { composeSpecimen } from '@shared/specimen/specimen'
import { boundsOf } from '@shared/symbols/place-marks'
import { textsOf } from '../../../support/printed-sheet'

const families = composeSpecimen()
const pages = composeSpecimenPages(families)
const words = pages.map((page) => textsOf(page).map(({ text }) => text))

describe('the pages of the specimen', () => {
  it('keep everything on the page, within its edges', () => {
    for (const page of pages) {
      const box = boundsOf(page)
      if (!box) throw new Error('A page is empty.')
      expect(box.x).toBeGreaterThan(10)
      expect(box.y).toBeGreaterThan(5)
      expect(box.x + box.width).toBeLessThan(specimenPage.width - 10)
      expect(box.y + box.height).toBeLessThan(specimenPage.height - 5)
    }
  })

  it('are numbered through, and say at which size and in which inks', () => {
    words.forEach((texts, index) => expect(texts).toContain(`Page ${index + 1} of ${pages.length}`))
    for (const title of [
      'True size, 100 % · in colour',
      'True size, 100 % · in one ink',
      'Four times true size, 400 % · in colour',
      'Four times true size, 400 % · in one ink',
    ]) {
      expect(words.some((texts) => texts.includes(title))).toBe(true)
    }
  })

  it('show every case in each of the four settings', () => {
    const captions = families.flatMap(({ entries }) => entries.flatMap(({ cases }) => cases))
    const vertical = captions.filter(({ caption }) => caption === 'vertical').length
    const shown = words.flat().filter((text) => text === 'vertical').length
    expect(vertical).toBeGreaterThan(5)
    expect(shown).toBe(vertical * settings.length)
  })
})

describe('a drawing under the magnifier', () => {
  it('grows in every length, letters, dashes and tiles too', () => {
    const [stroke, text] = enlarge(
      [
        {
          mark: 'stroke',
          path: [
            ['move', 1, 1],
            ['line', 3, 1],
          ],
          width: 0.2,
          ink: 'black',
          dash: [1, 0.5],
        },
        {
          mark: 'text',
          text: '35',
          at: [1, 2],
          size: 2,
          weight: 700,
          ink: 'black',
          align: 'middle',
          halo: 0.4,
        },
      ],
      4,
      [10, 20],
    )
    expect(stroke).toMatchObject({
      path: [
        ['move', 14, 24],
        ['line', 22, 24],
      ],
      width: 0.8,
      dash: [4, 2],
    })
    expect(text).toMatchObject({ at: [14, 28], size: 8, halo: 1.6 })
  })
})
