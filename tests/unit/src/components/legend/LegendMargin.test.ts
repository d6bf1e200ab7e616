import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import type { Item } from '@shared/items/item'
import LegendMargin from '@/components/legend/LegendMargin.vue'
import { useWorkplaceStore } from '@/stores/workplace'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aLine, aPoint, aUnit } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

const line: [number, number][] = [
  [286_000, 5_280_000],
  [286_000, 5_283_000],
]
const place: [number, number] = [286_000, 5_280_000]

beforeEach(() => setActivePinia(createPinia()))

const merrow = aUnit({ label: 'Zm', name: 'Merrow Group', age: 'Precambrian', colour: '#c79f76', rank: 40 })
const rill = aUnit({ label: 'Dr', name: 'Rill Sandstone', age: 'Devonian', rank: 20 })
const lantern = aUnit({ label: 'Dl', name: 'Lantern Shale', age: 'Devonian', colour: '#dab5a0', rank: 30 })
const alluvium = aUnit({ label: 'Qa', name: 'Alluvium', age: 'Quaternary', colour: '#f2e6c8', rank: 10 })
const units = [merrow, rill, lantern, alluvium]
const labels = [1, 2, 3].map(() => aPoint('unit-label', place, { unit: rill.id }))

function open(items: Item[] = [...units, ...labels], as = {}) {
  const sheet = useSheetFake()
  sheet.start(items, as)
  const margin = mount(LegendMargin, { attachTo: document.body })
  const rows = () => margin.findAll('[data-row]')
  const row = (title: string) => {
    const found = rows().find((each) => each.get('.title').text() === title)
    if (!found) throw new Error(`There is no row ${title}.`)
    return found
  }
  const press = (title: string, key: string, more = {}) => row(title).trigger('keydown', { key, ...more })
  const titles = () => rows().map((each) => each.get('.title').text())
  return { sheet, workplace: useWorkplaceStore(), margin, rows, row, press, titles }
}

describe('the margin', () => {
  it('begins with the title of the sheet and where the draft stands', () => {
    const { margin } = open()
    expect(margin.get('h1').text()).toContain('Geologic map of')
    expect(margin.get('header p').text().replaceAll('\u00a0', ' ')).toBe(
      'Sheet MI-14 · draft toward edition 2 · revision 418',
    )
  })

  it('lists units from the youngest down under their ages, with the number of their labels', () => {
    const { margin, titles, row } = open()
    expect(
      margin
        .findAll('h3')
        .slice(0, 3)
        .map((age) => age.text()),
    ).toEqual(['Quaternary', 'Devonian', 'Precambrian'])
    expect(titles().slice(0, 4)).toEqual(['Alluvium', 'Rill Sandstone', 'Lantern Shale', 'Merrow Group'])
    expect(row('Rill Sandstone').get('.count').text()).toBe('3')
    expect(row('Rill Sandstone').get('svg text').text()).toBe('Dr')
  })

  it('explains every symbol in use, in the order of the palette, with its count', () => {
    const { titles, row } = open([
      aPoint('attitude', place, { strike: 45, dip: 40 }),
      aLine('axial-trace', line, { form: 'anticline' }),
      aLine('contact', line, { locationConfidence: 'concealed' }),
      aLine('contact', line, {}),
      aLine('contact', line, {}),
    ])
    expect(titles()).toEqual([
      'Contact, certain',
      'Contact, concealed',
      'Anticline, certain',
      'Bedding, inclined',
    ])
    expect(row('Contact, certain').get('.count').text()).toBe('2')
    expect(row('Anticline, certain').find('svg path').exists()).toBe(true)
  })

  it('keeps up with the sheet', async () => {
    const { sheet, titles } = open([])
    const contact = aLine('contact', line, { locationConfidence: 'inferred' })
    sheet.commit('drew', [{ before: null, after: contact }])
    await nextTick()
    expect(titles()[0]).toBe('Contact, inferred')
  })
})

