import { describe, expect, it } from 'vitest'
import { contrast, labelReadsOn } from '@shared/legend/colours'
import type { UnitProperties } from '@shared/items/legend'
import type { DisplayList } from '@shared/symbols/display-list'
import { drawFace } from '@shared/symbols/draw-face'
import { lineSymbolOf } from '@shared/symbols/draw-item'
import { printed } from '@shared/symbols/one-ink'
import { polyline } from '@shared/symbols/paths'
import { boundsOf } from '@shared/symbols/place-marks'
import { colourFill, unitFills } from '@shared/symbols/unit-fill'
import { drawUnitSwatch } from '@shared/symbols/unit-swatch'

const unit = (id: string, rank: number, pattern: UnitProperties['pattern'] = 'none', colour = '#cf9d87') => ({
  id,
  properties: { colour, pattern, rank },
})
const square = polyline(
  [
    [0, 0],
    [10, 0],
    [10, 10],
    [0, 10],
  ],
  true,
)

/** Every ink of a list, groups included. */
const inksOf = (list: DisplayList): string[] =>
  list.flatMap((mark) => {
    if (mark.mark === 'group') return inksOf(mark.marks)
    return [mark.ink, ...(mark.mark === 'text' && mark.halo ? [mark.haloInk ?? 'paper'] : [])]
  })

describe('the fill of a unit in colour', () => {
  it('is its colour, and over it its pattern', () => {
    expect(drawFace(square, colourFill({ colour: '#cf9d87', pattern: 'none' }), [0, 0])).toEqual([
      { mark: 'fill', path: square, ink: '#cf9d87' },
    ])
    const [fill, pattern] = drawFace(square, colourFill({ colour: '#cf9d87', pattern: 'shale' }), [3, 4])
    expect(fill?.mark).toBe('fill')
    expect(pattern).toMatchObject({ mark: 'pattern', tile: { id: 'shale' }, anchor: [3, 4] })
  })

  it('has its pattern stand back behind linework, yet be seen', () => {
    for (const colour of ['#cf9d87', '#f4ecd2', '#93b3a5', '#dcc08b']) {
      const ink = colourFill({ colour, pattern: 'granite' }).pattern?.ink ?? ''
      expect(contrast(ink, colour)).toBeGreaterThan(2)
      expect(contrast(ink, colour)).toBeLessThan(contrast('#1f1b16', colour) / 1.8)
    }
  })
})

describe('fills in one ink', () => {
  it('tell patterned units by their pattern alone, in black on paper', () => {
    const fill = unitFills([unit('a', 1, 'limestone')], 'one-ink').get('a')
    expect(fill).toMatchObject({ pattern: { tile: { id: 'limestone' }, ink: 'black' } })
    expect(fill?.ground).toBeUndefined()
  })

  it('tell others by greys on which letters read, each other than its neighbours’', () => {
    const units = [3, 1, 2, 5, 4].map((rank) => unit(`u${rank}`, rank))
    const fills = unitFills(units, 'one-ink')
    const grounds = [1, 2, 3, 4, 5].map((rank) => fills.get(`u${rank}`)?.ground)
    expect(new Set(grounds).size).toBe(5)
    for (const ground of grounds.filter((grey) => grey !== undefined)) {
      expect(ground).toMatch(/^#(..)\1\1$/)
      expect(labelReadsOn(ground)).toBe(true)
    }
  })

  it('leave patterned units out of the turn of greys', () => {
    const fills = unitFills([unit('a', 1), unit('b', 2, 'shale'), unit('c', 3)], 'one-ink')
    expect(fills.get('a')?.ground).not.toBe(fills.get('c')?.ground)
  })
})

describe('a list printed in one ink', () => {
  const list: DisplayList = [
    { mark: 'stroke', path: square, width: 0.2, ink: 'fold' },
    {
      mark: 'group',
      name: 'labels',
      marks: [
        {
          mark: 'text',
          text: 'Dr',
          at: [0, 0],
          size: 3,
          weight: 700,
          ink: 'quiet',
          align: 'middle',
          halo: 0.3,
        },
        { mark: 'fill', path: square, ink: '#cf9d87' },
      ],
    },
  ]

  it('has black lines and letters, white halos, and greys for colours', () => {
    const [line, letters, halo, colour = ''] = inksOf(printed(list, 'one-ink'))
    expect([line, letters, halo]).toEqual(['#000000', '#000000', '#ffffff'])
    expect(colour).toMatch(/^#(..)\1\1$/)
    // As light as the colour was: no contrast between them but for rounding to whole channels.
    expect(contrast(colour, '#cf9d87')).toBeLessThan(1.01)
  })

  it('is left as it is in colour', () => {
    expect(printed(list, 'colour')).toBe(list)
  })

  it('leaves nothing of the oxide red of folds', () => {
    const { ink } = lineSymbolOf({
      kind: 'axial-trace',
      properties: { form: 'anticline' },
    } as Parameters<typeof lineSymbolOf>[0])
    expect(ink).toBe('fold')
    expect(inksOf(printed([{ mark: 'stroke', path: square, width: 0.5, ink }], 'one-ink'))).toEqual([
      '#000000',
    ])
  })
})

describe('a unit’s swatch', () => {
  it('keeps long labels inside', () => {
    const fill = colourFill({ colour: '#cf9d87', pattern: 'none' })
    for (const label of ['Q', 'Dr', 'WWWWWWWWWWWW']) {
      const text = drawUnitSwatch({ label }, fill, { width: 10, height: 6 }).filter(
        (mark) => mark.mark === 'text',
      )
      const bounds = boundsOf(text)
      expect(bounds?.x).toBeGreaterThan(0)
      expect((bounds?.x ?? 0) + (bounds?.width ?? 99)).toBeLessThan(10)
    }
  })

  it('parts its letters from a pattern by a halo of its ground', () => {
    const swatch = (pattern: UnitProperties['pattern']) =>
      drawUnitSwatch({ label: 'Dr' }, colourFill({ colour: '#cf9d87', pattern }), { width: 10, height: 6 })
    expect(swatch('none').at(-1)).not.toHaveProperty('halo')
    expect(swatch('chert').at(-1)).toMatchObject({ mark: 'text', haloInk: '#cf9d87' })
  })
})
