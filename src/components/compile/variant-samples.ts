import type { ItemKind } from '@shared/items/item'
import type { AxialTraceProperties, FaultProperties, OtherLineProperties } from '@shared/items/lines'
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
