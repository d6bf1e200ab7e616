import type { LocationConfidence } from '@shared/items/confidence'
import type { Metres, XY } from '@shared/units'
import { levelLines, sample, type Line } from './contours'
import { cutLine, isClosed, thin, withNodes } from './cut-lines'
import type { Block } from './field'
import type { Truth } from './truth'
import { contactHeights, markerBed } from './units'
import type { Surface } from './vectors'

/** A line of the demo map, metres from the sheet's south-west corner. */
export interface MapLine {
  kind: 'contact' | 'fault' | 'cover' | 'marker-bed'
  line: Line
  /** Whether it lies beneath younger cover. */
  concealed: boolean
  /** Stratigraphic height of a contact or marker bed. */
  height?: Metres
  block?: Block
}

export interface Linework {
  lines: MapLine[]
  /** Closed contacts too small for the map, left out: what stands inside is shown as what surrounds them. */
  leftOut: Line[]
}

/** How far a drawn line may depart from the true one: a twentieth of a pen's width at 1:24 000. */
const TOLERANCE: Metres = 0.6
const LONGEST_PIECE: Metres = 150
/** Closed contacts shorter than this, some 10 mm on the map, are left out. */
const SHORTEST_RING: Metres = 260
/** Concealed pieces bound nothing; shorter than two dots they only smudge. */
const SHORTEST_CONCEALED: Metres = 60

/** All linework of the known ground. Lines that meet share a vertex. */
export function makeLinework(truth: Truth): Linework {
  const faultNodes: XY[] = []
  const coverNodes: XY[][] = truth.cover.map(() => [])
  const found = (['west', 'east'] as const).flatMap((block) =>
    contactsOf(truth, block, faultNodes, coverNodes),
  )
  const isSmall = ({ line }: MapLine) => isClosed(line) && lengthOf(line) < SHORTEST_RING
  const fault = faultLines(truth, faultNodes, coverNodes)
  const cover = truth.cover.flatMap((patch, index) =>
    levelLines(sample(patch.surface, truth.extent), 0).map((line): MapLine => {
      const nodes = coverNodes[index] ?? []
      return {
        kind: 'cover',
        line: thin(withNodes(line, nodes), nodes, TOLERANCE, LONGEST_PIECE),
        concealed: false,
      }
    }),
  )
  return {
    lines: [...found.filter((line) => !isSmall(line)), ...fault, ...cover],
    leftOut: found.filter(isSmall).map(({ line }) => line),
  }
}

/** Contacts and marker bed of one block, cut at the fault and where cover hides them. */
function contactsOf(truth: Truth, block: Block, faultNodes: XY[], coverNodes: XY[][]): MapLine[] {
  const sampled = sample(truth.onGround.height(block), truth.extent)
  return [...contactHeights, markerBed.height].flatMap((height) => {
    const isMarker = height === markerBed.height
    const own = levelOf(sampled.surface, height)
    return levelLines(sampled, height).flatMap((line) => {
      const { pieces, nodes } = cutLine(line, own, truth.onGround.fault)
      // A marker bed bounds nothing: nothing need meet it.
      if (!isMarker) faultNodes.push(...nodes)
      return pieces
        .filter((piece) => piece.positive === (block === 'east'))
        .flatMap((piece) => cutAtCover(truth, piece.line, own, isMarker ? undefined : coverNodes))
        .filter((piece) => !piece.concealed || (!isMarker && lengthOf(piece.line) > SHORTEST_CONCEALED))
        .map(({ line: piece, concealed }): MapLine => {
          const drawn = thin(piece, [], TOLERANCE, LONGEST_PIECE)
          return { kind: isMarker ? 'marker-bed' : 'contact', line: drawn, concealed, height, block }
        })
    })
  })
}

function faultLines(truth: Truth, nodes: XY[], coverNodes: XY[][]): MapLine[] {
  const { fault } = truth.onGround
  return levelLines(sample(fault, truth.extent), 0).flatMap((line) =>
    cutAtCover(truth, withNodes(line, nodes), fault, coverNodes).map(
      ({ line: piece, concealed }): MapLine => ({
        kind: 'fault',
        line: thin(piece, nodes, TOLERANCE, LONGEST_PIECE),
        concealed,
      }),
    ),
  )
}

/** A line cut at the edges of cover; the places of the cuts are added to each patch's nodes, if given. */
export function cutAtCover(
  truth: Truth,
  line: Line,
  own: Surface,
  coverNodes?: XY[][],
): { line: Line; concealed: boolean }[] {
  return truth.cover.reduce<{ line: Line; concealed: boolean }[]>(
    (pieces, patch, index) =>
      pieces.flatMap((piece) => {
        if (piece.concealed) return [piece]
        const cut = cutLine(piece.line, own, patch.surface)
        coverNodes?.[index]?.push(...cut.nodes)
        return cut.pieces.map(({ line: part, positive }) => ({ line: part, concealed: positive }))
      }),
    [{ line, concealed: false }],
  )
}

export const levelOf =
  (surface: Surface, level: number): Surface =>
  (xy) =>
    surface(xy) - level

export function lengthOf(line: Line): Metres {
  return line
    .slice(1)
    .reduce(
      (sum, [x, y], index) => sum + Math.hypot(x - (line[index]?.[0] ?? x), y - (line[index]?.[1] ?? y)),
      0,
    )
}

/** A stretch of a line that is located less well than the rest. */
export interface Stretch {
  line: Line
  locationConfidence: LocationConfidence
}

/** Cuts a line at the vertices nearest to two fractions of its length; what lies between gets another confidence. */
export function withStretch(
  line: Line,
  [from, to]: readonly [number, number],
  locationConfidence: LocationConfidence,
): Stretch[] {
  const length = lengthOf(line)
  const [start, end] = [vertexAt(line, from * length), vertexAt(line, to * length)]
  if (start < 1 || end <= start || end > line.length - 2) return [{ line, locationConfidence: 'certain' }]
  return [
    { line: line.slice(0, start + 1), locationConfidence: 'certain' },
    { line: line.slice(start, end + 1), locationConfidence },
    { line: line.slice(end), locationConfidence: 'certain' },
  ]
}

/** Index of the first vertex at or beyond a length along the line. */
function vertexAt(line: Line, along: Metres): number {
  return line.findIndex((_, index) => lengthOf(line.slice(0, index + 1)) >= along)
}