describe('drawing with the legend', () => {
  it('picks a unit to place its labels, and puts it down again', async () => {
    const { workplace, row } = open()
    await row('Rill Sandstone').trigger('click')
    expect(workplace.drawWith).toEqual({ unit: rill.id })
    expect(row('Rill Sandstone').attributes('aria-pressed')).toBe('true')
    await row('Rill Sandstone').trigger('click')
    expect(workplace.drawWith).toBeNull()
  })

  it('picks a line entry, and chooses how well it is located by a drawn sample below it', async () => {
    const { workplace, margin, row } = open([aLine('contact', line, {})])
    await row('Contact, certain').trigger('click')
    expect(workplace.drawWith).toMatchObject({
      kind: 'contact',
      properties: { locationConfidence: 'certain' },
    })
    await margin.get('.location-choice input[value=approximate]').setValue(true)
    expect(workplace.drawWith).toMatchObject({ properties: { locationConfidence: 'approximate' } })
    expect(row('Contact, approximate').attributes('aria-pressed')).toBe('true')
  })

  it('offers behind “more” what is not on the sheet yet', async () => {
    const { workplace, margin, titles, row } = open([aLine('contact', line, {})])
    expect(titles()).toEqual(['Contact, certain'])
    await margin.get('.more-entries').trigger('click')
    expect(titles()).toContain('Syncline, certain')
    expect(titles()).not.toContain('Syncline, approximate')
    await row('Syncline, certain').trigger('click')
    expect(workplace.drawWith).toMatchObject({ kind: 'axial-trace', properties: { form: 'syncline' } })
  })

  it('offers everything at once on an empty sheet', () => {
    expect(open([]).titles()).toContain('Contact, certain')
  })

  it('draws nothing on a sheet under review', async () => {
    const { workplace, row, margin } = open(undefined, { state: 'submitted' })
    await row('Rill Sandstone').trigger('click')
    expect(workplace.drawWith).toBeNull()
    expect(margin.find('.add').exists()).toBe(false)
  })
})

describe('the keyboard in the legend', () => {
  it('moves from row to row with the arrows, and Tab stops once', async () => {
    const { press, rows } = open()
    ;(rows()[0]?.element as HTMLElement).focus() // a button
    await press('Alluvium', 'ArrowDown')
    expect(document.activeElement?.textContent).toContain('Rill Sandstone')
    await press('Rill Sandstone', 'ArrowUp')
    expect(document.activeElement?.textContent).toContain('Alluvium')
    expect(rows().filter((row) => row.attributes('tabindex') === '0')).toHaveLength(1)
  })

  it('hides and isolates rows on the map', async () => {
    const { workplace, margin, press, row } = open()
    await press('Rill Sandstone', 'h')
    expect([...workplace.hiddenEntries]).toEqual([rill.id])
    expect(row('Rill Sandstone').get('.count').text()).toBe('hidden')
    await press('Merrow Group', 'i')
    expect(workplace.hiddenEntries).toEqual(new Set([alluvium.id, rill.id, lantern.id]))
    await margin.get('.hidden-note button').trigger('click')
    expect(workplace.hiddenEntries.size).toBe(0)
  })

  it('selects all items of a row', async () => {
    const { workplace, press } = open()
    await press('Rill Sandstone', 'a')
    expect(workplace.selected).toEqual(labels.map((label) => label.id))
  })

  it('lights the items of the row that has the focus, and the row of what the map hovers', async () => {
    const { workplace, row } = open()
    await row('Rill Sandstone').trigger('focus')
    expect(workplace.hoveredEntry).toBe(rill.id)
    workplace.hoveredEntry = merrow.id
    await nextTick()
    expect(row('Merrow Group').element.closest('li')?.classList).toContain('lit')
  })
})

