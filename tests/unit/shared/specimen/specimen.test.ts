import { describe, expect, it } from 'vitest'
import { lithologies } from '@shared/items/lithology'
import { caseIn, levelBoxes } from '@shared/specimen/entry'
import { factLines, publishedWords } from '@shared/specimen/facts'
import { lineAttributeCases } from '@shared/specimen/line-cases'
import { pointAttributeCases } from '@shared/specimen/point-cases'
import { composeSpecimen } from '@shared/specimen/specimen'
import { attitudes } from '@shared/symbols/definitions/attitudes'
import { lineations } from '@shared/symbols/definitions/lineations'
import { places } from '@shared/symbols/definitions/points'
import type { DisplayList } from '@shared/symbols/display-list'
import { lineSymbols } from '@shared/symbols/draw-item'
import { legendEntries } from '@shared/symbols/legend-entries'

const specimen = composeSpecimen()
const entries = specimen.flatMap((family) => family.entries)
const entryOf = (id: string) => {
  const entry = entries.find((each) => each.id === id)
  if (!entry) throw new Error(`The specimen has no ${id}.`)
  return entry
}
const inksOf = (list: DisplayList): string[] =>
  list.flatMap((mark) => (mark.mark === 'group' ? inksOf(mark.marks) : [mark.ink]))

describe('the specimen', () => {
  it('holds every symbol of the set once', () => {
    const ids = entries.map(({ id }) => id)
    expect(new Set(ids).size).toBe(ids.length)
    for (const { id } of lineSymbols) expect(ids).toContain(id)
    for (const { type } of attitudes) expect(ids).toContain(`attitude.${type}`)
    for (const { type } of lineations) expect(ids).toContain(`lineation.${type}`)
    for (const { type } of places) expect(ids).toContain(`station.${type}`)
    for (const id of lithologies) expect(ids).toContain(`lithology.${id}`)
  })

  it('has cases for every attribute that drives a symbol', () => {
    for (const { drivenBy } of lineSymbols) {
      for (const attribute of drivenBy) expect(Object.keys(lineAttributeCases)).toContain(attribute)
    }
    for (const { drivenBy } of [...attitudes, ...lineations, ...places]) {
      for (const attribute of drivenBy) expect(Object.keys(pointAttributeCases)).toContain(attribute)
    }
  })

  it('draws something in every case, and names no two cases of a symbol alike', () => {
    for (const { id, cases } of entries) {
      expect(cases.length, id).toBeGreaterThan(0)
      expect(new Set(cases.map(({ caption }) => caption)).size, id).toBe(cases.length)
      for (const each of cases) expect(each.marks.length, `${id}: ${each.caption}`).toBeGreaterThan(0)
    }
  })

  it('shows every point that the legend explains', () => {
    const points = legendEntries.filter(({ group }) => group === 'points')
    const shown = specimen
      .filter(({ id }) => ['attitudes', 'lineations', 'places'].includes(id))
      .flatMap((family) => family.entries.flatMap((entry) => entry.cases))
    expect(shown.length).toBeGreaterThan(points.length)
  })

  it('shows the four location confidences of every line, certain and questioned', () => {
    for (const { id } of lineSymbols) {
      const captions = entryOf(id).cases.map(({ caption }) => caption)
      for (const confidence of ['certain', 'approximate', 'inferred', 'concealed']) {
        expect(captions).toContain(confidence)
        expect(captions).toContain(`${confidence}, questioned`)
      }
    }
  })

  it('turns a symbol all round the compass', () => {
    const rose = entryOf('attitude.bedding').cases.find(({ caption }) => caption.startsWith('strikes'))
    const figures = rose?.marks.filter((mark) => mark.mark === 'text' && mark.text === '35') ?? []
    expect(figures).toHaveLength(16)
  })

  it('reads dimensions from the definitions: a contact, the tick of bedding, the teeth of a thrust', () => {
    const words = (id: string) => factLines(entryOf(id)).join(' ').replaceAll('\u00a0', ' ')
    expect(words('contact')).toContain('Line 0.2 mm; approximate dash 3.5 mm, gap 0.75 mm')
    expect(words('attitude.bedding')).toContain('Strike line 5.6 mm; mark down dip 1.3 mm')
    expect(words('fault.thrust')).toMatch(/decoration 2\.3 × 1\.9\d? mm, about every 9 mm/)
  })

  it('gives published numbers where they were verified, and says so where none was', () => {
    expect(publishedWords(entryOf('contact').published)).toBe(
      'FGDC-STD-013-2006: 1.1.1 (certain), 1.1.2 (certain, queried), 1.1.3 (approximate), 1.1.4 (approximate, queried)',
    )
    expect(publishedWords(entryOf('fault.thrust').published)).toBe('No published number verified.')
  })

  it('uses only blacks, greys and white in one ink', () => {
    for (const each of entries.flatMap(({ cases }) => cases)) {
      for (const ink of inksOf(caseIn(each, 'one-ink'))) expect(ink).toMatch(/^#(..)\1\1$/)
    }
  })

  it('draws a pattern over its colour, and in one ink on paper', () => {
    const swatch = entryOf('lithology.limestone').cases[0]
    if (!swatch) throw new Error('There is no swatch.')
    const kinds = (list: DisplayList) => list.map(({ mark }) => mark)
    expect(kinds(caseIn(swatch, 'colour'))).toEqual(['fill', 'pattern', 'stroke'])
    expect(kinds(caseIn(swatch, 'one-ink'))).toEqual(['pattern', 'stroke'])
  })

  it('levels small cases of one symbol', () => {
    const boxes = levelBoxes(entryOf('fault.normal').cases)
    expect(new Set(boxes.map(({ y, height }) => `${y} ${height}`)).size).toBe(1)
  })
})
