import type { LocationConfidence } from '@shared/items/confidence'
import { locationConfidences } from '@shared/items/confidence'
import { legendEntries, type LegendEntry } from '@shared/symbols/legend-entries'
import { isSame } from '@shared/changes/same-value'

/** How well located what an entry draws is; null for points. */
export function locationOf(entry: LegendEntry): LocationConfidence | null {
  const stated = Reflect.get(entry.properties, 'locationConfidence')
  return locationConfidences.find((confidence) => confidence === stated) ?? null
}

const withoutLocation = (entry: LegendEntry): object => ({
  ...entry.properties,
  locationConfidence: undefined,
})

/** The entries that differ from this one in nothing but how well the line is located, itself among them. */
export function locationSiblings(entry: LegendEntry): LegendEntry[] {
  if (locationOf(entry) === null) return []
  const own = withoutLocation(entry)
  return legendEntries.filter(
    (other) => other.kind === entry.kind && locationOf(other) !== null && isSame(withoutLocation(other), own),
  )
}
