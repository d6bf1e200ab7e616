import type { LocationConfidence } from '@shared/items/confidence'
import { lineTargetSchema, type LineTarget, type PointTarget } from '@shared/intake/mapping'
import { lineKinds } from '@shared/items/item'
import { planeTypes } from '@shared/items/points'
import { lineations } from '@shared/symbols/definitions/lineations'
import { places } from '@shared/symbols/definitions/points'
import { lineSymbols } from '@shared/symbols/draw-item'
import { legendEntries, type LegendEntry } from '@shared/symbols/legend-entries'
import type { Option, OptionGroup } from './option-groups'
import { upperFirst } from '@shared/words'

/** One choice of what a value becomes. */
export interface TargetOption<T> extends Option {
  target: T
}

export interface TargetGroup<T> extends OptionGroup {
  options: readonly TargetOption<T>[]
}

type Target = LineTarget | PointTarget

export const LEAVE_OUT = 'leave-out'

/** A target as one word, for the value of a form control; whatever the order of its properties, which storage changes. */
export const targetKey = ({ kind, ...properties }: Target): string =>
  [
    kind,
    ...Object.entries(properties)
      .sort()
      .map(([, value]) => String(value)),
  ].join('.')

const option = <T extends Target>(title: string, target: T): TargetOption<T> => ({
  key: targetKey(target),
  title,
  target,
})

const lineGroupTitles: Record<(typeof lineKinds)[number], string> = {
  contact: 'Contacts',
  fault: 'Faults',
  'axial-trace': 'Axial traces',
  'other-line': 'Other lines',
}

/** Every line that has a symbol, with the symbol's name. */
export const lineTargets: readonly TargetGroup<LineTarget>[] = lineKinds.map((kind) => ({
  title: lineGroupTitles[kind],
  options: lineSymbols
    .filter((symbol) => symbol.kind === kind)
    .map(({ variant, title }) => option(title, lineTarget(kind, variant))),
}))

function lineTarget(kind: (typeof lineKinds)[number], variant: string): LineTarget {
  if (kind === 'contact') return { kind }
  return lineTargetSchema.parse(kind === 'axial-trace' ? { kind, form: variant } : { kind, type: variant })
}

const either = [false, true]
const traits = either.flatMap((overturned) =>
  either.flatMap((topsKnown) => either.map((undulating) => ({ overturned, topsKnown, undulating }))),
)

/** Every point that has a symbol; of planes, with each trait that their symbol can show. */
export const pointTargets: readonly TargetGroup<PointTarget>[] = [
  {
    title: 'Attitudes',
    options: planeTypes
      .flatMap((type) => traits.map((trait): PointTarget => ({ kind: 'attitude', type, ...trait })))
      .filter((target) => entryOf(target, 'certain') !== undefined)
      .map((target) => option(planeTitle(target), target)),
  },
  {
    title: 'Lineations',
    options: lineations.map(({ type, title }) => option<PointTarget>(title, { kind: 'lineation', type })),
  },
  {
    title: 'Places',
    options: places.map(({ type, title }) => option<PointTarget>(title, { kind: 'station', type })),
  },
]

function planeTitle(target: PointTarget): string {
  if (target.kind !== 'attitude') return ''
  const { type, overturned, topsKnown, undulating } = target
  const words = [overturned && 'overturned', topsKnown && 'tops known', undulating && 'undulating']
  return [upperFirst(type).replaceAll('-', ' '), ...words.filter(Boolean)].join(', ')
}

/** The option with a key. */
export const optionWith = <T extends Target>(
  groups: readonly TargetGroup<T>[],
  key: string,
): TargetOption<T> | undefined => groups.flatMap(({ options }) => options).find((each) => each.key === key)

/** The legend entry that a target will be drawn as; undefined where it is left out. */
export function entryOf(target: Target, confidence: LocationConfidence): LegendEntry | undefined {
  return legendEntries.find((entry) => agrees(entry, target, confidence))
}

/** Whether an entry has all that a target says, and the confidence if it is a line. */
function agrees(entry: LegendEntry, target: Target, confidence: LocationConfidence): boolean {
  const properties = new Map<string, unknown>(Object.entries({ kind: entry.kind, ...entry.properties }))
  const stated = properties.get('locationConfidence') ?? confidence
  return (
    stated === confidence && Object.entries(target).every(([name, value]) => properties.get(name) === value)
  )
}
