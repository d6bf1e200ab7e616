import { describe, expect, it } from 'vitest'
import { contrast, labelReadsOn, mutedColour } from '@shared/legend/colours'
import { groupByAge } from '@shared/legend/group-by-age'
import { unitWarnings, type LegendUnit } from '@shared/legend/unit-warnings'
import { timeDivisions } from '@shared/time-scale/periods'

const unit = (id: string, label: string, colour: string, age = '', rank = 0): LegendUnit => ({
  id,
  properties: { label, name: `Unit ${label}`, age, colour, pattern: 'none', description: '', rank },
})

describe('warnings about a unit', () => {
  it('names the unit that carries the same label, and the one of the same colour', () => {
    const units = [unit('1', 'Dr', '#cf9d88'), unit('2', 'Dr', '#ffffff'), unit('3', 'Dl', '#cf9d88')]
    expect(unitWarnings(unit('1', 'Dr', '#cf9d88'), units)).toEqual([
      'Unit Dr carries the label Dr too.',
      'Unit Dl has this colour too.',
    ])
  })

  it('lets units share a colour that a pattern tells apart', () => {
    const plain = unit('1', 'Dr', '#cf9d88')
    const dotted = {
      id: '2',
      properties: { ...unit('2', 'Dl', '#cf9d88').properties, pattern: 'sandstone' as const },
    }
    expect(unitWarnings(plain, [dotted])).toEqual([])
    expect(unitWarnings(dotted, [{ ...dotted, id: '3' }])).toContain(
      'Unit Dl has this colour and pattern too.',
    )
  })

  it('says when the label is hard to read', () => {
    expect(unitWarnings(unit('1', 'Dr', '#5a3030'), [])).toHaveLength(1)
  })

  it('says that an age is none of the geologic time scale, as a mistyped one is not', () => {
    const units: LegendUnit[] = []
    expect(unitWarnings(unit('1', 'Qa', '#f4ecc8', 'Quartenary'), units)).toEqual([
      expect.stringContaining('“Quartenary” names no period'),
    ])
    expect(unitWarnings(unit('1', 'Qa', '#f4ecc8', 'Lower Quaternary'), units)).toEqual([])
  })

  it('says nothing of a unit that stands out', () => {
    expect(unitWarnings(unit('1', 'Dr', '#cf9d88'), [unit('2', 'Sv', '#b5cbc4')])).toEqual([])
  })
})

describe('contrast', () => {
  // WCAG 2.2: black on white is 21; #767676 is the well-known darkest grey that just passes 4.5 on white.
  it.each([
    ['#000000', '#ffffff', 21],
    ['#767676', '#ffffff', 4.54],
    ['#ffffff', '#ffffff', 1],
  ])('of %s on %s is %f', (a, b, expected) => {
    expect(contrast(a, b)).toBeCloseTo(expected, 2)
    expect(contrast(b, a)).toBeCloseTo(expected, 2)
  })

  it('of a label is enough on every colour that an age proposes', () => {
    for (const division of timeDivisions)
      expect(labelReadsOn(mutedColour(division.colour)), division.name).toBe(true)
  })
})

describe('grouping by age', () => {
  it('lists the youngest first and repeats a heading that comes again', () => {
    const units = [
      unit('old', 'D1', '#ffffff', 'Devonian', 30),
      unit('cover', 'Q', '#ffffff', 'Quaternary', 20),
      unit('young', 'D2', '#ffffff', 'Devonian', 10),
      unit('young2', 'D3', '#ffffff', 'devonian', 11),
    ]
    expect(groupByAge(units).map((group) => [group.age, group.units.map((each) => each.id)])).toEqual([
      ['Devonian', ['young', 'young2']],
      ['Quaternary', ['cover']],
      ['Devonian', ['old']],
    ])
  })
})
