import type { LocationConfidence } from '@shared/items/confidence'
import type { LineTarget, PointTarget } from '@shared/intake/mapping'
import { foldForms, otherLineTypes, type faultTypes } from '@shared/items/lines'
import { planeTypes } from '@shared/items/points'
import { legendEntries, type LegendEntry } from '@shared/symbols/legend-entries'

/** One choice of what a value becomes. */
export interface TargetOption<T> {
  key: string
  title: string
  target: T
}

export interface TargetGroup<T> {
  title: string
  options: TargetOption<T>[]
}

const faultTitles: Record<(typeof faultTypes)[number], string> = {
  unspecified: 'Fault, type not stated',
  normal: 'Normal fault',
  reverse: 'Reverse fault',
  thrust: 'Thrust',
  'left-lateral': 'Left-lateral fault',
  'right-lateral': 'Right-lateral fault',
}

const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1).replaceAll('-', ' ')
const option = <T extends LineTarget | PointTarget>(title: string, target: T): TargetOption<T> => ({
  key: targetKey(target),
  title,
  target,
})

/** A target as one word, for the value of a form control. */
export const targetKey = (target: LineTarget | PointTarget): string => Object.values(target).join('.')

export const LEAVE_OUT = 'leave-out'

export const lineTargets: TargetGroup<LineTarget>[] = [
  { title: 'Contacts', options: [option('Contact', { kind: 'contact' })] },
  {
    title: 'Faults',
    // The keys of a record of all types are those types.
    options: (Object.keys(faultTitles) as (keyof typeof faultTitles)[]).map((type) =>
      option(faultTitles[type], { kind: 'fault', type }),
    ),
  },
  {
    title: 'Axial traces',
    options: foldForms.map((form) => option(capital(form), { kind: 'axial-trace', form })),
  },
  {
    title: 'Other lines',
    options: otherLineTypes.map((type) => option(capital(type), { kind: 'other-line', type })),
  },
]

export const pointTargets: TargetGroup<PointTarget>[] = [
  {
    title: 'Attitudes',
    options: planeTypes.flatMap((type) => {
      const upright = option<PointTarget>(capital(type), { kind: 'attitude', type, overturned: false })
      const overturned = option<PointTarget>(`${capital(type)}, overturned`, {
        kind: 'attitude',
        type,
        overturned: true,
      })
      return type === 'bedding' ? [upright, overturned] : [upright]
    }),
  },
  { title: 'Other points', options: [option('Station', { kind: 'station' })] },
]

/** The option that a target is; undefined for leaving out. */
export const optionOf = <T extends LineTarget | PointTarget>(
  groups: readonly TargetGroup<T>[],
  target: T,
): TargetOption<T> | undefined =>
  groups.flatMap(({ options }) => options).find(({ key }) => key === targetKey(target))

/** The legend entry that a target will be drawn as; undefined where it is left out. */
export function entryOf(
  target: LineTarget | PointTarget,
  confidence: LocationConfidence,
): LegendEntry | undefined {
  return legendEntries.find((entry) => entry.kind === target.kind && fits(entry, target, confidence))
}

function fits(entry: LegendEntry, target: LineTarget | PointTarget, confidence: LocationConfidence): boolean {
  if (entry.kind === 'station') return target.kind === 'station'
  if (entry.kind === 'attitude') {
    const { type, overturned } = entry.properties
    return target.kind === 'attitude' && type === target.type && overturned === target.overturned
  }
  if (entry.properties.locationConfidence !== confidence) return false
  switch (entry.kind) {
    case 'contact':
      return true
    case 'fault':
      return target.kind === 'fault' && entry.properties.type === target.type
    case 'axial-trace':
      return target.kind === 'axial-trace' && entry.properties.form === target.form
    case 'other-line':
      return target.kind === 'other-line' && entry.properties.type === target.type
  }
}