describe('the units, for an editor', () => {
  const field = (margin: ReturnType<typeof open>['margin'], label: string) => {
    const id = margin
      .findAll('label')
      .find((each) => each.text() === label)
      ?.attributes('for')
    return margin.get<HTMLInputElement>(`[id="${id}"]`)
  }
  async function type(margin: ReturnType<typeof open>['margin'], label: string, text: string) {
    await field(margin, label).setValue(text)
    await field(margin, label).trigger('blur')
  }

  it('are edited where they stand, each field as one change', async () => {
    const { sheet, margin, press } = open()
    await press('Rill Sandstone', 'F2')
    await type(margin, 'Name', 'Rill Formation')
    await type(margin, 'Age', 'Silurian')
    expect(sheet.committed).toHaveLength(2)
    expect(sheet.get(rill.id)?.properties).toMatchObject({
      name: 'Rill Formation',
      age: 'Silurian',
      rank: 20,
    })
  })

  it('are refused, in words at the field, what the schema refuses', async () => {
    const { sheet, margin, press } = open()
    await press('Rill Sandstone', 'F2')
    await type(margin, 'Name', '')
    await type(margin, 'Colour as #rrggbb', 'red')
    expect(margin.findAll('.unit-fields [role=alert]').map((why) => why.text())).toEqual([
      'A unit needs a name.',
      'A colour is written like #c9a26b.',
    ])
    expect(sheet.committed).toEqual([])
  })

  it('are warned of, where two share a label or a colour', async () => {
    const { margin, press } = open()
    await press('Rill Sandstone', 'F2')
    await type(margin, 'Label', 'Dl')
    await type(margin, 'Colour as #rrggbb', '#DAB5A0')
    expect(margin.findAll('.warnings li').map((warning) => warning.text())).toEqual([
      'Lantern Shale carries the label Dl too.',
      'Lantern Shale has this colour too.',
    ])
  })

  it('move by Alt and arrows', async () => {
    const { sheet, press, titles } = open()
    await press('Lantern Shale', 'ArrowUp', { altKey: true })
    expect(titles().slice(0, 4)).toEqual(['Alluvium', 'Lantern Shale', 'Rill Sandstone', 'Merrow Group'])
    expect(sheet.committed).toHaveLength(1)
  })

  it('are not removed while labels use them, with the number said', async () => {
    const { sheet, margin, press, titles } = open()
    await press('Rill Sandstone', 'Delete')
    expect(margin.get('li[role=alert]').text()).toContain('3 unit labels use it')
    expect(sheet.committed).toEqual([])
    await press('Merrow Group', 'Delete')
    expect(titles()).not.toContain('Merrow Group')
  })

  it('are added where their age belongs, with a colour proposed from it', async () => {
    const { sheet, margin, titles } = open()
    await margin.get('.add').trigger('click')
    await type(margin, 'Label', 'Sv')
    await type(margin, 'Name', 'Vane Limestone')
    await type(margin, 'Age', 'Silurian')
    await margin.get('form').trigger('submit')
    expect(titles().slice(0, 5)).toEqual([
      'Alluvium',
      'Rill Sandstone',
      'Lantern Shale',
      'Vane Limestone',
      'Merrow Group',
    ])
    // The chart's Silurian #b3e1b6, half paper.
    expect(sheet.committed[0]?.edits[0]?.after?.properties).toMatchObject({ label: 'Sv', colour: '#d8eed5' })
  })

  it('cannot be added without a name', async () => {
    const { sheet, margin } = open()
    await margin.get('.add').trigger('click')
    await type(margin, 'Label', 'Sv')
    await margin.get('form').trigger('submit')
    expect(margin.get('form [role=alert]').text()).toBe('A unit needs a name.')
    expect(margin.get<HTMLInputElement>('[aria-invalid=true]').attributes('placeholder')).toBe(
      'name of the unit',
    )
    expect(sheet.committed).toEqual([])
  })

  it('are not a compiler’s to change, only to draw with', async () => {
    const { margin, press, row, workplace } = open(undefined, { myRoles: ['compiler'] })
    expect(margin.find('.add').exists()).toBe(false)
    await press('Rill Sandstone', 'F2')
    expect(margin.find('.unit-editor').exists()).toBe(false)
    await row('Rill Sandstone').trigger('click')
    expect(workplace.drawWith).toEqual({ unit: rill.id })
  })
})

describe('crowded symbols', () => {
  it('are counted in their row and above the legend, never hidden in silence', async () => {
    const { workplace, margin, row } = open([
      aPoint('attitude', place, { strike: 45, dip: 40 }),
      aPoint('attitude', place, { strike: 50, dip: 40 }),
      aPoint('attitude', place, { strike: 55, dip: 40 }),
    ])
    workplace.thinned = new Map([['attitude.bedding.inclined', 2]])
    await nextTick()
    const count = row('Bedding, inclined').get('.count')
    expect(count.text()).toBe('1 of 3')
    expect(count.attributes('aria-label')).toBe('1 of 3 shown at this scale')
    expect(margin.get('.hidden-note').text().replaceAll('\u00a0', ' ')).toBe(
      '2 crowded symbols and labels are not shown; zoom in to see them.',
    )
  })
})
