import { mount } from '@vue/test-utils'
import { describe, expect, it, vi } from 'vitest'
import EditField from '@/components/common/EditField.vue'

function open(save: (text: string) => string | undefined = () => undefined, more = {}) {
  const saved = vi.fn(save)
  const field = mount(EditField, { props: { label: 'Name', value: 'Gannet fault', save: saved, ...more } })
  return { saved, field, input: field.get<HTMLInputElement>('input') }
}

describe('a field that saves itself', () => {
  it('saves once, on Enter, although it is left and goes away afterwards', async () => {
    const { saved, field, input } = open()
    await input.setValue(' Skua fault ')
    await input.trigger('keydown', { key: 'Enter' })
    await field.setProps({ value: 'Skua fault' })
    await input.trigger('blur')
    field.unmount()
    expect(saved.mock.calls).toEqual([['Skua fault']])
  })

  it('saves when it is left, and when it goes away unsaved', async () => {
    const left = open()
    await left.input.setValue('Skua fault')
    await left.input.trigger('blur')
    expect(left.saved).toHaveBeenCalledTimes(1)
    const gone = open()
    await gone.input.setValue('Skua fault')
    gone.field.unmount()
    expect(gone.saved).toHaveBeenCalledTimes(1)
  })

  it('saves nothing where only blanks differ', async () => {
    const { saved, input } = open()
    await input.setValue('Gannet fault ')
    await input.trigger('blur')
    expect(saved).not.toHaveBeenCalled()
    expect(input.element.value).toBe('Gannet fault')
  })

  it('keeps what was refused, says why, and brings back the old on Escape', async () => {
    const { field, input } = open(() => 'Too long.')
    await input.setValue('x')
    await input.trigger('blur')
    expect(input.element.value).toBe('x')
    expect(field.get('[role=alert]').text()).toBe('Too long.')
    expect(input.attributes('aria-invalid')).toBe('true')
    await input.trigger('keydown', { key: 'Escape' })
    expect(input.element.value).toBe('Gannet fault')
    expect(field.find('[role=alert]').exists()).toBe(false)
  })

  it('shows a saved value as it comes back, and what another person wrote while it was not touched', async () => {
    const { field, input } = open()
    await input.setValue('21')
    await input.trigger('blur')
    await field.setProps({ value: '21°' })
    expect(input.element.value).toBe('21°')
    await field.setProps({ value: '30°' })
    expect(input.element.value).toBe('30°')
  })

  it('does not take a text away from under the person who is typing', async () => {
    const { field, input } = open()
    await input.setValue('half a na')
    await field.setProps({ value: 'another person’s name' })
    expect(input.element.value).toBe('half a na')
  })
})
