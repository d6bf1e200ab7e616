import { describe, expect, it } from 'vitest'
import type { Sheet } from '@shared/api/sheets'
import { itemSchema, type Item } from '@shared/items/item'
import { CAUTION } from '@shared/sheet-face/caution'
import { composeMargin } from '@shared/sheet-face/compose-margin'
import { pageLayout } from '@shared/sheet-face/page-layout'
import type { DisplayList, Mark, TextMark } from '@shared/symbols/display-list'
import { textCorners } from '@shared/symbols/text-box'
import {
  aPrintedSheet,
  mapItems,
  rectangleRing,
  released,
  textsOf,
  unitItems,
} from '../../../support/printed-sheet'

const composed = (sheet: Sheet, items: Item[]): DisplayList => {
  const outcome = composeMargin({ sheet, items, edition: released })
  if (outcome.outcome !== 'composed') throw new Error(outcome.reason)
  return outcome.marks
}

interface Extent {
  left: number
  right: number
  bottom: number
  top: number
}

function extentOf(mark: Mark): Extent {
  const points =
    mark.mark === 'text'
      ? textCorners(mark)
      : mark.mark === 'group'
        ? []
        : mark.path.flatMap((step): [number, number][] => {
            if (step[0] === 'close') return []
            return step[0] === 'curve' ? [[step[5], step[6]]] : [[step[1], step[2]]]
          })
  const [xs, ys] = [points.map((point) => point[0]), points.map((point) => point[1])]
  return { left: Math.min(...xs), right: Math.max(...xs), bottom: Math.min(...ys), top: Math.max(...ys) }
}

const overlap = (a: Extent, b: Extent): boolean =>
  a.left < b.right - 0.01 && b.left < a.right - 0.01 && a.bottom < b.top - 0.01 && b.bottom < a.top - 0.01

/** Text as one reads it, lines run together. */
const wordsOf = (list: DisplayList): string =>
  textsOf(list)
    .map((text) => text.text)
    .join(' ')
    .replaceAll('\u00a0', ' ')
    // A line may end after a hyphen.
    .replaceAll('- ', '-')

const small = aPrintedSheet({
  neatline: rectangleRing(284_000, 5_278_000, 289_000, 5_283_000),
  page: { width: 420, height: 297 },
})

/** As small as a page is proposed: the scale bar has exactly the room that the layout leaves for it. */
const tiny = aPrintedSheet({
  neatline: rectangleRing(284_000, 5_278_000, 286_200, 5_281_740),
  page: { width: 297, height: 210 },
})

describe.each([
  ['A1, 10 units', aPrintedSheet(), unitItems(10)],
  ['A1, 60 units with long descriptions', aPrintedSheet(), unitItems(60, 30)],
  ['A3, 12 units', small, unitItems(12, 10)],
  ['A3, 45 units', small, unitItems(45, 4)],
  ['A3 without a legend', small, []],
  ['A4, 6 units', tiny, unitItems(6, 5)],
])('the margin of %s', (_, sheet, units) => {
  const items = [...units, ...mapItems()]
  const list = composed(sheet, items)
  const { page, face } = pageLayout(sheet)

  it('stays on the page and off the map face', () => {
    const onFace: Extent = {
      left: face.x,
      right: face.x + face.width,
      bottom: face.y,
      top: face.y + face.height,
    }
    for (const mark of list) {
      const extent = extentOf(mark)
      expect(extent.left).toBeGreaterThanOrEqual(5)
      expect(extent.right).toBeLessThanOrEqual(page.width - 5)
      expect(extent.bottom).toBeGreaterThanOrEqual(5)
      expect(extent.top).toBeLessThanOrEqual(page.height - 5)
      expect(overlap(extent, onFace)).toBe(false)
    }
  })

  it('sets no text over another', () => {
    const texts = textsOf(list)
    const extents = texts.map((text): [TextMark, Extent] => [text, extentOf(text)])
    const clashes = extents.flatMap(([text, extent], index) =>
      extents
        .slice(index + 1)
        .filter(([, other]) => overlap(extent, other))
        .map(([other]) => `${text.text} / ${other.text}`),
    )
    expect(clashes).toEqual([])
  })

  it('leaves out nothing: every unit with its words, every symbol in use, caution, scale, projection', () => {
    const words = wordsOf(list)
    for (const item of units) {
      if (item.kind !== 'unit') continue
      expect(words).toContain(item.properties.name)
      expect(words).toContain(item.properties.description)
    }
    for (const title of [
      'Contact, certain',
      'Contact, approximate',
      'Bedding, inclined',
      'Bedding, horizontal',
    ]) {
      expect(words).toContain(title)
    }
    expect(words).not.toContain('Bedding, overturned')
    expect(words).toContain(CAUTION)
    expect(words).toContain('1:24 000')
    expect(words).toContain('Projection: UTM zone 26N. Datum: WGS 84 (EPSG:32626).')
    expect(words).toContain('west of true north')
    expect(words).toContain('Approved by Edda Marr')
  })
})

describe('what cannot be printed', () => {
  const reasonFor = (sheet: Sheet, items: Item[]): string => {
    const outcome = composeMargin({ sheet, items, edition: released })
    return outcome.outcome === 'cannot-print' ? outcome.reason : ''
  }

  it('says so when the legend is too long for the page, and what to do', () => {
    const reason = reasonFor(small, unitItems(200, 30))
    expect(reason).toContain('200 units')
    expect(reason).toContain('larger page')
  })

  it('says so when the page leaves no room beside or below the map face', () => {
    expect(reasonFor({ ...small, page: { width: 280, height: 297 } }, [])).toContain('wider page')
    expect(reasonFor({ ...small, page: { width: 420, height: 240 } }, [])).toContain('higher page')
  })

  it('names a character that the printed type does not have, instead of printing a box', () => {
    const [unit] = unitItems(1)
    if (unit?.kind !== 'unit') throw new Error('The builder makes units.')
    const cyrillic = itemSchema.parse({ ...unit, properties: { ...unit.properties, name: 'Holm Ж' } })
    expect(reasonFor(small, [cyrillic])).toContain('“Ж”')
  })
})
