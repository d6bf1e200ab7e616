import type { Millimetres, MM } from '../../units'
import { confidenceStrokes, type Decoration, type LineSymbol } from '../definition'
import type { Mark } from '../display-list'
import { polyline } from '../paths'

const fold = {
  kind: 'axial-trace',
  ink: 'fold',
  strokes: confidenceStrokes({
    width: 0.45,
    long: [4.2, 1.1],
    short: [1.8, 1],
    dot: { size: 0.5, apart: 1.25 },
  }),
} as const

/** From the trace to the far end of an arrow: a pair is about 6 mm across. */
const REACH: Millimetres = 3.1
const HEAD: Millimetres = 1.15
const HEAD_HALF: Millimetres = 0.8
const STROKE: Millimetres = 0.36

/** One limb's arrow. @param side +1 left of the trace   @param tip, tail distance from the trace */
function limbArrow(side: 1 | -1, tail: Millimetres, tip: Millimetres, head: 'open' | 'outlined'): Mark[] {
  const back = tip + Math.sign(tail - tip) * HEAD
  const barbs: MM[] = [
    [-HEAD_HALF, side * back],
    [0, side * tip],
    [HEAD_HALF, side * back],
  ]
  const shaftEnd = head === 'open' ? tip : back
  return [
    {
      mark: 'stroke',
      path: polyline([
        [0, side * tail],
        [0, side * shaftEnd],
      ]),
      width: STROKE,
      ink: 'fold',
    },
    { mark: 'stroke', path: polyline(barbs, head === 'outlined'), width: STROKE, ink: 'fold', cap: 'round' },
  ]
}

/** A pair of arrows that shows how the limbs dip: away from the trace or toward it. */
const limbArrows = (dips: 'away' | 'toward', head: 'open' | 'outlined'): Decoration => {
  const [tail, tip] = dips === 'away' ? [0.5, REACH] : [REACH + 0.1, 0.75]
  return {
    size: 2 * HEAD_HALF + STROKE,
    interval: 26,
    bearingOver: 2 * REACH,
    marks: () => [...limbArrow(1, tail, tip, head), ...limbArrow(-1, tail, tip, head)],
  }
}

/** Two bars across the trace. The way a monocline's limb dips is not among its attributes, so no arrow claims it. */
const bars: Decoration = {
  size: 1.6,
  interval: 26,
  bearingOver: 5,
  marks: () =>
    [-0.6, 0.6].map((x): Mark => ({
      mark: 'stroke',
      path: polyline([
        [x, -1.9],
        [x, 1.9],
      ]),
      width: STROKE,
      ink: 'fold',
    })),
}

/** Axial traces, in the folds' red. Antiform and synform, whose age order is not known, have outlined arrow heads. */
export const folds: readonly LineSymbol[] = [
  { ...fold, variant: 'anticline', title: 'Anticline', decoration: limbArrows('away', 'open') },
  { ...fold, variant: 'syncline', title: 'Syncline', decoration: limbArrows('toward', 'open') },
  { ...fold, variant: 'antiform', title: 'Antiform', decoration: limbArrows('away', 'outlined') },
  { ...fold, variant: 'synform', title: 'Synform', decoration: limbArrows('toward', 'outlined') },
  { ...fold, variant: 'monocline', title: 'Monocline', decoration: bars },
]

/** The arrowhead of a plunge, on the trace: solid, its back drawn in a little, about half as wide as long. */
export const plungeHead = { length: 4.5, halfWidth: 1.25, notch: 0.55 } as const

/** The plunge arrowhead with its tip at the origin, pointing along x. */
export const plungeHeadMarks: readonly Mark[] = [
  {
    mark: 'fill',
    path: polyline(
      [
        [0, 0],
        [-plungeHead.length, plungeHead.halfWidth],
        [-plungeHead.length + plungeHead.notch, 0],
        [-plungeHead.length, -plungeHead.halfWidth],
      ],
      true,
    ),
    ink: 'fold',
  },
]

/** The plunge's figure beside its arrowhead. */
export const plungeNumeral = { size: 2.4, weight: 700, gap: 0.5 } as const
