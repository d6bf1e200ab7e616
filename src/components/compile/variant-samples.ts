import type { ItemKind } from '@shared/items/item'
import type { AxialTraceProperties, FaultProperties, OtherLineProperties } from '@shared/items/lines'
import type { AttitudeProperties, LineationProperties, StationType } from '@shared/items/points'
import { drawEntry, legendEntries, type LegendEntry } from '@shared/symbols/legend-entries'
import type { SampleOption } from '@/components/common/location-samples'

const SAMPLE = { width: 11, height: 6 }

interface Variants {
  fault: FaultProperties['type']
  'axial-trace': AxialTraceProperties['form']
  'other-line': OtherLineProperties['type']
}

/** The types of a line kind, or the forms of a fold, as drawn samples. */
export function variantOptions<K extends keyof Variants>(kind: K): SampleOption<Variants[K]>[] {
  return legendEntries.flatMap((entry) => {
    if (!isCertain(entry, kind)) return []
    const { properties } = entry
    const value = 'form' in properties ? properties.form : 'type' in properties ? properties.type : undefined
    if (value === undefined) return []
    return [
      {
        // The kind of the entry decides the type of its variant; TypeScript does not follow that through the filter.
        value: value as Variants[K],
        title: entry.title.replace(/, certain$/, ''),
        list: drawEntry(entry, SAMPLE),
        box: { x: 0, y: 0, ...SAMPLE },
      },
    ]
  })
}

const isCertain = (entry: LegendEntry, kind: ItemKind): boolean =>
  entry.kind === kind &&
  'locationConfidence' in entry.properties &&
  entry.properties.locationConfidence === 'certain'

interface PointTypes {
  attitude: AttitudeProperties['type']
  lineation: LineationProperties['type']
  station: StationType
}

/** Arrows with their figures are longer than strike lines. */
const pointSamples: Record<keyof PointTypes, { width: number; height: number }> = {
  attitude: { width: 8, height: 6 },
  lineation: { width: 11, height: 6 },
  station: { width: 6, height: 6 },
}

/** The types of a kind of point, as drawn samples: of planes and lines, the plainest one of each. */
export function pointTypeOptions<K extends keyof PointTypes>(kind: K): SampleOption<PointTypes[K]>[] {
  const seen = new Set<string>()
  const size = pointSamples[kind]
  return legendEntries.flatMap((entry) => {
    if (entry.kind !== kind || !('type' in entry.properties)) return []
    const { type } = entry.properties
    if (seen.has(type)) return []
    seen.add(type)
    return [
      {
        // The kind of the entry decides the type; TypeScript does not follow that through the filter.
        value: type as PointTypes[K],
        title: entry.title.replace(/,.*$/, ''),
        list: drawEntry(entry, size),
        box: { x: 0, y: 0, ...size },
      },
    ]
  })
}
