import { flushPromises, mount, RouterLinkStub } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Item } from '@shared/items/item'
import SelectedSlip from '@/components/compile/SelectedSlip.vue'
import { useWorkplaceStore } from '@/stores/workplace'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aLine, aPoint, aSheetFace, aUnit } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

const line: [number, number][] = [
  [286_000, 5_280_000],
  [286_000, 5_283_000],
]

beforeEach(() => setActivePinia(createPinia()))

async function select(items: Item[], ids = items.map((item) => item.id), as = {}) {
  const sheet = useSheetFake()
  sheet.start(items, as)
  const workplace = useWorkplaceStore()
  const slip = mount(SelectedSlip, { global: { stubs: { RouterLink: RouterLinkStub } } })
  workplace.select(ids)
  await flushPromises()
  return { sheet, workplace, slip }
}

describe('the slip of one item', () => {
  it('says in a sentence what a fold is, with its name and length', async () => {
    const { slip } = await select([
      aLine('axial-trace', line, { form: 'syncline', plunge: 8, trend: 358, name: 'Skua syncline' }),
    ])
    expect(slip.get('h2').text()).toBe('Syncline, plunging 8° toward 358°')
    expect(slip.get('.facts').text()).toBe('Skua syncline · 3.0 km')
  })

  it('says on which ground side a fault is down, and keeps it when the line is reversed', async () => {
    const { slip } = await select([aLine('fault', line, { type: 'normal', side: 'right' })])
    expect(slip.get('h2').text()).toBe('Normal fault, down to the east')
    await slip
      .findAll('.acts button')
      .find((button) => button.text() === 'Reverse')
      ?.trigger('click')
    expect(slip.get('h2').text()).toBe('Normal fault, down to the east')
    await slip
      .findAll('button')
      .find((button) => button.text() === 'Swap side')
      ?.trigger('click')
    expect(slip.get('h2').text()).toBe('Normal fault, down to the west')
  })

  it('changes the location confidence by a drawn sample, one change for one choice', async () => {
    const contact = aLine('contact', line, {})
    const { sheet, slip } = await select([contact])
    await slip.get('input[value=approximate]').setValue(true)
    expect(sheet.committed.map((each) => each.label)).toEqual([
      'location confidence of contact: certain → approximate',
    ])
    expect(slip.get('h2').text()).toBe('Contact, approximate')
  })

  it('takes what was typed when another item is selected before the field is left', async () => {
    const [first, second] = [aLine('fault', line, {}), aLine('contact', line, {})]
    const { sheet, workplace, slip } = await select([first, second], [first.id])
    const name = slip
      .findAll('label')
      .find((label) => label.text() === 'Name')
      ?.attributes('for')
    await slip.get(`[id="${name}"]`).setValue('Gannet fault')
    workplace.select([second.id])
    await flushPromises()
    expect(sheet.get(first.id)?.properties).toMatchObject({ name: 'Gannet fault' })
    expect(sheet.get(second.id)?.properties).toMatchObject({ name: '' })
  })

  it('removes the item, and then says what to do', async () => {
    const contact = aLine('contact', line, {})
    const { sheet, slip } = await select([contact])
    await slip.get('.acts .grave').trigger('click')
    expect(sheet.get(contact.id)).toBeUndefined()
    expect(slip.get('h2').text()).toBe('Nothing selected')
  })

  it('shows a unit label’s unit as a swatch and changes it by another', async () => {
    const [unit, other] = [aUnit({}), aUnit({ label: 'Dl', name: 'Lantern Shale', rank: 20 })]
    const label = aPoint('unit-label', [286_000, 5_280_000], { unit: unit.id })
    const { sheet, slip } = await select([unit, other, label], [label.id])
    expect(slip.get('h2').text()).toBe('Dr, Rill Sandstone')
    await slip.get(`input[value="${other.id}"]`).setValue(true)
    expect(sheet.get(label.id)?.properties).toMatchObject({ unit: other.id })
    expect(slip.get('h2').text()).toBe('Dl, Lantern Shale')
  })

  it('can only be read while the sheet is under review', async () => {
    const { slip } = await select([aLine('contact', line, {})], undefined, { state: 'submitted' })
    expect(slip.get('[role=status]').text()).toBe('The sheet is submitted.')
    expect(slip.findAll('input:not(:disabled), textarea:not(:disabled)')).toEqual([])
    expect(slip.find('.grave').exists()).toBe(false)
  })
})

describe('the slip of several items', () => {
  it('counts them by kind and changes what lines have in common as one change', async () => {
    const items = [
      aLine('contact', line, {}),
      aLine('contact', line, { locationConfidence: 'inferred' }),
      aLine('fault', line, {}),
    ]
    const { sheet, slip } = await select(items)
    expect(slip.text()).toContain('3 selected')
    expect(slip.get('.facts').text()).toBe('2 contacts · 1 fault')
    expect(slip.find('input:checked').exists()).toBe(false)
    await slip.get('input[value=concealed]').setValue(true)
    expect(sheet.committed).toHaveLength(1)
    for (const item of items) {
      expect(sheet.get(item.id)?.properties).toMatchObject({ locationConfidence: 'concealed' })
    }
  })
})

describe('a place clicked for an attitude', () => {
  it('is asked for its reading, belongs to the station there, and is asked no more once taken', async () => {
    const station = aPoint('station', [286_000, 5_280_000], { name: '214' })
    const { sheet, workplace, slip } = await select([station, aSheetFace()], [])
    workplace.pendingReadingPlace = [286_000, 5_280_000]
    await flushPromises()
    expect(slip.get('.facts').text()).toContain('station 214')
    await slip.get('input.reading').setValue('045/40')
    await slip.get('form').trigger('submit')
    expect(sheet.ofKind('attitude')[0]?.properties).toMatchObject({ strike: 45, dip: 40, station: '214' })
    expect(workplace.pendingReadingPlace).toBeNull()
  })
})
