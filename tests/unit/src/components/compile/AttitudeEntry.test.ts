import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Item, ItemOf } from '@shared/items/item'
import AttitudeEntry from '@/components/compile/AttitudeEntry.vue'
import { useSheetFake } from '../../../../support/open-sheet-fake'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

const PLACE: [number, number] = [289_000, 5_283_000]
const start = {
  type: 'bedding',
  overturned: false,
  undulating: false,
  topsKnown: false,
  station: '',
  text: '',
} as const

const sheetFace = (attitudeConvention: 'strike-dip' | 'dip-direction-dip'): Item => ({
  id: '7f1c0b6a-0f5e-4e6c-9d70-0d9f4f5b1a01',
  kind: 'sheet-face',
  geometry: null,
  properties: { authors: '', credit: '', attitudeConvention, printing: 'colour' },
})
const attitude: ItemOf<'attitude'> = {
  id: '7f1c0b6a-0f5e-4e6c-9d70-0d9f4f5b1a02',
  kind: 'attitude',
  geometry: { type: 'Point', coordinates: PLACE },
  properties: {
    type: 'bedding',
    strike: 45,
    dip: 40,
    overturned: false,
    undulating: false,
    topsKnown: false,
    station: '',
    note: '',
    reading: null,
  },
}

beforeEach(() => setActivePinia(createPinia()))

function mountNew(convention: 'strike-dip' | 'dip-direction-dip' = 'strike-dip') {
  const sheet = useSheetFake()
  sheet.start([sheetFace(convention)])
  return { sheet, entry: mount(AttitudeEntry, { props: { place: PLACE, start } }) }
}

async function type(entry: ReturnType<typeof mountNew>['entry'], text: string) {
  await entry.get('input.reading').setValue(text)
}

const added = (sheet: ReturnType<typeof useSheetFake>) => sheet.committed[0]?.edits[0]?.after

describe('a new reading', () => {
  it('shows the sheet’s convention with an example beside the field', () => {
    expect(mountNew('strike-dip').entry.text()).toContain('strike and dip, right-hand rule: 045/40')
    setActivePinia(createPinia())
    expect(mountNew('dip-direction-dip').entry.text()).toContain('dip direction and dip: 135/40')
  })

  it.each([
    ['strike-dip', '045/40'],
    ['dip-direction-dip', '135/40'],
    ['strike-dip', 'N45E 40SE'],
  ] as const)('in %s echoes %s in words and draws its symbol', async (convention, text) => {
    const { entry } = mountNew(convention)
    await type(entry, text)
    expect(entry.text()).toContain('Strikes 045°, dips 40° toward 135° (south-east)')
    expect(entry.find('.echo svg path').exists()).toBe(true)
    expect(entry.find('.echo svg text').text()).toBe('40')
  })

  it('becomes an attitude on Enter, with the reading as it was typed', async () => {
    const { sheet, entry } = mountNew('dip-direction-dip')
    await type(entry, '135/40 ot')
    await entry.trigger('submit')
    expect(added(sheet)).toMatchObject({
      kind: 'attitude',
      geometry: { type: 'Point', coordinates: PLACE },
      properties: {
        type: 'bedding',
        strike: 45,
        dip: 40,
        overturned: true,
        reading: {
          text: '135/40 ot',
          convention: 'dip-direction-dip',
          northReference: 'true',
          declination: null,
        },
      },
    })
    expect(entry.emitted('taken')).toHaveLength(1)
  })

  it.each([
    ['N45E 40NE', 'The dip letter NE lies along the strike'],
    ['045/95', 'Dip 95 is more than 90'],
  ])('is refused in words under the field for %s, and nothing is placed', async (text, reason) => {
    const { sheet, entry } = mountNew()
    await type(entry, text)
    await entry.trigger('submit')
    expect(entry.get('[role=alert]').text()).toContain(reason)
    expect(entry.get('input.reading').attributes('aria-invalid')).toBe('true')
    expect(sheet.committed).toEqual([])
    expect(entry.emitted('taken')).toBeUndefined()
  })

  it('applies the declination of a magnetic reading and remembers it for the next', async () => {
    const { sheet, entry } = mountNew()
    await type(entry, '045/40')
    await entry.get('input[value=magnetic]').setValue(true)
    await entry.trigger('submit')
    expect(entry.get('[role=alert]').text()).toContain('needs the declination')
    await entry.get('input.declination').setValue('14.5 W')
    expect(entry.text()).toContain('Magnetic to true north: −14.5°')
    await entry.trigger('submit')
    expect(added(sheet)).toMatchObject({ properties: { strike: 30.5, reading: { declination: -14.5 } } })
    const next = mount(AttitudeEntry, { props: { place: PLACE, start } })
    expect(next.get<HTMLInputElement>('input.declination').element.value).toBe('14.5 W')
  })

  it('can be given in separate fields', async () => {
    const { sheet, entry } = mountNew()
    await entry.get('button.link.light').trigger('click')
    const [strike, dip] = entry.findAll('.figure-fields input')
    await strike?.setValue('200')
    await dip?.setValue('35')
    await entry.get('input[type=checkbox]').setValue(true)
    await entry.trigger('submit')
    expect(added(sheet)).toMatchObject({ properties: { strike: 200, dip: 35, overturned: true } })
  })
})

