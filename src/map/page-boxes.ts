import type { XY } from '@shared/units'
import { symbolPxPerMm, toPx, type Px, type PxPoint, type ViewFrame } from './view-frame'
import { printShare } from './view-frame'

/** A rectangle on screen. */
export interface PxBox {
  left: Px
  top: Px
  width: Px
  height: Px
}

/** White edges of the page on screen at the smallest symbol size: room for grid figures and the scale bar. */
const EDGE = { left: 60, top: 62, bottom: 78, gutter: 76, right: 26 } as const
/** Symbol size that these edges are made for, px per mm; above it they grow with the figures that stand in them. */
const EDGE_PX_PER_MM = 3.6
/** Air between the page and the desk's edge when the whole page is shown. */
const DESK_EDGE: Px = 20
/** Width of the margin column on the page, by how wide the desk is. */
const MARGIN = { least: 292, most: 344, shareOfDesk: 0.275 } as const
/** The column that the margin becomes when the page's own margin has left the view. */
export const DOCKED_WIDTH: Px = 272

/** The sheet as the page needs it: bounds of the map face, sheet metres. */
export interface PageGround {
  min: XY
  max: XY
  scale: number
  /** A page whose margin is left out: the map face alone, with its frame. */
  bare?: boolean
}

export interface PageBoxes {
  face: PxBox
  paper: PxBox
  margin: PxBox & { where: 'page' | 'docked' }
}

interface Edges {
  left: Px
  top: Px
  bottom: Px
  gutter: Px
  right: Px
}

function edgesAt(pxPerMetre: number, { scale, bare }: PageGround, symbols: 'print' | 'screen'): Edges {
  const grown = Math.max(1, symbolPxPerMm(printShare(pxPerMetre, scale), symbols) / EDGE_PX_PER_MM)
  return {
    left: EDGE.left * grown,
    top: EDGE.top * grown,
    bottom: EDGE.bottom * grown,
    gutter: (bare ? EDGE.left : EDGE.gutter) * grown,
    right: bare ? 0 : EDGE.right,
  }
}

const marginWidth = (deskWidth: Px, { bare }: PageGround): Px =>
  bare ? 0 : Math.round(Math.min(MARGIN.most, Math.max(MARGIN.least, deskWidth * MARGIN.shareOfDesk)))

/** Where face, paper and margin lie on screen. The margin stands in the page while all of it is in view, and becomes a
 *  column at the right edge when it is not. */
export function pageBoxes(view: ViewFrame, ground: PageGround, symbols: 'print' | 'screen'): PageBoxes {
  const edges = edgesAt(view.pxPerMetre, ground, symbols)
  const [left, bottom] = toPx(view, ground.min)
  const [right, top] = toPx(view, ground.max)
  const width = marginWidth(view.width, ground)
  const paper = {
    left: left - edges.left,
    top: top - edges.top,
    width: edges.left + right - left + edges.gutter + width + edges.right,
    height: edges.top + bottom - top + edges.bottom,
  }
  return {
    face: { left, top, width: right - left, height: bottom - top },
    paper,
    margin: marginBox(view, paper, { left: right + edges.gutter, width }),
  }
}

function marginBox(view: ViewFrame, paper: PxBox, column: { left: Px; width: Px }): PageBoxes['margin'] {
  const inView = column.left >= 0 && column.left + column.width <= view.width - 4
  if (!inView) {
    const left = view.width - DOCKED_WIDTH
    return { where: 'docked', left, top: 0, width: DOCKED_WIDTH, height: view.height }
  }
  const top = Math.max(0, paper.top)
  const bottom = Math.min(view.height, paper.top + paper.height)
  return { where: 'page', left: column.left, top, width: column.width, height: Math.max(0, bottom - top) }
}

/** The view that shows the whole page, centred on the desk. */
export function fitPage(
  size: { width: Px; height: Px },
  ground: PageGround,
  symbols: 'print' | 'screen',
): { center: XY; pxPerMetre: number } {
  const [east, north] = [ground.max[0] - ground.min[0], ground.max[1] - ground.min[1]]
  let edges = edgesAt(0, ground, symbols)
  let pxPerMetre = 0
  // The edges follow the symbols' size, which follows the fit: three turns settle it to less than a pixel.
  for (let turn = 0; turn < 3; turn++) {
    const besides = edges.left + edges.gutter + marginWidth(size.width, ground) + edges.right
    const width = Math.max(80, size.width - 2 * DESK_EDGE - besides)
    const height = Math.max(80, size.height - 2 * DESK_EDGE - edges.top - edges.bottom)
    pxPerMetre = Math.min(width / east, height / north)
    edges = edgesAt(pxPerMetre, ground, symbols)
  }
  const margin = marginWidth(size.width, ground)
  const paperWidth = edges.left + east * pxPerMetre + edges.gutter + margin + edges.right
  const faceMiddle: PxPoint = [
    (size.width - paperWidth) / 2 + edges.left + (east * pxPerMetre) / 2,
    (size.height + edges.top - edges.bottom) / 2,
  ]
  return {
    pxPerMetre,
    center: [
      (ground.min[0] + ground.max[0]) / 2 + (size.width / 2 - faceMiddle[0]) / pxPerMetre,
      (ground.min[1] + ground.max[1]) / 2 - (size.height / 2 - faceMiddle[1]) / pxPerMetre,
    ],
  }
}
