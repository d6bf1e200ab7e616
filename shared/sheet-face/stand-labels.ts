import type { Face } from '../api/faces'
import type { Box } from '../geometry/box'
import {
  boxAround,
  boxesMeet,
  edgeMeetsBox,
  edgesOf,
  grown,
  isInside,
  type Edge,
} from '../geometry/box-edges'
import type { ItemOf } from '../items/item'
import type { UnitProperties } from '../items/legend'
import { leaderStart, unitLabelSize, unitLabelText, type LabelStand } from '../symbols/draw-unit-label'
import { toMm, type DrawingFrame } from '../symbols/frame'
import type { Millimetres, MM } from '../units'

type Label = ItemOf<'unit-label'>

/** Air that letters keep from the edges of areas, and from other letters. */
const AIR: Millimetres = 0.35
/** How far the middle of letters may be moved within their area, and how far out of it: they stay within a symbol's reach
 *  (`SYMBOL_REACH`). */
const REACH = { within: 7, outside: 9.2 } as const
const STEP: Millimetres = 0.8
const DIRECTIONS = 16
/** Shortest leader that is seen as one. */
const LEAST_LEADER: Millimetres = 2
/** What a place outside the area costs beside its distance: for each boundary and each other label beneath the letters, and
 *  for lying in no area, as off the sheet. */
const COST = { boundary: 4, letters: 25, offSheet: 40 } as const

interface Area {
  edges: readonly Edge[]
  box: Box
}

/** Where the letters of units stand at print size: at the label's place where they fit into its area, else at the nearest
 *  place in the area where they do, else outside it with a leader, where they cover least. A label in no area, as where areas
 *  are still to be built, stays at its place.
 *  @returns the labels that move, by id
 *  Source: symbolization.md section 5: inside the area, else with a leader. The search is our own. */
export function standLabels(
  faces: readonly Face[],
  labels: readonly Label[],
  frame: DrawingFrame,
  unitOf: (id: string) => UnitProperties | undefined,
): Map<string, LabelStand> {
  const areas = faces.map((face) => areaOf(face, frame))
  const letters = labels.map((label) => {
    const place = toMm(frame, label.geometry.coordinates)
    const text = unitLabelText(label.properties, unitOf)
    const size = unitLabelSize(text)
    return { id: label.id, text, place, size, box: grown(boxAround(place, size), AIR) }
  })
  const moved = new Map<string, LabelStand>()
  for (const each of letters) {
    const area = areas.find(({ box, edges }) => isInBox(box, each.place) && isInside(edges, each.place))
    if (!area || fits(each.box, area)) continue
    const window = grown(each.box, Math.max(REACH.within, REACH.outside))
    const own = partNear(area, window)
    const near = areas.filter(({ box }) => boxesMeet(box, window)).map((other) => partNear(other, window))
    const taken = letters.flatMap(({ id, box }) => (id !== each.id && boxesMeet(box, window) ? [box] : []))
    const stand = within(each, own, taken) ?? outside(each, own, near, taken)
    each.box = grown(boxAround(shift(each.place, stand.offset), each.size), AIR)
    moved.set(each.id, stand)
  }
  return moved
}

function areaOf(face: Face, frame: DrawingFrame): Area {
  const rings = face.rings.map((ring) => ring.map((xy) => toMm(frame, xy)))
  let [left, bottom, right, top] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [x, y] of rings[0] ?? []) {
    left = Math.min(left, x)
    right = Math.max(right, x)
    bottom = Math.min(bottom, y)
    top = Math.max(top, y)
  }
  return { edges: edgesOf(rings), box: { x: left, y: bottom, width: right - left, height: top - bottom } }
}

/** The part of an area that matters within a window: sides at its height, from its left edge on. */
const partNear = ({ edges, box }: Area, { x, y, height }: Box): Area => ({
  box,
  edges: edges.filter(
    ([from, to]) =>
      Math.max(from[0], to[0]) >= x &&
      Math.max(from[1], to[1]) >= y &&
      Math.min(from[1], to[1]) <= y + height,
  ),
})

const shift = ([x, y]: MM, [dx, dy]: MM): MM => [x + dx, y + dy]

const isInBox = (box: Box, [x, y]: MM): boolean =>
  x >= box.x && x <= box.x + box.width && y >= box.y && y <= box.y + box.height

/** Whether a side of an area runs through a box. */
const isCut = (box: Box, { edges, box: bounds }: Area): boolean =>
  boxesMeet(bounds, box) && edges.some(([from, to]) => edgeMeetsBox(from, to, box))

/** Whether letters lie in an area whole. */
const fits = (box: Box, area: Area): boolean =>
  !isCut(box, area) && isInside(area.edges, [box.x + box.width / 2, box.y + box.height / 2])

/** Ways out from a place, the nearest first; of one distance, to the right first, then round. */
function offsets(from: Millimetres, to: Millimetres): MM[] {
  const found: MM[] = []
  for (let reach = from; reach <= to; reach += STEP) {
    for (let index = 0; index < DIRECTIONS; index++) {
      const turn = (index / DIRECTIONS) * 2 * Math.PI
      found.push([reach * Math.cos(turn), reach * Math.sin(turn)])
    }
  }
  return found
}

interface Letters {
  text: string
  place: MM
  size: { width: Millimetres; height: Millimetres }
}

const boxAt = ({ place, size }: Letters, offset: MM): Box => grown(boxAround(shift(place, offset), size), AIR)

function within(letters: Letters, area: Area, taken: readonly Box[]): LabelStand | undefined {
  const offset = offsets(STEP, REACH.within).find((candidate) => {
    const box = boxAt(letters, candidate)
    return fits(box, area) && !taken.some((other) => boxesMeet(other, box))
  })
  return offset && { offset, leader: false }
}

/** From the letters, about a middle, to their place. */
function leaderLength({ text, place }: Letters, middle: MM): Millimetres {
  const [x, y] = leaderStart(text, middle, place)
  return Math.hypot(x - place[0], y - place[1])
}

/** The place outside that covers least; without any, the letters stay where they are. */
function outside(letters: Letters, area: Area, near: readonly Area[], taken: readonly Box[]): LabelStand {
  let best: { offset: MM; cost: number } | undefined
  for (const offset of offsets(letters.size.height, REACH.outside)) {
    const distance = Math.hypot(...offset)
    if (best && distance >= best.cost) break
    const box = boxAt(letters, offset)
    const middle = shift(letters.place, offset)
    if (leaderLength(letters, middle) < LEAST_LEADER) continue
    if (isInside(area.edges, middle) || isCut(box, area)) continue
    const boundaries = near.filter((other) => isCut(box, other)).length
    const covered = taken.filter((other) => boxesMeet(other, box)).length
    const isOff = !near.some(({ edges }) => isInside(edges, middle))
    const cost = distance + boundaries * COST.boundary + covered * COST.letters + (isOff ? COST.offSheet : 0)
    if (!best || cost < best.cost) best = { offset, cost }
  }
  return best ? { offset: best.offset, leader: true } : { offset: [0, 0], leader: false }
}
