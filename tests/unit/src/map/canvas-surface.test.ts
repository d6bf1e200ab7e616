import { describe, expect, it } from 'vitest'
import { replay } from '@shared/symbols/interpreter'
import { canvasSurface } from '@/map/canvas-surface'
import { recordingContext } from '../../../support/recording-context'

const drawn = (list: Parameters<typeof replay>[0], transform?: Parameters<typeof replay>[2]) => {
  const { context, calls } = recordingContext()
  replay(list, canvasSurface(context), transform)
  return calls
}

describe('the canvas surface', () => {
  it('strokes a path with its width, ink and cap, y turned downward by the transform', () => {
    const calls = drawn(
      [
        {
          mark: 'stroke',
          path: [
            ['move', 0, 0],
            ['line', 10, 5],
          ],
          width: 0.5,
          ink: 'black',
        },
      ],
      { scale: 2, x: 100, y: 200, flipY: true },
    )
    expect(calls).toEqual([
      'beginPath',
      'moveTo 100 200',
      'lineTo 120 190',
      'stroke #1f1b16 width 1 butt round',
    ])
  })

  it('fills even-odd with the unit’s colour and resets the opacity', () => {
    const calls = drawn([
      {
        mark: 'fill',
        path: [['move', 0, 0], ['line', 1, 0], ['curve', 1, 1, 2, 2, 0, 1], ['close']],
        ink: '#cf9d88',
        opacity: 0.5,
      },
    ])
    expect(calls).toEqual([
      'beginPath',
      'moveTo 0 0',
      'lineTo 1 0',
      'bezierCurveTo 1 1 2 2 0 1',
      'closePath',
      'fill #cf9d88 alpha 0.5 evenodd',
    ])
  })

  it('writes a numeral in Lato with its halo beneath', () => {
    const [halo, text] = drawn([
      {
        mark: 'text',
        text: '40',
        at: [0, 0],
        size: 2.5,
        weight: 700,
        ink: 'black',
        align: 'start',
        halo: 0.3,
      },
    ])
    expect(halo).toMatch(/^strokeText 40 .* 700 2\.5px Lato/)
    expect(text).toMatch(/^fillText 40 .* 700 2\.5px Lato.* #1f1b16$/)
  })

  it('limits a clip to its group', () => {
    const calls = drawn([
      {
        mark: 'group',
        name: 'face',
        clip: [['move', 0, 0], ['line', 1, 0], ['line', 1, 1], ['close']],
        marks: [],
      },
    ])
    expect(calls[0]).toBe('save')
    expect(calls.at(-2)).toBe('clip evenodd')
    expect(calls.at(-1)).toBe('restore')
  })
})
