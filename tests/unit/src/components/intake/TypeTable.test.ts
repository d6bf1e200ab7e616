import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import { suggestLineType } from '@shared/intake/line-words'
import type { LineTarget } from '@shared/intake/mapping'
import type { IntakeColumn } from '@shared/intake/report'
import { lineTargets, targetKey } from '@/components/intake/targets'
import TypeTable from '@/components/intake/TypeTable.vue'

const value = (text: string, lines = 1, points = 0) => ({ value: text, count: lines + points, points, lines })
const column: IntakeColumn = {
  name: 'Type',
  samples: [],
  filled: 5,
  numbers: null,
  values: [
    value('thrust', 4),
    value('thrsut'),
    value('snycline'),
    value('road'),
    value(''),
    value('bedding', 0, 9),
  ],
}
const leaveOut: LineTarget = { kind: 'leave-out' }

function aTable(types: Record<string, LineTarget>) {
  const given = {
    column,
    form: 'lines' as const,
    groups: lineTargets,
    leaveOut,
    suggest: suggestLineType,
    confidenceFor: () => 'certain' as const,
    modelValue: types,
  }
  return mount(TypeTable, { props: given })
}
const typed: Record<string, LineTarget> = {
  thrust: { kind: 'fault', type: 'thrust' },
  thrsut: leaveOut,
  snycline: leaveOut,
  road: leaveOut,
}

describe('the table of types', () => {
  it('lists the values that lines have, with what each becomes', () => {
    const table = aTable(typed)
    expect(table.findAll('tbody th').map((cell) => cell.text())).toEqual([
      'thrust',
      'thrsut',
      'snycline',
      'road',
      '(no value)',
    ])
    expect(table.findAll('select').map((select) => select.element.value)).toEqual([
      'fault.thrust',
      'leave-out',
      'leave-out',
      'leave-out',
      '',
    ])
  })

  it('offers a likely meaning beside what is left out, to be confirmed', async () => {
    const table = aTable(typed)
    const [thrust] = table.findAll('.offer')
    expect(table.findAll('.offer').map((offer) => offer.text())).toEqual(['Thrust?', 'Syncline?'])
    await thrust?.trigger('click')
    expect(table.emitted('update:modelValue')).toEqual([
      [{ ...typed, thrsut: { kind: 'fault', type: 'thrust' } }],
    ])
  })

  it('takes all likely meanings at once, and only those', async () => {
    const table = aTable(typed)
    await table.get('.all').trigger('click')
    expect(table.emitted('update:modelValue')).toEqual([
      [
        {
          ...typed,
          thrsut: { kind: 'fault', type: 'thrust' },
          snycline: { kind: 'axial-trace', form: 'syncline' },
        },
      ],
    ])
  })

  it('lets a missing value be refused, left out or given a meaning; others are never refused', async () => {
    const table = aTable({ ...typed, '': leaveOut })
    const [first, missing] = [table.findAll('select')[0], table.findAll('select')[4]]
    expect(first?.text()).not.toContain('Refuse')
    await missing?.setValue('')
    expect(table.emitted('update:modelValue')?.at(-1)).toEqual([typed])
    await missing?.setValue(targetKey({ kind: 'contact' }))
    expect(table.emitted('update:modelValue')?.at(-1)).toEqual([{ ...typed, '': { kind: 'contact' } }])
  })
})
