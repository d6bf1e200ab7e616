import type { StationProperties } from '../items/points'
import { azimuthFigure } from '../structure/compass'
import { placeSymbolOf } from './draw-place'

/** A place in words: `Station 214`, `Mine adit, goes in toward 045°`. */
export function describePlace({
  type,
  name,
  azimuth,
}: Pick<StationProperties, 'type' | 'name' | 'azimuth'>): string {
  const { title, azimuth: meaning } = placeSymbolOf(type)
  const named = name === '' ? title : `${title} ${name}`
  if (meaning === undefined || azimuth === null) return named
  return `${named}, ${meaning.charAt(0).toLowerCase()}${meaning.slice(1)} ${azimuthFigure(azimuth)}°`
}
