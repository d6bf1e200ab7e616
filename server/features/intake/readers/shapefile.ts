import { parseShp } from 'shpjs'
import type { IntakeRecord } from '@shared/intake/records'
import { cleanAttributes } from './clean-attributes'
import { readDbf } from './dbf'
import { readGeometry } from './geojson-geometry'
import { readPrj } from './prj-system'
import { unreadable, type ReadOutcome, type Unreadable } from './read-outcome'
import { toDegrees } from './to-degrees'

/** The files of a shapefile that are read: shapes, their table, its encoding, their coordinate system. */
export const shapefileEndings = ['shp', 'dbf', 'cpg', 'prj'] as const

interface Layer {
  outcome: 'layer'
  name: string
  records: IntakeRecord[]
  /** Name of the system that its coordinates were converted from. */
  system: string | undefined
  notes: string[]
}

/** Reads the shapefiles of an archive. Records run on from one to the next; where there are several, the column `layer`
 *  says which one a record is from. Source: ESRI Shapefile Technical Description, 1998, by way of shpjs. */
export function readShapefile(files: ReadonlyMap<string, Uint8Array>): ReadOutcome {
  const shapes = [...files.keys()].filter((name) => /\.shp$/i.test(name))
  const layers: Layer[] = []
  for (const shape of shapes) {
    const layer = readLayer(files, shape.slice(0, -4))
    if (layer.outcome === 'unreadable') return unreadable(`${fileName(shape)}: ${layer.reason}`)
    layers.push(layer)
  }
  const records = layers.flatMap((layer) =>
    layers.length === 1 ? layer.records : layer.records.map((record) => withLayer(record, layer.name)),
  )
  const systems = [...new Set(layers.flatMap(({ system }) => system ?? []))]
  return {
    outcome: 'read',
    reader: 'shapefile',
    records: records.map((record, index) => ({ ...record, number: index + 1 })),
    notes: layers.flatMap(({ notes }) => notes),
    ...(systems.length > 0 ? { system: systems.join(' or ') } : {}),
  }
}

const fileName = (path: string): string => path.split('/').at(-1) ?? path

const withLayer = (record: IntakeRecord, layer: string): IntakeRecord =>
  Object.hasOwn(record.attributes, 'layer')
    ? record
    : { ...record, attributes: { ...record.attributes, layer } }

function readLayer(files: ReadonlyMap<string, Uint8Array>, base: string): Layer | Unreadable {
  const companion = (ending: string) =>
    [...files].find(([name]) => name.toLowerCase() === `${base}.${ending}`.toLowerCase())?.[1]
  const shapes = readShapes(companion('shp') ?? new Uint8Array())
  if (shapes.outcome === 'unreadable') return shapes
  const table = companion('dbf')
  const rows = table
    ? readDbf(table, companion('cpg'))
    : {
        outcome: 'rows' as const,
        rows: [],
        notes: ['It has no .dbf file, so its records have no attributes.'],
      }
  if (rows.outcome === 'unreadable') return rows
  if (table && rows.rows.length !== shapes.shapes.length) {
    return unreadable(
      `Its table has ${rows.rows.length} rows for ${shapes.shapes.length} shapes: they do not belong together.`,
    )
  }
  const records = shapes.shapes.map((geometry, index) => ({
    number: index + 1,
    parts: readGeometry(geometry),
    attributes: cleanAttributes(rows.rows[index] ?? {}),
  }))
  return placed({ name: fileName(base), records, notes: rows.notes }, companion('prj'))
}

function placed(
  { name, records, notes }: Pick<Layer, 'name' | 'records' | 'notes'>,
  prj: Uint8Array | undefined,
): Layer | Unreadable {
  const say = (sentences: readonly string[]) => sentences.map((sentence) => `${name}.shp: ${sentence}`)
  if (!prj) {
    const note = 'It has no .prj file; its coordinates were read as longitude and latitude (WGS 84).'
    return { outcome: 'layer', name, records, system: undefined, notes: say([...notes, note]) }
  }
  const system = readPrj(new TextDecoder().decode(prj))
  if (system.outcome === 'unreadable') return system
  if (!system.projection) return { outcome: 'layer', name, records, system: undefined, notes: say(notes) }
  const note = `Its coordinates were converted from ${system.name} to longitude and latitude (WGS 84).`
  return {
    outcome: 'layer',
    name,
    records: toDegrees(records, system.projection),
    system: system.name,
    notes: say([...notes, note]),
  }
}

const FILE_CODE = 9994
const HEADER_BYTES = 100

function readShapes(
  bytes: Uint8Array,
): { outcome: 'shapes'; shapes: ReturnType<typeof parseShp> } | Unreadable {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (bytes.length < HEADER_BYTES || view.getInt32(0) !== FILE_CODE) {
    return unreadable('It does not begin as a shapefile does.')
  }
  // Lengths are counted in words of two bytes.
  const length = view.getInt32(24) * 2
  if (length > bytes.length) return unreadable(`It is cut off: ${bytes.length} of ${length} bytes are there.`)
  try {
    return { outcome: 'shapes', shapes: parseShp(bytes) }
  } catch {
    return unreadable('It is not whole: its shapes cannot be read.')
  }
}
