import { describe, expect, it, vi } from 'vitest'
import type { XY } from '@shared/units'
import { heightFor, paintPreview, type PreviewScene } from '@/components/intake/paint-preview'

const neatline: XY[] = [
  [1000, 2000],
  [3000, 2000],
  [3000, 3000],
  [1000, 3000],
  [1000, 2000],
]
const inks = { frame: 'black', existing: 'grey', incoming: 'blue' }
/** Leaves 12 px around the face: 200 × 100 px for 2000 × 1000 m. */
const size = { width: 224, height: 124 }

/** A context that notes each path as it is inked. */
function aContext() {
  const inked: { ink: string; path: string[] }[] = []
  let path: string[] = []
  const context = {
    strokeStyle: '',
    fillStyle: '',
    lineWidth: 0,
    lineJoin: 'miter',
    clearRect: vi.fn(),
    beginPath: () => (path = []),
    moveTo: (x: number, y: number) => path.push(`M${Math.round(x)},${Math.round(y)}`),
    lineTo: (x: number, y: number) => path.push(`L${Math.round(x)},${Math.round(y)}`),
    arc: (x: number, y: number) => path.push(`O${Math.round(x)},${Math.round(y)}`),
    stroke: () => inked.push({ ink: context.strokeStyle, path }),
    fill: () => inked.push({ ink: context.fillStyle, path }),
  }
  // Of a canvas, the painter uses only what is here.
  return { context: context as unknown as CanvasRenderingContext2D, inked }
}

const scene = (more: Partial<PreviewScene> = {}): PreviewScene => ({
  neatline,
  existing: [],
  incoming: [],
  ...more,
})

describe('paintPreview', () => {
  it('draws what is there, then the neatline, then what comes in, north up', async () => {
    const { context, inked } = aContext()
    const existing: XY[][] = [
      [
        [1000, 3000],
        [3000, 2000],
      ],
    ]
    const incoming: PreviewScene['incoming'] = [
      { kind: 'contact', places: [1000, 2000, 2000, 2500] },
      { kind: 'attitude', places: [3000, 3000] },
    ]
    await paintPreview(context, size, scene({ existing, incoming }), inks, () => false)
    expect(inked).toEqual([
      { ink: 'grey', path: ['M12,12', 'L212,112'] },
      { ink: 'black', path: ['M12,112', 'L212,112', 'L212,12', 'L12,12', 'L12,112'] },
      { ink: 'blue', path: ['M12,112', 'L112,62'] },
      { ink: 'blue', path: ['O212,12'] },
    ])
  })

  it('leaves out vertices that fall on the one before, and keeps the last', async () => {
    const { context, inked } = aContext()
    const places = [1000, 2000, 1001, 2001, 1002, 2002, 2000, 2500, 2001, 2500]
    await paintPreview(context, size, scene({ incoming: [{ kind: 'contact', places }] }), inks, () => false)
    expect(inked.at(-1)?.path).toEqual(['M12,112', 'L112,62', 'L112,62'])
  })

  it('draws in slices and stops once it is stale', async () => {
    const { context, inked } = aContext()
    let clock = 0
    // Each look at the clock takes a slice and more.
    vi.spyOn(performance, 'now').mockImplementation(() => (clock += 100))
    const line: PreviewScene['incoming'][number] = { kind: 'contact', places: [1000, 2000, 2000, 2500] }
    let turns = 0
    const stale = () => ++turns > 2
    await paintPreview(
      context,
      size,
      scene({ incoming: Array.from({ length: 50 }, () => line) }),
      inks,
      stale,
    )
    vi.restoreAllMocks()
    expect(inked.filter(({ ink }) => ink === 'blue').length).toBeLessThan(5)
  })
})

describe('heightFor', () => {
  it('keeps the proportions of the face, with the margin on both sides', () => {
    expect(heightFor(neatline, 224)).toBe(124)
  })
})
