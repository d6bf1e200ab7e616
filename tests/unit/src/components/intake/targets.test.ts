import { describe, expect, it } from 'vitest'
import {
  lineTargetSchema,
  pointTargetSchema,
  type LineTarget,
  type PointTarget,
} from '@shared/intake/mapping'
import { faultTypes, foldForms, otherLineTypes } from '@shared/items/lines'
import { lineationTypes, planeTypes, stationTypes } from '@shared/items/points'
import {
  entryOf,
  lineTargets,
  optionWith,
  pointTargets,
  targetKey,
  type TargetOption,
} from '@/components/intake/targets'

const all: TargetOption<LineTarget | PointTarget>[] = [
  ...lineTargets.flatMap(({ options }) => options),
  ...pointTargets.flatMap(({ options }) => options),
]
const offered = (kind: string, field: string) =>
  new Set(
    all.flatMap(({ target }) =>
      target.kind === kind ? [new Map<string, unknown>(Object.entries(target)).get(field)] : [],
    ),
  )

describe('the choices of what a value becomes', () => {
  it('hold every type that an item can have', () => {
    expect(offered('fault', 'type')).toEqual(new Set(faultTypes))
    expect(offered('axial-trace', 'form')).toEqual(new Set(foldForms))
    expect(offered('other-line', 'type')).toEqual(new Set(otherLineTypes))
    expect(offered('attitude', 'type')).toEqual(new Set(planeTypes))
    expect(offered('lineation', 'type')).toEqual(new Set(lineationTypes))
    expect(offered('station', 'type')).toEqual(new Set(stationTypes))
  })

  it('are targets that the server takes, each with a key and a title of its own', () => {
    for (const { options } of lineTargets)
      for (const { target } of options) expect(lineTargetSchema.parse(target)).toEqual(target)
    for (const { options } of pointTargets)
      for (const { target } of options) expect(pointTargetSchema.parse(target)).toEqual(target)
    expect(new Set(all.map(({ key }) => key)).size).toBe(all.length)
    expect(new Set(all.map(({ title }) => title)).size).toBe(all.length)
  })

  it('offer of planes only what their symbols tell apart', () => {
    const titles = pointTargets[0]?.options.map(({ title }) => title) ?? []
    expect(titles).toContain('Bedding')
    expect(titles).toContain('Bedding, overturned')
    expect(titles).toContain('Bedding, tops known')
    expect(titles).toContain('Foliation, undulating')
    expect(titles).not.toContain('Joint, overturned')
  })
})

describe('the key of a target', () => {
  it('is the same whatever the order of its properties, as storage changes it', () => {
    const stored = { form: 'anticline', kind: 'axial-trace' } as const
    expect(targetKey(stored)).toBe(targetKey({ kind: 'axial-trace', form: 'anticline' }))
    expect(optionWith(lineTargets, targetKey(stored))?.title).toBe('Anticline')
  })

  it('names no option where it is left out', () => {
    expect(optionWith(lineTargets, targetKey({ kind: 'leave-out' }))).toBeUndefined()
  })
})

describe('the legend entry of a target', () => {
  it('is the one that its item will be drawn with', () => {
    expect(entryOf({ kind: 'contact' }, 'inferred')).toMatchObject({
      kind: 'contact',
      properties: { locationConfidence: 'inferred' },
    })
    expect(entryOf({ kind: 'fault', type: 'thrust' }, 'concealed')).toMatchObject({
      properties: { type: 'thrust', locationConfidence: 'concealed' },
    })
    expect(entryOf({ kind: 'station', type: 'spring' }, 'certain')).toMatchObject({
      kind: 'station',
      properties: { type: 'spring' },
    })
  })

  it('is there for every choice, and for nothing that is left out', () => {
    expect(all.filter(({ target }) => entryOf(target, 'approximate') === undefined)).toEqual([])
    expect(entryOf({ kind: 'leave-out' }, 'certain')).toBeUndefined()
  })
})
