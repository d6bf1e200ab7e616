import type { AttitudeSymbol, LineSymbol } from '../symbols/definition'
import type { DisplayList, Mark, Tile } from '../symbols/display-list'
import { boundsOf } from '../symbols/place-marks'
import type { LocationConfidence } from '../items/confidence'
import { locationConfidences } from '../items/confidence'
import type { Millimetres } from '../units'
import type { Dimension } from './entry'

const NO_BREAK_SPACE = '\u00a0'
const figure = (length: Millimetres): string => String(Math.round(length * 100) / 100)

/** A length to the hundredth of a millimetre. */
export const mm = (length: Millimetres): string => `${figure(length)}${NO_BREAK_SPACE}mm`

const size = (marks: DisplayList): string => {
  const box = boundsOf(marks)
  return box ? sizeWords(box) : '0 mm'
}

const sizeWords = ({ width, height }: { width: Millimetres; height: Millimetres }): string =>
  `${figure(width)} × ${mm(height)}`

const different = <T>(values: readonly T[]): T[] => [...new Set(values)]

const strokesOf = (marks: DisplayList): Extract<Mark, { mark: 'stroke' }>[] =>
  marks.flatMap((mark) =>
    mark.mark === 'stroke' ? [mark] : mark.mark === 'group' ? strokesOf(mark.marks) : [],
  )

const textsOf = (marks: DisplayList): Extract<Mark, { mark: 'text' }>[] =>
  marks.flatMap((mark) => (mark.mark === 'text' ? [mark] : mark.mark === 'group' ? textsOf(mark.marks) : []))

/** Stroke widths and sizes of figures in a drawing, where it has any. */
function penDimensions(marks: DisplayList): Dimension[] {
  const widths = different(strokesOf(marks).map((mark) => mark.width)).toSorted((a, b) => a - b)
  const figures = different(textsOf(marks).map((mark) => mark.size))
  return [
    ...(widths.length ? [{ what: 'strokes', figure: widths.map(mm).join(', ') }] : []),
    ...(figures.length ? [{ what: 'figures', figure: figures.map(mm).join(', ') }] : []),
  ]
}

/** Size over all, strokes and figures of a drawing. */
export const drawingDimensions = (marks: DisplayList, what = 'over all'): Dimension[] => [
  { what, figure: size(marks) },
  ...penDimensions(marks),
]

/** Stroke and dashes at each location confidence, and how the decoration repeats. */
export function lineDimensions({ strokes, core, decoration }: LineSymbol): Dimension[] {
  return [
    { what: 'line', figure: mm(strokes.certain.width) },
    ...(core ? [{ what: 'core', figure: mm(core.width) }] : []),
    ...locationConfidences
      .filter((confidence) => strokes[confidence].dash)
      .map((confidence) => ({ what: confidence, figure: dashWords(strokes, confidence) })),
    ...(decoration ? decorationDimensions(decoration) : []),
  ]
}

function dashWords(strokes: LineSymbol['strokes'], confidence: LocationConfidence): string {
  const { width, dash = [], cap } = strokes[confidence]
  const [drawn = 0, left = 0] = dash
  // A round cap makes a dot of a dash that has hardly any length.
  return cap === 'round'
    ? `dots ${mm(width)}, every ${mm(drawn + left)}`
    : `dash ${mm(drawn)}, gap ${mm(left)}`
}

function decorationDimensions(decoration: NonNullable<LineSymbol['decoration']>): Dimension[] {
  const { placed } = decoration
  const marks = decoration.marks({ side: 1 }, { end: 'end', bow: { left: 0, right: 0 } })
  const where =
    'every' in placed
      ? `about every ${mm(placed.every)}`
      : `once near each end, ${mm(placed.fromEnds)} from it`
  return [
    { what: 'decoration', figure: `${size(marks)}, ${where}` },
    ...penDimensions(marks).map((each) => ({ ...each, what: `its ${each.what}` })),
  ]
}

/** Length of the strike line, reach of the mark down dip and up dip, strokes: from the inclined case, in its own frame. */
export function attitudeDimensions({ cases }: AttitudeSymbol, drawn: DisplayList): Dimension[] {
  const box = boundsOf(withoutWidth(cases.inclined))
  const [, ...figures] = drawingDimensions(drawn)
  if (!box) return figures
  return [
    { what: 'strike line', figure: mm(box.height) },
    { what: 'mark down dip', figure: mm(box.x + box.width) },
    { what: 'horizontal', figure: size(cases.horizontal) },
    ...figures,
  ]
}

/** Strokes as their middle lines: a strike line's length is that of its path. */
const withoutWidth = (marks: DisplayList): DisplayList =>
  marks.map((mark) => (mark.mark === 'stroke' ? { ...mark, width: 0 } : mark))

/** Cell, strokes and number of marks of an area pattern. */
export function tileDimensions({ width, height, marks }: Tile): Dimension[] {
  const widths = different(marks.flatMap((mark) => (mark.mark === 'stroke' ? [mark.width] : [])))
  return [
    { what: 'cell', figure: sizeWords({ width, height }) },
    ...(widths.length
      ? [
          {
            what: 'strokes',
            figure: widths
              .toSorted((a, b) => a - b)
              .map(mm)
              .join(', '),
          },
        ]
      : []),
    { what: 'marks in a cell', figure: String(marks.length) },
  ]
}
