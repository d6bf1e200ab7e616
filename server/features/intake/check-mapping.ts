import type { Mapping } from '@shared/intake/mapping'
import type { IntakeColumn } from '@shared/intake/report'

/** What is wrong with a mapping for a file with these columns, with JSON pointers into the request. */
export function findMappingFaults(
  mapping: Mapping,
  columns: readonly IntakeColumn[],
): { pointer: string; detail: string }[] {
  const names = new Set(columns.map((column) => column.name))
  const faults = (['lines', 'points'] as const).flatMap((form) =>
    Object.entries(mapping[form])
      .filter(([field, value]) => field.endsWith('Column') && typeof value === 'string' && !names.has(value))
      .map(([field, value]) => ({
        pointer: `/mapping/${form}/${field}`,
        detail: `The file has no column “${String(value)}”.`,
      })),
  )
  if (mapping.northReference === 'magnetic' && mapping.declination === null) {
    const detail = 'Azimuths from magnetic north need the declination at the place and date of the readings.'
    faults.push({ pointer: '/mapping/declination', detail })
  }
  return faults
}
