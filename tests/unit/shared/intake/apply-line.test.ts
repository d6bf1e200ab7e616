import { describe, expect, it } from 'vitest'
import type { Mapping } from '@shared/intake/mapping'
import { aLine, aMapping, applied, aRecord, propertiesOf, reasonsOf } from '../../../support/intake-records'

describe('lines', () => {
  const line = (attributes: Record<string, unknown>, lines: Partial<Mapping['lines']>) =>
    applied([aRecord(attributes, [aLine([3, 45], [3.01, 45])])], aMapping({ lines }))

  it('become what their type is mapped to, with name and note', () => {
    const result = line(
      { Type: 'thrust', name: 'Holm Thrust', remark: 'walked' },
      {
        typeColumn: 'Type',
        types: { thrust: { kind: 'fault', type: 'thrust' } },
        faultSide: 'left',
        nameColumn: 'name',
        noteColumn: 'remark',
      },
    )
    expect(result.items[0]?.item).toMatchObject({
      kind: 'fault',
      properties: {
        type: 'thrust',
        side: 'left',
        name: 'Holm Thrust',
        note: 'walked',
        locationConfidence: 'certain',
      },
    })
    expect(result.items[0]?.provenance).toMatchObject({
      file: 'field.geojson',
      record: 1,
      attributes: { Type: 'thrust', name: 'Holm Thrust', remark: 'walked' },
      conversions: expect.arrayContaining(['upper plate on the left of the line as drawn: stated at intake']),
    })
  })

  it('are left out where the mapping says so, and refused where they state no type', () => {
    const lines = {
      typeColumn: 'Type',
      types: { road: { kind: 'leave-out' } },
      otherwise: { kind: 'leave-out' },
    } as const
    expect(line({ Type: 'road' }, lines)).toMatchObject({ leftOut: 1, refusals: [] })
    expect(reasonsOf(line({ Type: null }, lines))).toEqual(['The record does not say what the line is.'])
    expect(line({ Type: 'constructor' }, lines)).toMatchObject({ leftOut: 1, refusals: [] })
  })

  it('take their confidence from its column; an unknown one is refused', () => {
    const lines = { confidenceColumn: 'conf', confidences: { approx: 'approximate' } } as const
    expect(propertiesOf(line({ conf: 'approx' }, lines))[0]).toMatchObject({
      locationConfidence: 'approximate',
    })
    expect(propertiesOf(line({ conf: '' }, { ...lines, confidenceOtherwise: 'inferred' }))[0]).toMatchObject({
      locationConfidence: 'inferred',
    })
    expect(line({ conf: 'so so' }, lines).refusals).toMatchObject([{ field: 'conf', value: 'so so' }])
  })

  it('carry plunge and trend together or not at all', () => {
    const lines = {
      otherwise: { kind: 'axial-trace', form: 'syncline' },
      plungeColumn: 'plunge',
      trendColumn: 'trend',
    } as const
    expect(propertiesOf(line({ plunge: 12, trend: 360 }, lines))[0]).toMatchObject({ plunge: 12, trend: 0 })
    expect(propertiesOf(line({}, lines))[0]).toMatchObject({ plunge: null, trend: null })
    expect(line({ plunge: 12 }, lines).refusals).toMatchObject([{ field: 'trend' }])
    expect(line({ plunge: 95, trend: 10 }, lines).refusals).toMatchObject([{ field: 'plunge', value: '95' }])
  })

  it('carry the side that a person stated, and say so where their symbol shows one', () => {
    const overturned = line(
      {},
      { otherwise: { kind: 'axial-trace', form: 'overturned-syncline' }, foldSide: 'left' },
    )
    expect(propertiesOf(overturned)[0]).toMatchObject({ form: 'overturned-syncline', side: 'left' })
    expect(overturned.items[0]?.provenance.conversions).toContain(
      'dip of its limbs on the left of the line as drawn: stated at intake',
    )
    const upright = line({}, { otherwise: { kind: 'axial-trace', form: 'syncline' }, foldSide: 'left' })
    expect(upright.items[0]?.provenance.conversions.join()).not.toContain('stated at intake')
    const rotational = line({}, { otherwise: { kind: 'fault', type: 'rotational' } })
    expect(rotational.items[0]?.provenance.conversions).toContain(
      'downthrown side at its start on the right of the line as drawn: stated at intake',
    )
  })

  it('cut a name that is too long and keep the whole in their provenance', () => {
    const name = 'a'.repeat(300)
    const { items } = line({ name }, { nameColumn: 'name' })
    expect(items[0]?.item.properties).toMatchObject({ name: `${'a'.repeat(199)}…` })
    expect(items[0]?.provenance.attributes).toEqual({ name })
  })
})
