import type { MM } from '../units'
import type { Box } from './box'

/** A box grown on all sides. */
export const grown = ({ x, y, width, height }: Box, by: number): Box => ({
  x: x - by,
  y: y - by,
  width: width + 2 * by,
  height: height + 2 * by,
})

/** A box about its middle. */
export const boxAround = ([x, y]: MM, { width, height }: { width: number; height: number }): Box => ({
  x: x - width / 2,
  y: y - height / 2,
  width,
  height,
})

/** Whether two boxes have a place in common, edges included. */
export const boxesMeet = (a: Box, b: Box): boolean =>
  a.x <= b.x + b.width && b.x <= a.x + a.width && a.y <= b.y + b.height && b.y <= a.y + a.height

/** Whether a straight edge runs through a box or touches it. Source: derived; an edge whose bounds meet the box misses it
 *  only if all four corners lie on one side of it. */
export function edgeMeetsBox([x1, y1]: MM, [x2, y2]: MM, box: Box): boolean {
  const [right, top] = [box.x + box.width, box.y + box.height]
  if (Math.max(x1, x2) < box.x || Math.min(x1, x2) > right) return false
  if (Math.max(y1, y2) < box.y || Math.min(y1, y2) > top) return false
  const sideOf = (x: number, y: number): number => (x2 - x1) * (y - y1) - (y2 - y1) * (x - x1)
  const sides = [sideOf(box.x, box.y), sideOf(right, box.y), sideOf(right, top), sideOf(box.x, top)]
  return !(sides.every((side) => side > 0) || sides.every((side) => side < 0))
}

/** One straight side of an area. */
export type Edge = readonly [from: MM, to: MM]

/** The sides of closed rings. */
export const edgesOf = (rings: readonly (readonly MM[])[]): Edge[] =>
  rings.flatMap((ring) =>
    ring.slice(1).flatMap((to, index): Edge[] => {
      const from = ring[index]
      return from ? [[from, to]] : []
    }),
  )

/** Whether a place lies within an area, holes left out. Only sides at its height and to its right count.
 *  Source: the even-odd rule, common practice. */
export function isInside(edges: readonly Edge[], [x, y]: MM): boolean {
  let inside = false
  for (const [[x1, y1], [x2, y2]] of edges) {
    if (y1 > y !== y2 > y && x < ((x2 - x1) * (y - y1)) / (y2 - y1) + x1) inside = !inside
  }
  return inside
}

/** Where the way from a box's middle to a place outside it leaves the box. */
export function leaveBox(box: Box, [x, y]: MM): MM {
  const middle: MM = [box.x + box.width / 2, box.y + box.height / 2]
  const [dx, dy] = [x - middle[0], y - middle[1]]
  const share = Math.min(
    dx === 0 ? Infinity : box.width / 2 / Math.abs(dx),
    dy === 0 ? Infinity : box.height / 2 / Math.abs(dy),
  )
  return [middle[0] + dx * Math.min(1, share), middle[1] + dy * Math.min(1, share)]
}
