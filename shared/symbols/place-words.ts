import type { StationProperties } from '../items/points'
import { azimuthFigure } from '../structure/compass'
import { placeSymbolOf } from './draw-place'
import { lowerFirst } from '../words'

/** A place in words: `Station 214`, `Mine adit, goes in toward 045°`. */
export function describePlace({
  type,
  name,
  azimuth,
}: Pick<StationProperties, 'type' | 'name' | 'azimuth'>): string {
  const { title, azimuth: meaning } = placeSymbolOf(type)
  const named = name === '' ? title : `${title} ${name}`
  if (meaning === undefined || azimuth === null) return named
  return `${named}, ${lowerFirst(meaning)} ${azimuthFigure(azimuth)}°`
}