describe('what else is seen of a plane', () => {
  const tick = (entry: ReturnType<typeof mountNew>['entry'], words: string) =>
    entry
      .findAll('label')
      .find((label) => label.text() === words)
      ?.get('input')

  it('is ticked beside the reading, echoed, and placed with it', async () => {
    const { sheet, entry } = mountNew()
    await type(entry, '045/40')
    await tick(entry, 'tops known')?.setValue(true)
    await tick(entry, 'undulating')?.setValue(true)
    expect(entry.get('.words').text()).toBe(
      'Strikes 045°, dips 40° toward 135° (south-east), undulating, tops known',
    )
    await entry.trigger('submit')
    expect(added(sheet)).toMatchObject({ properties: { strike: 45, topsKnown: true, undulating: true } })
  })

  it.each([
    ['bedding', ['overturned', 'tops known', 'undulating']],
    ['foliation', ['crenulated']],
    ['joint', []],
  ] as const)('is asked of %s only as far as its symbol shows it', (plane, asked) => {
    const entry = mount(AttitudeEntry, { props: { place: PLACE, start: { ...start, type: plane } } })
    const words = entry.findAll('label').filter((label) => label.find('input[type=checkbox]').exists())
    expect(words.map((label) => label.text())).toEqual(asked)
  })

  it('is taken at once on an attitude that is on the sheet', async () => {
    const sheet = useSheetFake()
    sheet.start([attitude, sheetFace('strike-dip')])
    const entry = mount(AttitudeEntry, { props: { place: PLACE, start, item: attitude } })
    await tick(entry, 'tops known')?.setValue(true)
    expect(sheet.get(attitude.id)?.properties).toEqual({ ...attitude.properties, topsKnown: true })
    expect(sheet.committed).toHaveLength(1)
  })
})

describe('the reading of an attitude on the sheet', () => {
  function mountExisting() {
    const sheet = useSheetFake()
    sheet.start([attitude, sheetFace('strike-dip')])
    return { sheet, entry: mount(AttitudeEntry, { props: { place: PLACE, start, item: attitude } }) }
  }

  it('starts from the values in the sheet’s convention', () => {
    expect(mountExisting().entry.get<HTMLInputElement>('input.reading').element.value).toBe('045/40')
  })

  it('is changed when the field is left, once', async () => {
    const { sheet, entry } = mountExisting()
    await type(entry, '050/35')
    await entry.get('input.reading').trigger('change')
    await entry.trigger('submit')
    expect(sheet.committed).toHaveLength(1)
    expect(sheet.get(attitude.id)).toMatchObject({
      properties: { strike: 50, dip: 35, reading: { text: '050/35' } },
    })
  })

  it('is taken also when the selection moves on before the field is left', async () => {
    const { sheet, entry } = mountExisting()
    await type(entry, '050/35')
    entry.unmount()
    expect(sheet.get(attitude.id)).toMatchObject({ properties: { strike: 50, dip: 35 } })
  })

  it('changes nothing while it does not read, and is still there on coming back', async () => {
    const { sheet, entry } = mountExisting()
    await type(entry, '050/95')
    entry.unmount()
    expect(sheet.committed).toEqual([])
    const again = mount(AttitudeEntry, { props: { place: PLACE, start, item: attitude } })
    expect(again.get<HTMLInputElement>('input.reading').element.value).toBe('050/95')
  })

  it('commits nothing when nothing was changed', async () => {
    const { sheet, entry } = mountExisting()
    await entry.trigger('submit')
    entry.unmount()
    expect(sheet.committed).toEqual([])
  })
})
