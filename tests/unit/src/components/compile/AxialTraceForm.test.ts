import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { ItemOf } from '@shared/items/item'
import { foldForms } from '@shared/items/lines'
import AxialTraceForm from '@/components/compile/AxialTraceForm.vue'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aLine } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

/** A trace to the grid north-east; true north lies about 2.1° east of grid north there, so that it leads to 042.9 and 222.9. */
const trace = () =>
  aLine(
    'axial-trace',
    [
      [286_000, 5_280_000],
      [289_000, 5_283_000],
    ],
    { form: 'anticline' },
  )

beforeEach(() => setActivePinia(createPinia()))

function open(item = trace()) {
  const sheet = useSheetFake()
  sheet.start([item])
  const form = mount(AxialTraceForm, { props: { item, disabled: false } })
  const field = (label: string) => {
    const id = form
      .findAll('label')
      .find((each) => each.text() === label)
      ?.attributes('for')
    return form.get<HTMLInputElement>(`[id="${id}"]`)
  }
  const type = async (label: string, text: string) => {
    await field(label).setValue(text)
    await field(label).trigger('keydown', { key: 'Enter' })
  }
  const now = () => sheet.get(item.id) as ItemOf<'axial-trace'> // the test put it there
  const refresh = () => form.setProps({ item: now() })
  return { sheet, form, type, field, now, refresh }
}

describe('the plunge of an axial trace', () => {
  it('asks which way, with the azimuths of the trace’s two ends drawn', async () => {
    const { sheet, form, type } = open()
    await type('Plunge', '21')
    const choices = form.get('[aria-label^="Which way"]')
    expect(choices.findAll('label').map((label) => label.text())).toEqual(['223°', '043°'])
    expect(choices.findAll('svg path').length).toBeGreaterThan(2)
    expect(sheet.committed).toEqual([])
  })

  it('is stated together with the trend that is chosen, as one change', async () => {
    const { sheet, form, type, now } = open()
    await type('Plunge', '21')
    await form.get('input[value=end]').setValue(true)
    expect(sheet.committed).toHaveLength(1)
    expect(now().properties).toMatchObject({ plunge: 21, trend: 43 })
  })

  it('takes a typed trend that runs along the trace', async () => {
    const { type, now } = open()
    await type('Plunge', '21')
    await type('Trend', '230')
    expect(now().properties).toMatchObject({ plunge: 21, trend: 230 })
  })

  it('refuses, in words, a trend across the trace', async () => {
    const { sheet, form, type } = open()
    await type('Plunge', '21')
    await type('Trend', '130')
    expect(form.get('[role=alert]').text()).toContain('does not run along this trace')
    expect(sheet.committed).toEqual([])
  })

  it.each(['95', '-5', 'steep'])('is refused as %s', async (text) => {
    const { sheet, form, type } = open()
    await type('Plunge', text)
    expect(form.get('[role=alert]').text()).toContain('0 to 90')
    expect(sheet.committed).toEqual([])
  })

  it('turns round when the other end is chosen', async () => {
    const item = trace()
    const { form, now } = open({ ...item, properties: { ...item.properties, plunge: 21, trend: 43 } })
    expect(form.get<HTMLInputElement>('input[value=end]').element.checked).toBe(true)
    await form.get('input[value=start]').setValue(true)
    expect(now().properties).toMatchObject({ plunge: 21, trend: 223 })
  })

  it('goes, with its trend, when the field is emptied', async () => {
    const item = trace()
    const { type, now } = open({ ...item, properties: { ...item.properties, plunge: 21, trend: 43 } })
    await type('Plunge', '')
    expect(now().properties).toMatchObject({ plunge: null, trend: null })
  })

  it('still waits for its trend when one comes back to the trace', async () => {
    const item = trace()
    const first = open(item)
    await first.type('Plunge', '21')
    first.form.unmount()
    const again = mount(AxialTraceForm, { props: { item, disabled: false } })
    expect(again.find('[aria-label^="Which way"]').exists()).toBe(true)
  })
})

describe('the form', () => {
  it('is chosen among drawn samples', async () => {
    const { form, now } = open()
    expect(form.get('[aria-label="Form of the fold"]').findAll('svg')).toHaveLength(foldForms.length)
    await form.get('input[value=syncline]').setValue(true)
    expect(now().properties.form).toBe('syncline')
  })
})

describe('the side of a fold', () => {
  it('is asked only of overturned folds and monoclines', async () => {
    const item = trace()
    const { form, now, refresh } = open(item)
    expect(form.text()).not.toContain('Side')
    await form.get('input[value=overturned-syncline]').setValue(true)
    await refresh()
    // The trace runs north-east, so that its right side is the south-east.
    expect(form.text()).toContain('Limbs dip to the south-east (133°)')
    await form.get('button').trigger('click')
    expect(now().properties.side).toBe('left')
    await refresh()
    expect(form.text()).toContain('Limbs dip to the north-west (313°)')
    await form.get('input[value=monocline-anticlinal-bend]').setValue(true)
    await refresh()
    expect(form.text()).toContain('Steep limb dips to the north-west (313°)')
  })
})

describe('an axis that goes down both ways', () => {
  const plunging = () => {
    const item = trace()
    return { ...item, properties: { ...item.properties, plunge: 21, trend: 43 } }
  }

  it('takes the plunge of its other half, toward the opposite trend', async () => {
    const { form, now, refresh, type } = open(plunging())
    await form.get('input[value=outward]').setValue(true)
    await refresh()
    await type('Toward 223°', '12')
    expect(now().properties).toMatchObject({ doubly: 'outward', plunge: 21, trend: 43, otherPlunge: 12 })
  })

  it('forgets the other half when it goes down one way again, or the first plunge goes', async () => {
    const item = plunging()
    const both = { ...item, properties: { ...item.properties, doubly: 'inward' as const, otherPlunge: 12 } }
    const first = open(both)
    await first.form.get('input[value=no]').setValue(true)
    expect(first.now().properties).toMatchObject({ doubly: 'no', otherPlunge: null, plunge: 21 })
    const second = open(both)
    await second.type('Plunge', '')
    expect(second.now().properties).toMatchObject({ doubly: 'inward', plunge: null, otherPlunge: null })
  })

  it('refuses, in words, a second plunge before the first has its trend', async () => {
    const { sheet, form, type, refresh } = open()
    await form.get('input[value=inward]').setValue(true)
    await refresh()
    await type('Plunge', '21')
    await type('Other half', '12')
    expect(form.get('[role=alert]').text()).toContain('State the first plunge')
    expect(sheet.committed).toHaveLength(1)
  })
})
