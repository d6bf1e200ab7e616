import { gridLength } from '@shared/geometry/bearings'
import type { Item, ItemOf, LineItem } from '@shared/items/item'
import type { UnitProperties } from '@shared/items/legend'
import { describeAttitude } from '@shared/structure/attitude-words'
import { describeFault } from '@shared/structure/fault-words'
import { describeFold } from '@shared/structure/fold-words'
import { sideWords } from '@shared/structure/line-side'
import { describeLineation } from '@shared/structure/lineation-words'
import { legendEntryOf } from '@shared/symbols/legend-entries'
import { describePlace } from '@shared/symbols/place-words'
import type { Degrees, Metres, XY } from '@shared/units'
import { lowerFirst, upperFirst } from '@shared/words'

/** What the words of an item need beside it. */
export interface WordsContext {
  unitOf(id: string): UnitProperties | undefined
  /** Grid convergence at a place, degrees, clockwise positive. */
  convergenceAt(xy: XY): Degrees
}

/** An item as a sentence, for the title of its slip. */
export function itemTitle(item: Item, context: WordsContext): string {
  switch (item.kind) {
    case 'contact':
    case 'other-line':
      return questioned(item, legendEntryOf(item).title)
    case 'fault':
      return questioned(item, located(item, faultTitle(item, context)))
    case 'axial-trace':
      return questioned(item, located(item, foldTitle(item, context)))
    case 'attitude':
      return attitudeTitle(item)
    case 'lineation':
      return describeLineation(item.properties)
    case 'station':
      return describePlace(item.properties)
    case 'unit-label':
      return unitLabelTitle(context.unitOf(item.properties.unit), item.properties.identity)
    case 'unit':
      return item.properties.name
    case 'sheet-face':
      return 'Sheet face'
  }
}

const questioned = (item: LineItem, title: string): string =>
  item.properties.identity === 'questionable' ? `${title}, questioned` : title

function unitLabelTitle(unit: UnitProperties | undefined, identity: string): string {
  const name = unit ? `${unit.label}, ${unit.name}` : 'Label of a unit that is not in the legend'
  return identity === 'questionable' ? `${name}, questioned` : name
}

function attitudeTitle({ properties }: ItemOf<'attitude'>): string {
  const type = upperFirst(properties.type)
  const words = describeAttitude(properties)
  const separator = words.startsWith('Horizontal') ? ', ' : ' '
  return `${type}${separator}${lowerFirst(words)}`
}

const located = (item: LineItem, title: string): string => {
  const { locationConfidence } = item.properties
  return locationConfidence === 'certain' ? title : `${title}, ${locationConfidence}`
}

function faultTitle({ properties, geometry }: ItemOf<'fault'>, { convergenceAt }: WordsContext): string {
  return describeFault(properties, geometry.coordinates, convergenceAt)
}

function foldTitle({ properties, geometry }: ItemOf<'axial-trace'>, { convergenceAt }: WordsContext): string {
  return describeFold(properties, sideWords(geometry.coordinates, properties.side, convergenceAt))
}

/** The first facts beneath the title: proper name, length, station. */
export function itemFacts(item: Item): string[] {
  if (item.geometry?.type === 'LineString' && 'name' in item.properties) {
    return [item.properties.name, lengthWords(gridLength(item.geometry.coordinates))].filter(Boolean)
  }
  if ((item.kind === 'attitude' || item.kind === 'lineation') && item.properties.station)
    return [`station ${item.properties.station}`]
  return []
}

/** A length as a person says it: `310 m`, `4.2 km`. */
export const lengthWords = (length: Metres): string =>
  length < 1000 ? `${Math.round(length)} m` : `${(length / 1000).toFixed(length < 10_000 ? 1 : 0)} km`
