import { DOMParser } from '@xmldom/xmldom'
import { describe, expect, it } from 'vitest'
import type { DisplayList } from '@shared/symbols/display-list'
import { drawEntry, legendEntries } from '@shared/symbols/legend-entries'
import { polyline } from '@shared/symbols/paths'
import { toSvg } from '@shared/symbols/surfaces/svg'

/** Reads a text as XML, and fails on anything that is not well formed. */
const read = (text: string) =>
  new DOMParser({
    onError: (level, message) => {
      throw new Error(`${level}: ${message}`)
    },
  }).parseFromString(text, 'image/svg+xml')

const box = { x: 0, y: 0, width: 24, height: 8 }
const triangle = polyline(
  [
    [0, 0],
    [4, 0],
    [4, 4],
  ],
  true,
)

describe('a display list as SVG', () => {
  it.each(legendEntries)('is well formed for $title', (entry) => {
    const image = read(toSvg(drawEntry(entry, box), box))
    expect(image.documentElement?.getAttribute('width')).toBe('24mm')
    expect(image.documentElement?.getAttribute('viewBox')).toBe('0 0 24 8')
    expect(image.getElementsByTagName('path').length).toBeGreaterThan(0)
  })

  it('keeps any text a person may write, as text', () => {
    const text = `<b>&"'Dr</b>]]>\u0000\u0007 é`
    const list: DisplayList = [
      {
        mark: 'text',
        text,
        at: [2, 2],
        size: 3,
        weight: 400,
        ink: 'black',
        align: 'start',
        halo: 0.3,
        tracking: 0.2,
        turn: 30,
      },
    ]
    const [element] = [...read(toSvg(list, box)).getElementsByTagName('text')]
    expect(element?.textContent).toBe(`<b>&"'Dr</b>]]> é`)
    expect(element?.getAttribute('letter-spacing')).toBe('0.2')
  })

  it('has y running down from the top of the box', () => {
    const path = toSvg([{ mark: 'fill', path: triangle, ink: 'black' }], {
      x: 0,
      y: 0,
      width: 10,
      height: 10,
    })
    expect(path).toContain('d="M0 10L4 10L4 6Z"')
  })

  it('nests groups, clips what follows in them, and closes all of them', () => {
    const list: DisplayList = [
      {
        mark: 'group',
        name: 'map "face"',
        clip: triangle,
        marks: [
          {
            mark: 'group',
            name: 'inner',
            clip: triangle,
            marks: [{ mark: 'fill', path: triangle, ink: 'fold' }],
          },
        ],
      },
      { mark: 'fill', path: triangle, ink: 'black' },
    ]
    const image = read(toSvg(list, box))
    const clip = image.getElementsByTagName('clipPath')[0]?.getAttribute('id')
    const clipped = [...image.getElementsByTagName('g')].filter((group) => group.hasAttribute('clip-path'))
    expect(clipped.map((group) => group.getAttribute('clip-path'))).toEqual([
      `url(#${clip})`,
      `url(#${clip})`,
    ])
    const last = [...image.getElementsByTagName('path')].at(-1)
    expect(last?.parentNode).toBe(image.documentElement)
  })
})
