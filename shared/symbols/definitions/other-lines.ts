import { confidenceStrokes, type Decoration, type LineSymbol } from '../definition'
import { circle, polyline } from '../paths'

const diamonds: Decoration = {
  size: 2,
  placed: { every: 9 },
  bearingOver: 2,
  marks: () => [
    {
      mark: 'fill',
      path: polyline(
        [
          [-1, 0],
          [0, 0.62],
          [1, 0],
          [0, -0.62],
        ],
        true,
      ),
      ink: 'black',
    },
  ],
}

const beads: Decoration = {
  size: 1.1,
  placed: { every: 7 },
  bearingOver: 1.1,
  marks: () => [{ mark: 'fill', path: circle([0, 0], 0.55), ink: 'black' }],
}

const otherLine = {
  kind: 'other-line',
  ink: 'black',
  drivenBy: ['locationConfidence', 'identity'],
} as const

/** Dikes, veins and marker beds: each told from contacts and faults by its own build. */
export const otherLines: readonly LineSymbol[] = [
  {
    ...otherLine,
    id: 'other-line.dike',
    variant: 'dike',
    title: 'Dike',
    strokes: confidenceStrokes({
      width: 1.05,
      long: [4.2, 1.2],
      short: [1.9, 1.1],
      dot: { size: 1.05, apart: 1.8 },
    }),
    core: { width: 0.6, ink: '#d795a5' },
  },
  {
    ...otherLine,
    id: 'other-line.vein',
    variant: 'vein',
    title: 'Vein',
    strokes: confidenceStrokes({
      width: 0.26,
      long: [3.5, 0.8],
      short: [1.5, 0.8],
      dot: { size: 0.36, apart: 1 },
    }),
    decoration: diamonds,
  },
  {
    ...otherLine,
    id: 'other-line.marker-bed',
    variant: 'marker-bed',
    title: 'Marker bed',
    strokes: confidenceStrokes({
      width: 0.32,
      long: [3.5, 0.8],
      short: [1.5, 0.8],
      dot: { size: 0.4, apart: 1.1 },
    }),
    decoration: beads,
  },
]
