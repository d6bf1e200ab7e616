import { describe, expect, it } from 'vitest'
import type { DisplayList, TextMark } from '@shared/symbols/display-list'
import { replay } from '@shared/symbols/interpreter'
import { polyline } from '@shared/symbols/paths'
import { capHeight, measureText } from '@shared/symbols/text-metrics'
import { recordingSurface, type Call } from '../../../support/recording-surface'

const label: TextMark = {
  mark: 'text',
  text: 'Sv',
  at: [10, 20],
  size: 3,
  weight: 700,
  ink: 'black',
  align: 'start',
}

function callsOf(list: DisplayList, transform?: Parameters<typeof replay>[2]): Call[] {
  const surface = recordingSurface()
  replay(list, surface, transform)
  return surface.calls
}

function runOf(mark: TextMark, transform?: Parameters<typeof replay>[2]) {
  const [call] = callsOf([mark], transform)
  if (call?.call !== 'text') throw new Error('No text was drawn.')
  return call.run
}

describe('replaying a display list', () => {
  it('puts millimetres where the surface has them, downward if it must, and scales widths', () => {
    const line = {
      mark: 'stroke',
      path: polyline([
        [0, 0],
        [10, 5],
      ]),
      width: 0.2,
      ink: 'fold',
    } as const
    expect(callsOf([line], { scale: 4, x: 100, y: 200, flipY: true })).toEqual([
      {
        call: 'path',
        path: [
          ['move', 100, 200],
          ['line', 140, 180],
        ],
        paint: { paint: 'stroke', width: 0.8, colour: '#a8321c', cap: 'butt' },
      },
    ])
  })

  it('names colours, and passes on those of units', () => {
    const path = polyline(
      [
        [0, 0],
        [1, 0],
        [1, 1],
      ],
      true,
    )
    const [first, second] = callsOf([
      { mark: 'fill', path, ink: 'black' },
      { mark: 'fill', path, ink: '#cf9d87', opacity: 0.5 },
    ])
    expect(first).toMatchObject({ paint: { colour: '#1f1b16', opacity: 1 } })
    expect(second).toMatchObject({ paint: { colour: '#cf9d87', opacity: 0.5 } })
  })

  it('cuts dashes before the surface sees them', () => {
    const [call] = callsOf([
      {
        mark: 'stroke',
        path: polyline([
          [0, 0],
          [8, 0],
        ]),
        width: 0.2,
        ink: 'black',
        dash: [2, 1],
      },
    ])
    expect(call).toMatchObject({ path: expect.arrayContaining([['move', 3, 0]]) })
    expect(call?.call === 'path' && call.path.filter(([step]) => step === 'move')).toHaveLength(3)
  })

  it('anchors text by its width and the height of its capitals', () => {
    const width = measureText('Sv', 3, 700)
    const down = capHeight(3, 700) / 2
    expect(runOf(label)).toMatchObject({ x: 10, y: 20 - down, size: 3 })
    expect(runOf({ ...label, align: 'middle' }).x).toBeCloseTo(10 - width / 2, 9)
    expect(runOf({ ...label, align: 'end' }).x).toBeCloseTo(10 - width, 9)
    expect(runOf(label, { scale: 2, x: 0, y: 100, flipY: true })).toMatchObject({
      y: 100 - 2 * (20 - down),
      size: 6,
    })
  })

  it('turns text about its anchor, clockwise', () => {
    // Turned by 90° the text runs downward; its middle stays at the anchor.
    const run = runOf({ ...label, align: 'middle', turn: 90 })
    expect(run.turn).toBe(90)
    expect(run.x).toBeCloseTo(10 - capHeight(3, 700) / 2, 9)
    expect(run.y).toBeCloseTo(20 + measureText('Sv', 3, 700) / 2, 9)
  })

  it('counts tracking when it anchors, and gives halos on both sides', () => {
    const run = runOf({ ...label, align: 'end', tracking: 0.5, halo: 0.4 })
    expect(run.x).toBeCloseTo(10 - measureText('Sv', 3, 700) - 0.5, 9)
    expect(run.tracking).toBe(0.5)
    expect(run.halo).toEqual({ width: 0.8, colour: '#fdfaf3' })
  })

  it('draws a group as one, inside its clip', () => {
    const clip = polyline(
      [
        [0, 0],
        [1, 0],
        [1, 1],
      ],
      true,
    )
    const calls = callsOf([{ mark: 'group', name: 'face', clip, marks: [label] }, label])
    expect(calls).toMatchObject([
      { call: 'group', name: 'face', calls: [{ call: 'clip', path: clip }, { call: 'text' }] },
      { call: 'text' },
    ])
  })
})
