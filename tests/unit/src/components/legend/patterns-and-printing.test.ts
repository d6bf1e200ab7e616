import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import LegendMargin from '@/components/legend/LegendMargin.vue'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aSheetFace, aUnit } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

beforeEach(() => setActivePinia(createPinia()))

const rill = aUnit({ label: 'Dr', name: 'Rill Sandstone', pattern: 'sandstone' })

function open(as = {}) {
  const sheet = useSheetFake()
  sheet.start([rill, aSheetFace()], as)
  return { sheet, margin: mount(LegendMargin, { attachTo: document.body }) }
}

describe('the pattern of a unit', () => {
  it('is shown in its swatch', () => {
    expect(open().margin.get('.unit svg').find('pattern').exists()).toBe(true)
  })

  it('is chosen from drawn samples, and saved at once', async () => {
    const { sheet, margin } = open()
    await margin.get('[data-row]').trigger('keydown', { key: 'F2' })
    const samples = margin.findAll('[role="radiogroup"][aria-label="Pattern"] input')
    expect(samples.map((each) => each.attributes('aria-label'))).toEqual(
      expect.arrayContaining(['No pattern', 'Sandstone', 'Peat']),
    )
    await samples.find((each) => each.attributes('aria-label') === 'Chert')?.setValue()
    expect(sheet.get(rill.id)?.properties).toMatchObject({ pattern: 'chert' })
  })
})

describe('printing in one ink', () => {
  it('is an editor’s switch, saved at once, and takes the colours out of the legend', async () => {
    const { sheet, margin } = open()
    expect(margin.get('.unit svg').html()).toContain('#cf9d88')
    await margin.get('.printing-choice input[value="one-ink"]').setValue()
    expect(sheet.ofKind('sheet-face')[0]?.properties.printing).toBe('one-ink')
    await nextTick()
    expect(margin.get('.unit svg').html()).not.toContain('#cf9d88')
  })

  it('is only told to others', async () => {
    const { sheet, margin } = open({ myRoles: ['compiler'] })
    expect(margin.find('.printing-choice').exists()).toBe(false)
    sheet.start([rill, aSheetFace({ printing: 'one-ink' })], { myRoles: ['compiler'] })
    await nextTick()
    expect(margin.get('.printing-choice').text()).toBe('Printed in one ink')
  })
})
