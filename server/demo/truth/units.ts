import type { UnitProperties } from '@shared/items/legend'
import type { Metres } from '@shared/units'

/** A layer of the demo: its top in stratigraphic height, metres; the youngest has none. */
export interface Layer extends Omit<UnitProperties, 'rank'> {
  top: Metres
}

/** Folded layers, youngest first. */
export const layers: readonly Layer[] = [
  {
    label: 'Ck',
    name: 'Kittiwake Grit',
    age: 'Carboniferous',
    colour: '#e3d2b0',
    pattern: 'conglomerate',
    description: 'coarse pebbly sandstone, cross-bedded, in beds of one to three metres',
    top: Infinity,
  },
  {
    label: 'Cs',
    name: 'Sealholm Beds',
    age: 'Carboniferous',
    colour: '#d5c39f',
    pattern: 'none',
    description: 'grey mudstone with thin sandstones and plant remains',
    top: 1960,
  },
  {
    label: 'Df',
    name: 'Fulmar Sandstone',
    age: 'Devonian',
    colour: '#cf9f8c',
    pattern: 'sandstone',
    description: 'red sandstone, thick-bedded, with lenses of conglomerate',
    top: 1330,
  },
  {
    label: 'Dm',
    name: 'Mizzen Shale',
    age: 'Devonian',
    colour: '#dcbba8',
    pattern: 'shale',
    description: 'dark fissile shale with thin beds of limestone',
    top: 700,
  },
  {
    label: 'Sp',
    name: 'Spindrift Limestone',
    age: 'Silurian',
    colour: '#b7cdc9',
    pattern: 'limestone',
    description: 'nodular limestone with corals, massive at the top',
    top: 190,
  },
  {
    label: 'Sr',
    name: 'Razorbill Siltstone',
    age: 'Silurian',
    colour: '#93b3a5',
    pattern: 'siltstone',
    description: 'laminated calcareous siltstone',
    top: -260,
  },
  {
    label: 'Oe',
    name: 'Eider Formation',
    age: 'Ordovician',
    colour: '#c6cd9d',
    pattern: 'none',
    description: 'sandstone and shale in turn, graded, with sole marks',
    top: -760,
  },
  {
    label: 'Ot',
    name: 'Thrift Slate',
    age: 'Ordovician',
    colour: '#aab57f',
    pattern: 'slate',
    description: 'cleaved slate, grey-green, with bands of tuff',
    top: -1330,
  },
  {
    label: 'Cmp',
    name: 'Petrel Quartzite',
    age: 'Cambrian',
    colour: '#dcc08b',
    pattern: 'quartzite',
    description: 'white quartzite, massive, ripple-marked near its base',
    top: -1800,
  },
  {
    label: 'Zs',
    name: 'Stormcrest Group',
    age: 'Precambrian',
    colour: '#c9a57c',
    pattern: 'none',
    description: 'greywacke and conglomerate, much folded',
    top: -2330,
  },
]

/** Cover, younger than all folding, youngest first. */
export const coverUnits: readonly ({ cover: 'alluvium' | 'peat' } & Omit<UnitProperties, 'rank'>)[] = [
  {
    cover: 'alluvium',
    label: 'Qa',
    name: 'Alluvium',
    age: 'Quaternary',
    colour: '#f4ecd2',
    pattern: 'alluvium',
    description: 'sand and gravel of the present valleys',
  },
  {
    cover: 'peat',
    label: 'Qp',
    name: 'Blanket peat',
    age: 'Quaternary',
    colour: '#e2dfc9',
    pattern: 'peat',
    description: 'peat, one to four metres, on the high ground',
  },
]

/** Heights at which one layer gives way to the next, youngest first. */
export const contactHeights: readonly Metres[] = layers.map((layer) => layer.top).filter(Number.isFinite)

/** Number of the layer at a stratigraphic height. A layer holds its top. */
export function layerAt(height: Metres): number {
  return layers.reduce((found, layer, index) => (height <= layer.top ? index : found), 0)
}

/** Height of the marker bed within its layer. */
export const markerBed = { name: 'Coral bed', height: -40 } as const
