import type { Millimetres, MM } from '../../units'
import { foldWords, type FoldForm } from '../../items/lines'
import { confidenceStrokes, type Decoration, type LineSymbol, type SideSign } from '../definition'
import type { Mark, PathStep } from '../display-list'
import { polyline, QUARTER_HANDLE } from '../paths'
import { upperFirst } from '../../words'

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
function limbArrow(side: SideSign, tail: Millimetres, tip: Millimetres, head: 'open' | 'outlined'): Mark[] {
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
    placed: { every: 26 },
    bearingOver: 2 * REACH,
    marks: () => [...limbArrow(1, tail, tip, head), ...limbArrow(-1, tail, tip, head)],
  }
}

/** Half the distance between the two legs of an overturned fold's arrow; how far they reach on the side of the dip, and
 *  beyond the trace before they turn. */
const LEG: Millimetres = 1.15
const LEG_REACH: Millimetres = 3.6
const LEG_BEYOND: Millimetres = 0.7

/** A U-turned arrow for a fold whose two limbs dip the same way: it turns beyond the trace and opens to the side of the
 *  dip, where an anticline's heads point away from the trace and a syncline's toward it. Source: common practice
 *  (symbolization.md section 3); the drawing is ours. */
const turnedArrow = (dips: 'away' | 'toward'): Decoration => {
  const tip = dips === 'away' ? LEG_REACH : 0.95
  return {
    size: 2 * (LEG + HEAD_HALF),
    placed: { every: 26 },
    bearingOver: 2 * REACH,
    marks: ({ side }) => [
      {
        mark: 'stroke',
        path: [
          ['move', -LEG, side * LEG_REACH],
          ['line', -LEG, -side * LEG_BEYOND],
          ...halfTurn(side),
          ['line', LEG, side * LEG_REACH],
        ],
        width: STROKE,
        ink: 'fold',
      },
      ...[-LEG, LEG].map((x): Mark => openHead(x, side, tip, dips === 'away' ? -HEAD : HEAD)),
    ],
  }
}

/** The half circle from the left leg to the right one, beyond the trace from the stated side. */
function halfTurn(side: SideSign): PathStep[] {
  const h = LEG * QUARTER_HANDLE
  const y = (beyond: Millimetres) => -side * (LEG_BEYOND + beyond)
  return [
    ['curve', -LEG, y(h), -h, y(LEG), 0, y(LEG)],
    ['curve', h, y(LEG), LEG, y(h), LEG, y(0)],
  ]
}

/** Two barbs about a leg. @param back from the tip to the barbs' ends, away from the trace positive */
const openHead = (x: Millimetres, side: SideSign, tip: Millimetres, back: Millimetres): Mark => ({
  mark: 'stroke',
  path: polyline([
    [x - HEAD_HALF, side * (tip + back)],
    [x, side * tip],
    [x + HEAD_HALF, side * (tip + back)],
  ]),
  width: STROKE,
  ink: 'fold',
  cap: 'round',
})

/** One bend of a monocline: an arrow in the steep limb, pointing the way it dips, and a bar for the limb that lies nearly
 *  flat. The steep limb falls away from the anticlinal bend and down to the synclinal one. Source: common practice. */
const bend = (dips: 'away' | 'toward'): Decoration => {
  const [tail, tip, steep] = dips === 'away' ? [0, REACH, 1] : [REACH + 0.1, 0.75, -1]
  return {
    size: 2 * HEAD_HALF + STROKE,
    placed: { every: 26 },
    bearingOver: 2 * REACH,
    marks: ({ side }) => {
      const steepSide = side === steep ? 1 : -1
      return [...limbArrow(steepSide, tail, tip, 'open'), ...flatLimb(steepSide === 1 ? -1 : 1)]
    },
  }
}

const flatLimb = (side: SideSign): Mark[] => [
  {
    mark: 'stroke',
    path: [
      ['move', 0, 0],
      ['line', 0, side * FLAT],
      ['move', -HEAD_HALF, side * FLAT],
      ['line', HEAD_HALF, side * FLAT],
    ],
    width: STROKE,
    ink: 'fold',
  },
]
const FLAT: Millimetres = 1.3

const AXIS = ['plunge', 'trend', 'doubly', 'otherPlunge']

const symbol = (
  form: FoldForm,
  decoration: Decoration,
  explains: string,
  sided: readonly string[] = [],
): LineSymbol => ({
  ...fold,
  id: `axial-trace.${form}`,
  variant: form,
  title: upperFirst(foldWords[form]),
  explains,
  drivenBy: ['locationConfidence', 'identity', ...sided, ...AXIS],
  decoration,
})

/** Axial traces, in the folds' red. Antiform and synform, whose age order is not known, have outlined arrow heads. */
export const folds: readonly LineSymbol[] = [
  symbol('anticline', limbArrows('away', 'open'), 'limbs dip away from the trace'),
  symbol('syncline', limbArrows('toward', 'open'), 'limbs dip toward the trace'),
  symbol('antiform', limbArrows('away', 'outlined'), 'limbs dip away; age order not known'),
  symbol('synform', limbArrows('toward', 'outlined'), 'limbs dip toward it; age order not known'),
  symbol('overturned-anticline', turnedArrow('away'), 'arrows point the way both limbs dip', ['side']),
  symbol(
    'overturned-syncline',
    turnedArrow('toward'),
    'arrows stand where both limbs dip to, and point to the trace',
    ['side'],
  ),
  symbol('monocline-anticlinal-bend', bend('away'), 'arrow toward the steeper limb', ['side']),
  symbol('monocline-synclinal-bend', bend('toward'), 'arrow on the steeper limb', ['side']),
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
