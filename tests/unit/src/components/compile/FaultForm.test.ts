import { flushPromises, mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { ItemOf } from '@shared/items/item'
import type { FaultProperties } from '@shared/items/lines'
import FaultForm from '@/components/compile/FaultForm.vue'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aLine } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

beforeEach(() => setActivePinia(createPinia()))

/** A fault that runs to the grid north, which lies about 2.1° west of true north there. */
function open(properties: Partial<FaultProperties>) {
  const item = aLine(
    'fault',
    [
      [286_000, 5_280_000],
      [286_000, 5_283_000],
    ],
    properties,
  )
  const sheet = useSheetFake()
  sheet.start([item])
  const form = mount(FaultForm, { props: { item, disabled: false } })
  const now = () => sheet.get(item.id) as ItemOf<'fault'> // the test put it there
  const refresh = () => form.setProps({ item: now() })
  const typeDip = async (text: string) => {
    const field = form.get<HTMLInputElement>('input[type=text]')
    await field.setValue(text)
    await field.trigger('keydown', { key: 'Enter' })
  }
  return { sheet, form, now, refresh, typeDip }
}

describe('the side of a fault', () => {
  it('is said by the ground, and swapped', async () => {
    const { form, now, refresh } = open({ type: 'normal', side: 'right' })
    expect(form.text()).toMatch(/Down to the east \(0(87|88|92|93)°\)/)
    await form.get('button').trigger('click')
    expect(now().properties.side).toBe('left')
    await refresh()
    expect(form.text()).toContain('Down to the west')
  })

  it('of a fault of no stated movement is that of its dip, and not told without one', async () => {
    const { form, refresh, typeDip, now } = open({ type: 'unspecified', side: 'left' })
    expect(form.text()).not.toContain('Side')
    await typeDip('60')
    expect(now().properties.dip).toBe(60)
    await refresh()
    expect(form.text()).toContain('Dips to the west')
  })

  it('of a rotational fault is told for both ends', () => {
    const { form } = open({ type: 'rotational', side: 'right' })
    expect(form.text()).toContain('Down to the east at its southern end and to the west at its northern end')
    expect(form.find('input[type=text]').exists()).toBe(false)
  })
})

describe('the dip of a fault', () => {
  it.each(['95', '-5', 'steep'])('is refused as %s', async (text) => {
    const { sheet, form, typeDip } = open({ type: 'thrust' })
    await typeDip(text)
    expect(form.get('[role=alert]').text()).toBe(
      'A dip is measured down from the horizontal: 0 to 90 degrees.',
    )
    expect(sheet.committed).toEqual([])
  })

  it('stands against making the fault rotational, in words', async () => {
    const { sheet, form } = open({ type: 'normal', dip: 60 })
    await form.get('input[value=rotational]').setValue(true)
    expect(form.get('[role=alert]').text()).toContain('Clear the dip first')
    expect(sheet.committed).toEqual([])
    // The choice goes back to what the fault is, so that it can be made again.
    await flushPromises()
    expect(form.get<HTMLInputElement>('input[value=rotational]').element.checked).toBe(false)
    expect(form.get<HTMLInputElement>('input[value=normal]').element.checked).toBe(true)
  })
})
