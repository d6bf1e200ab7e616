import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import { stationTypes, type StationProperties } from '@shared/items/points'
import StationForm from '@/components/compile/StationForm.vue'
import { aPoint, aSheetFace } from '../../../../support/sheet-items'
import { useSheetFake } from '../../../../support/open-sheet-fake'

beforeEach(() => setActivePinia(createPinia()))

function open(properties: Partial<StationProperties>) {
  const sheet = useSheetFake()
  const item = aPoint('station', [0, 0], properties)
  sheet.start([item, aSheetFace()])
  const form = mount(StationForm, { props: { item, disabled: false } })
  const now = () => sheet.get(item.id)?.properties
  const typeAzimuth = async (text: string) => {
    const label = form.findAll('label').find((each) => each.text().includes('toward'))
    const input = form.get(`[id="${label?.attributes('for') ?? ''}"]`)
    await input.setValue(text)
    await input.trigger('blur')
    const changed = sheet.get(item.id)
    if (changed?.kind === 'station') await form.setProps({ item: changed })
  }
  return { form, now, typeAzimuth }
}

describe('the slip of a place', () => {
  it('offers every type as a drawn sample', async () => {
    const { form, now } = open({})
    const values = form.findAll('input[type=radio]').map((input) => input.attributes('value'))
    expect(values).toEqual([...stationTypes])
    expect(form.findAll('svg')).toHaveLength(stationTypes.length)
    await form.get('input[value=spring]').setValue(true)
    expect(now()).toMatchObject({ type: 'spring' })
  })

  it('asks for an azimuth where the symbol shows one, and reads it as it is typed', async () => {
    expect(open({ type: 'quarry' }).form.text()).not.toContain('toward')
    const { form, now, typeAzimuth } = open({ type: 'mine-adit' })
    expect(form.text()).toContain('Goes in toward')
    await typeAzimuth('N45E')
    expect(now()).toMatchObject({ azimuth: 45 })
    await typeAzimuth('400')
    expect(form.get('[role=alert]').text()).toBe('Azimuth 400 is more than 360: azimuths run from 0 to 360.')
    expect(now()).toMatchObject({ azimuth: 45 })
    await typeAzimuth('')
    expect(now()).toMatchObject({ azimuth: null })
  })

  it('forgets the azimuth of what becomes a place without one', async () => {
    const { form, now } = open({ type: 'tops-direction', azimuth: 120 })
    await form.get('input[value=sample]').setValue(true)
    expect(now()).toMatchObject({ type: 'sample', azimuth: null })
  })
})
