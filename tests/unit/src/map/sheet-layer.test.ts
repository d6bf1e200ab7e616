import type { FrameState } from 'ol/Map'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { SheetLayer, type PaintRequest } from '@/map/sheet-layer'

/** A frame as OpenLayers tells of it: only what the layer reads is there. */
const aFrame = (change: { center?: [number, number]; resolution?: number; moving?: boolean } = {}) =>
  ({
    viewHints: [0, change.moving ? 1 : 0],
    viewState: { center: change.center ?? [0, 0], resolution: change.resolution ?? 10 },
    size: [400, 300],
    pixelRatio: 1,
  }) as unknown as FrameState

let now = 0
let scheduled = 0
beforeEach(() => {
  now = 0
  scheduled = 0
  vi.spyOn(performance, 'now').mockImplementation(() => now)
  vi.stubGlobal('requestAnimationFrame', () => (scheduled += 1))
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue({} as never)
})
afterEach(() => {
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
})

/** A layer whose picture has so many parts, each of which takes so many milliseconds. */
function aLayer(parts: number, msEach: number) {
  const requests: PaintRequest[] = []
  let whole = 0
  const layer = new SheetLayer(function* (request) {
    requests.push(request)
    for (let part = 0; part < parts; part++) {
      now += msEach
      yield
    }
    whole += 1
  })
  const render = (frame: FrameState) => {
    now += 16
    return layer.render(frame)
  }
  const state = (frame: FrameState) => render(frame).dataset['picture']
  const front = () => layer.render(null).querySelector<HTMLElement>('canvas:not([style*=hidden])')
  return { layer, requests, render, state, front, whole: () => whole }
}

describe('a layer of the sheet', () => {
  it('shows something in the first frame, then the settled picture', () => {
    const { requests, render, state } = aLayer(3, 1)
    render(aFrame())
    expect(requests).toMatchObject([{ isFirst: true, settle: false }])
    expect(state(aFrame())).toBe('drawn')
    expect(requests[1]).toMatchObject({ isFirst: false, settle: true })
  })

  it('does not draw again what it shows already', () => {
    const { requests, render } = aLayer(3, 1)
    for (let frame = 0; frame < 5; frame++) render(aFrame())
    expect(requests).toHaveLength(2)
  })

  it('draws a large picture over several frames, and asks for the next ones', () => {
    const { state, whole } = aLayer(100, 2)
    const states = Array.from({ length: 12 }, () => state(aFrame()))
    expect(states.filter((each) => each === 'drawing').length).toBeGreaterThan(3)
    expect(states.at(-1)).toBe('drawn')
    expect(whole()).toBe(2)
    expect(scheduled).toBeGreaterThan(3)
  })

  it('shifts a large picture while the view moves, and draws it when the view has rested', () => {
    const { requests, render, state, front } = aLayer(100, 2)
    for (let frame = 0; frame < 12; frame++) render(aFrame())
    const drawn = requests.length
    render(aFrame({ center: [100, 0], moving: true }))
    expect(requests).toHaveLength(drawn)
    // 100 m east at 10 m to the pixel: the picture goes 10 px to the left.
    expect(front()?.style.transform).toBe('translate(-10px, 0px) scale(1)')
    for (let frame = 0; frame < 20; frame++) state(aFrame({ center: [100, 0] }))
    expect(requests.length).toBe(drawn + 1)
    expect(front()?.style.transform).toBe('')
  })

  it('draws a small picture anew in every frame of a move', () => {
    const { requests, render } = aLayer(2, 1)
    for (let frame = 0; frame < 3; frame++) render(aFrame())
    const drawn = requests.length
    for (let frame = 1; frame <= 4; frame++) render(aFrame({ center: [frame * 50, 0], moving: true }))
    expect(requests).toHaveLength(drawn + 4)
  })

  it('draws a large picture anew while moving once the view would be left bare', () => {
    const { requests, render } = aLayer(100, 2)
    for (let frame = 0; frame < 12; frame++) render(aFrame())
    const drawn = requests.length
    // 15 % of 400 px are 60 px, 600 m.
    render(aFrame({ center: [590, 0], moving: true }))
    expect(requests).toHaveLength(drawn)
    render(aFrame({ center: [650, 0], moving: true }))
    expect(requests).toHaveLength(drawn + 1)
    render(aFrame({ center: [700, 0], moving: true }))
    expect(requests).toHaveLength(drawn + 1)
  })

  it('gives an unfinished picture up for changed content, and spends more of the frame on that', () => {
    const { layer, requests, render, state } = aLayer(50, 2)
    for (let frame = 0; frame < 12; frame++) render(aFrame())
    const drawn = requests.length
    layer.touch()
    expect(state(aFrame())).toBe('drawn')
    expect(requests).toHaveLength(drawn + 1)
  })
})
