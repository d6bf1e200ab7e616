import type { ItemOf, LineItem } from '../items/item'

export type LegendPointKind = 'attitude' | 'lineation' | 'station'

/** Kinds of item that the legend explains by a drawn sample; units have swatches instead. */
export type LegendKind = LineItem['kind'] | LegendPointKind

interface EntryOf<K extends LegendKind> {
  /** Stable name, for example `fault.normal.certain`. */
  id: string
  kind: K
  group: 'lines' | 'points'
  title: string
  /** What its decoration tells; said once where several entries share it. */
  explains?: string
  /** What an item drawn with this entry starts with. Angles are those of the sample. */
  properties: ItemOf<K>['properties']
  /** Explains what is on the map, but is no pen: one picks a plainer entry and says the rest of the item. */
  onlyExplains?: true
}

/** A row of the legend, and a pen of the palette: one for each symbol that looks different. */
export type LegendEntry = { [K in LegendKind]: EntryOf<K> }[LegendKind]

/** An entry of a point. */
export type PointEntry = Extract<LegendEntry, { kind: LegendPointKind }>
