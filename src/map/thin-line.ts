import { gridDistance } from '@shared/geometry/bearings'
import type { Metres, XY } from '@shared/units'

/** A line without vertices that come nearer than a step to the last one kept; its ends always stay. For drawing only. */
export function thinLine(line: readonly XY[], step: Metres): XY[] {
  const kept: XY[] = []
  let last: XY | undefined
  line.forEach((vertex, index) => {
    const isEnd = index === 0 || index === line.length - 1
    if (!isEnd && last && gridDistance(last, vertex) < step) return
    kept.push(vertex)
    last = vertex
  })
  return kept
}
