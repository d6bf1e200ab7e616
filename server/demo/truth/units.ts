import type { UnitProperties } from '@shared/items/legend'
import type { Metres } from '@shared/units'
import type { CoverKind } from './cover'

type Described = Omit<UnitProperties, 'rank'>

/** A layer of the island: its top in stratigraphic height, metres; the youngest of a series has none. */
export interface Layer extends Described {
  top: Metres
}

/** Nearly level beds on a worn surface of the folded ones, youngest first. Heights are above that surface. */
export const youngerLayers: readonly Layer[] = [
  {
    label: 'Kl',
    name: 'Lintel Limestone',
    age: 'Cretaceous',
    colour: '#e4eed6',
    pattern: 'limestone',
    description: 'white limestone with flints; top not seen, more than 120 m',
    top: Infinity,
  },
  {
    label: 'Js',
    name: 'Sandglass Sandstone',
    age: 'Jurassic',
    colour: '#c9cfe8',
    pattern: 'sandstone',
    description: 'yellow sandstone, cross-bedded, friable; 55 m',
    top: 150,
  },
  {
    label: 'Jm',
    name: 'Marram Marl',
    age: 'Jurassic',
    colour: '#9fb2d4',
    pattern: 'marl',
    description: 'blue-grey marl with oyster beds; 55 m',
    top: 95,
  },
  {
    label: 'Trt',
    name: 'Tern Conglomerate',
    age: 'Triassic',
    colour: '#c3a9c4',
    pattern: 'conglomerate',
    description: 'red conglomerate, pebbles of quartzite and chert from below; 40 m',
    top: 40,
  },
]

/** Folded layers, youngest first. Thickness is that of the crests; limbs are thinner. */
export const foldedLayers: readonly Layer[] = [
  {
    label: 'Mk',
    name: 'Kittiwake Grit',
    age: 'Mississippian',
    colour: '#d2c3dd',
    pattern: 'sandstone',
    description: 'coarse pebbly sandstone, cross-bedded; top not seen',
    top: Infinity,
  },
  {
    label: 'Ms',
    name: 'Sealholm Beds',
    age: 'Mississippian',
    colour: '#a9b6bf',
    pattern: 'shale',
    description: 'grey mudstone with thin sandstones and plant remains; 350 to 650 m',
    top: 2350,
  },
  {
    label: 'Df',
    name: 'Fulmar Sandstone',
    age: 'Devonian',
    colour: '#cf9f8c',
    pattern: 'sandstone',
    description: 'red sandstone, thick-bedded, with lenses of conglomerate; 300 to 620 m',
    top: 1700,
  },
  {
    label: 'Dm',
    name: 'Mizzen Shale',
    age: 'Devonian',
    colour: '#e2c3b0',
    pattern: 'shale',
    description: 'dark fissile shale with thin beds of limestone; 260 to 520 m',
    top: 1080,
  },
  {
    label: 'Dl',
    name: 'Lantern Limestone',
    age: 'Devonian',
    colour: '#ab7c64',
    pattern: 'limestone',
    description: 'black bedded limestone, a ridge-former; 70 to 140 m',
    top: 560,
  },
  {
    label: 'Sd',
    name: 'Spindrift Dolomite',
    age: 'Silurian',
    colour: '#bcd2cd',
    pattern: 'dolomite',
    description: 'nodular dolomite with corals, massive at the top; 180 to 360 m',
    top: 420,
  },
  {
    label: 'Sr',
    name: 'Razorbill Siltstone',
    age: 'Silurian',
    colour: '#93b3a5',
    pattern: 'siltstone',
    description: 'laminated calcareous siltstone; 240 to 480 m',
    top: 60,
  },
  {
    label: 'Sc',
    name: 'Scoter Chert',
    age: 'Silurian',
    colour: '#6f9d98',
    pattern: 'chert',
    description: 'ribbon chert, green and red; 60 to 120 m',
    top: -420,
  },
  {
    label: 'Oe',
    name: 'Eider Formation',
    age: 'Ordovician',
    colour: '#cdd393',
    pattern: 'none',
    description: 'sandstone and shale in turn, graded, with sole marks; 300 to 610 m',
    top: -540,
  },
  {
    label: 'Ov',
    name: 'Vane Tuff',
    age: 'Ordovician',
    colour: '#b9a6a9',
    pattern: 'tuff',
    description: 'pale welded tuff, quartz and feldspar crystals; 90 to 180 m',
    top: -1150,
  },
  {
    label: 'Ot',
    name: 'Thrift Slate',
    age: 'Ordovician',
    colour: '#aab57f',
    pattern: 'slate',
    description: 'cleaved slate, grey-green; 310 to 620 m',
    top: -1330,
  },
  {
    label: 'Op',
    name: 'Petrel Quartzite',
    age: 'Ordovician',
    colour: '#dcc08b',
    pattern: 'quartzite',
    description: 'white quartzite, massive, ripple-marked near its base; 200 to 400 m',
    top: -1950,
  },
  {
    label: 'Zs',
    name: 'Stormcrest Group',
    age: 'Ediacaran',
    colour: '#c59d78',
    pattern: 'gneiss',
    description: 'banded gneiss and greywacke; base not seen',
    top: -2350,
  },
]

/** Cover, younger than all folding, in the order of the legend. */
export const coverUnits: readonly (Described & { cover: CoverKind })[] = [
  {
    cover: 'sea',
    label: 'w',
    name: 'Sea',
    age: '',
    colour: '#d9ebf0',
    pattern: 'none',
    description: 'at mean sea level',
  },
  {
    cover: 'alluvium',
    label: 'Qa',
    name: 'Alluvium',
    age: 'Quaternary',
    colour: '#f7f0d4',
    pattern: 'alluvium',
    description: 'sand and gravel of the present valleys',
  },
  {
    cover: 'peat',
    label: 'Qp',
    name: 'Blanket peat',
    age: 'Quaternary',
    colour: '#cdcec3',
    pattern: 'peat',
    description: 'peat, one to four metres, on the high ground',
  },
  {
    cover: 'talus',
    label: 'Qt',
    name: 'Talus',
    age: 'Quaternary',
    colour: '#f1dbe2',
    pattern: 'talus',
    description: 'angular blocks at the foot of steep slopes',
  },
]

/** The label of a unit on the map, from that label or from the kind of cover. */
export const unitLabelOf = (shows: string): string =>
  coverUnits.find(({ cover }) => cover === shows)?.label ?? shows

/** Legend of the island, in its order. */
export const legendUnits: readonly Described[] = [
  ...coverUnits.map(({ cover: _, ...described }) => described),
  ...[...youngerLayers, ...foldedLayers].map(({ top: _, ...described }) => described),
]

/** Heights at which one layer of a series gives way to the next, youngest first. */
export const levelsOf = (layers: readonly Layer[]): Metres[] =>
  layers.map((layer) => layer.top).filter(Number.isFinite)

/** The layer at a stratigraphic height. A layer holds its top. */
export function layerAt(layers: readonly Layer[], height: Metres): Layer {
  const layer = layers.findLast(({ top }) => height <= top)
  if (!layer) throw new RangeError(`No layer holds the height ${height}.`)
  return layer
}

/** Beds too thin to be areas, by their height. */
export const markerBeds = [
  { name: 'Coral bed', height: 180 },
  { name: 'Sealholm seam', height: 2050 },
] as const
