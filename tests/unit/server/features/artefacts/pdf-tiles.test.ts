import { describe, expect, it } from 'vitest'
import { findPattern } from '@shared/symbols/definitions/lithology'
import type { Ink, Mark, PatternMark } from '@shared/symbols/display-list'
import { rectangle } from '@shared/sheet-face/rectangle'
import { sheetPdf } from '../../../../../server/features/artefacts/sheet-pdf'

const page = { width: 100, height: 80 }
const area = (lithology: 'shale' | 'granite', x: number, ink: Ink = 'black'): PatternMark => {
  const found = findPattern(lithology)
  if (!found) throw new Error(`There is no pattern of ${lithology}.`)
  return {
    mark: 'pattern',
    path: rectangle(x, 10, 20, 20),
    tile: found.tile,
    ink,
    anchor: [5, 5],
  }
}

/** The dictionaries of a document's tiling patterns, as they stand in the file. */
async function patternsIn(marks: Mark[]): Promise<string[]> {
  const facts = { title: 'Test', author: '', subject: '', at: new Date('2026-12-01T10:00:00Z') }
  const parts = [{ words: 'areas', draw: () => marks }]
  const bytes = await sheetPdf(page, parts, facts, () => Promise.resolve())
  return [...bytes.toString('latin1').matchAll(/<<[^<>]*\/PatternType 1[^<>]*>>/g)].map(([match]) => match)
}

describe('patterns in a PDF', () => {
  it('are true tiling patterns without a colour of their own', async () => {
    const [pattern = ''] = await patternsIn([area('shale', 10)])
    // ISO 32000-1, 8.7.3: pattern type 1 is tiling, paint type 2 uncoloured.
    expect(pattern).toMatch(/\/PaintType 2\b/)
    // The cell's size in points: 6 × 5 grid units of 12 dots of 1/300 inch.
    expect(Number(/\/XStep ([\d.]+)/.exec(pattern)?.[1])).toBeCloseTo((6 * 12 * 72) / 300, 3)
    expect(Number(/\/YStep ([\d.]+)/.exec(pattern)?.[1])).toBeCloseTo((5 * 12 * 72) / 300, 3)
  })

  it('are written once, however many areas and colours they fill', async () => {
    const marks = [area('shale', 10), area('shale', 40, '#8a7d64'), area('granite', 70), area('shale', 60)]
    expect(await patternsIn(marks)).toHaveLength(2)
  })
})
