import { expect, it } from 'vitest'
import {
  angleInWords,
  groupThousands,
  kilometreFigure,
  latitudeFigure,
  longitudeFigure,
} from '@shared/sheet-face/figures'
import { convergenceWords } from '@shared/sheet-face/north-diagram'
import { citation, dayInWords, editionLine } from '@shared/sheet-face/edition-statement'
import { latoCodePoints } from '@shared/symbols/lato-widths'
import { utmConvergence } from '../../../reference/geodesy'
import { released } from '../../../support/printed-sheet'

const plain = (text: string): string => text.replaceAll('\u00a0', ' ')

it('writes degrees, minutes and seconds with the carry that rounding needs', () => {
  expect(plain(latitudeFigure(47.625))).toBe(`47°37'30" N`)
  expect(plain(longitudeFigure(-29.8333333333))).toBe(`29°50'00" W`)
  expect(plain(longitudeFigure(-29.8333333333, true))).toBe(`29°50' W`)
  expect(plain(latitudeFigure(-37.99999999))).toBe(`38°00'00" S`)
})

it('groups thousands and writes kilometres', () => {
  expect(plain(groupThousands(24_000))).toBe('24 000')
  expect(plain(groupThousands(1_000_000))).toBe('1 000 000')
  expect(kilometreFigure(286_500)).toBe('286.5')
  expect(kilometreFigure(5_278_000)).toBe('5278')
})

it('says on which side of true north grid north lies', () => {
  // Source: reference/geodesy.md sections 1 and 3: positive is clockwise, east of the central meridian in the north.
  const eastern = utmConvergence.find(({ lat, lon }) => lat === 45 && lon === 6)
  const western = utmConvergence.find(({ lat, lon }) => lat === 45 && lon === 0)
  expect(convergenceWords(eastern?.convergence ?? 0)).toContain(`2°07' east of true north`)
  expect(convergenceWords(western?.convergence ?? 0)).toContain(`2°07' west of true north`)
  expect(convergenceWords(0.004)).toContain('agree')
  expect(angleInWords(-0.999)).toBe(`1°00' west`)
})

it('names the edition and how to cite it', () => {
  expect(dayInWords('2026-12-01T23:59:00.000Z')).toBe('1 December 2026')
  const sheet = { number: 'MI-14', title: 'Gannet Head', scale: 24_000 }
  expect(editionLine('MI-14', released)).toContain('edition 1, 1 December 2026')
  expect(editionLine('MI-14', { ...released, released: null })).toContain('draft toward edition 1')
  expect(citation(sheet, 'Kelp, R.', released)).toBe(
    'Kelp, R., 2026. Geologic map of Gannet Head. Sheet MI-14, scale 1:24\u00a0000, edition 1.',
  )
  expect(citation(sheet, '', released)).toMatch(/^Geologic map of Gannet Head, 2026\. Sheet MI-14/)
})

it('uses only letters that the printed type has', () => {
  const texts = [latitudeFigure(-1.5), longitudeFigure(1.5), groupThousands(24_000), kilometreFigure(-1000)]
  for (const letter of texts.join('')) expect(latoCodePoints).toContain(letter.codePointAt(0))
})
