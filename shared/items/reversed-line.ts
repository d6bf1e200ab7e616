import type { LineItem } from './item'
import { otherSide, reversedSide } from './lines'

/** A line turned round, saying the same of the ground: the side of a fault or fold is renamed, while a fold's trend is an
 *  azimuth of its own that no direction of drawing touches. */
export function reversedLine(item: LineItem): LineItem {
  const geometry = { ...item.geometry, coordinates: item.geometry.coordinates.toReversed() }
  if (item.kind === 'fault') {
    return { ...item, geometry, properties: { ...item.properties, side: reversedSide(item.properties) } }
  }
  if (item.kind === 'axial-trace') {
    return { ...item, geometry, properties: { ...item.properties, side: otherSide(item.properties.side) } }
  }
  return { ...item, geometry }
}
