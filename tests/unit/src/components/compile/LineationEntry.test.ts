import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import type { XY } from '@shared/units'
import LineationEntry from '@/components/compile/LineationEntry.vue'
import { aPoint, aSheetFace } from '../../../../support/sheet-items'
import { useSheetFake } from '../../../../support/open-sheet-fake'

const PLACE: XY = [286_000, 5_280_000]
const start = { type: 'lineation', planeType: '', station: '214', text: '' } as const

beforeEach(() => setActivePinia(createPinia()))

function mountNew(more: Partial<{ type: 'minor-fold-axis'; planeType: 'foliation' }> = {}) {
  const sheet = useSheetFake()
  sheet.start([aSheetFace()])
  const entry = mount(LineationEntry, { props: { place: PLACE, start: { ...start, ...more } } })
  const type = (text: string) => entry.get('input.reading').setValue(text)
  const plane = (text: string) => entry.get('input.plane').setValue(text)
  const added = () => sheet.committed[0]?.edits[0]?.after
  return { sheet, entry, type, plane, added }
}

describe('a new lineation', () => {
  it.each(['120/35', '35→120', '35 toward 120', 'S60E 35'])(
    'echoes %s in words and draws its arrow',
    async (text) => {
      const { entry, type } = mountNew()
      await type(text)
      expect(entry.get('.words').text()).toBe('Lineation, plunges 35° toward 120° (south-east)')
      expect(entry.get('.echo svg text').text()).toBe('35')
    },
  )

  it('is placed on Enter, with the reading as it was typed', async () => {
    const { entry, type, added } = mountNew({ type: 'minor-fold-axis' })
    await type('35→120')
    await entry.trigger('submit')
    expect(added()).toMatchObject({
      kind: 'lineation',
      geometry: { type: 'Point', coordinates: PLACE },
      properties: {
        type: 'minor-fold-axis',
        trend: 120,
        plunge: 35,
        plane: null,
        station: '214',
        reading: { text: '35→120', convention: 'trend-plunge', northReference: 'true', declination: null },
      },
    })
    expect(entry.emitted('taken')).toHaveLength(1)
  })

  it('is refused in words for a plunge of 95, and nothing is placed', async () => {
    const { sheet, entry, type } = mountNew()
    await type('120/95')
    await entry.trigger('submit')
    expect(entry.get('[role=alert]').text()).toBe('Plunge 95 is more than 90: plunges run from 0 to 90.')
    expect(sheet.committed).toEqual([])
  })

  it('may be a rake on its plane', async () => {
    const { entry, type, plane, added } = mountNew({ planeType: 'foliation' })
    await type('rake 138.4')
    await plane('120/40')
    await entry.trigger('submit')
    // Source: Cardozo, Computational Geosciences, ch. 4, as in tests/reference/orientation.ts: 265.8/25.3.
    expect(added()).toMatchObject({
      properties: {
        trend: expect.closeTo(265.8, 1) as number,
        plunge: expect.closeTo(25.3, 1) as number,
        plane: { type: 'foliation', strike: 120, dip: 40, overturned: false },
        reading: { text: 'rake 138.4', convention: 'rake' },
      },
    })
  })

  it('keeps no more than hundredths of a degree of what a rake gives', async () => {
    const { entry, type, plane, added } = mountNew({ planeType: 'foliation' })
    await type('rake 0.001')
    await plane('000/40')
    await entry.trigger('submit')
    expect(added()).toMatchObject({ properties: { trend: 0, plunge: 0 } })
  })

  it('asks for the plane of a rake', async () => {
    const { entry, type } = mountNew()
    await type('rake 40')
    await entry.trigger('submit')
    expect(entry.get('[role=alert]').text()).toContain('A rake needs the plane')
  })

  it('warns with both figures where it does not lie on its plane, and is placed all the same', async () => {
    const { sheet, entry, type, plane } = mountNew({ planeType: 'foliation' })
    await type('135/60')
    await plane('045/40')
    expect(entry.get('.warning').text()).toContain('The line 135/60 lies 20° off the plane 045/40')
    await entry.trigger('submit')
    expect(sheet.committed).toHaveLength(1)
  })

  it('turns line and plane by the same declination', async () => {
    const { entry, type, plane, added } = mountNew({ planeType: 'foliation' })
    await type('120/35')
    await plane('045/36')
    await entry.get('input[value=magnetic]').setValue(true)
    await entry.get('input.declination').setValue('10 W')
    await entry.trigger('submit')
    expect(added()).toMatchObject({
      properties: {
        trend: 110,
        plane: { strike: 35 },
        reading: { northReference: 'magnetic', declination: -10 },
      },
    })
  })

  it('can be given in separate fields', async () => {
    const { entry, added } = mountNew()
    await entry.get('button.link.light').trigger('click')
    const [trend, plunge] = entry.findAll('.figure-fields input')
    await trend?.setValue('200')
    await plunge?.setValue('0')
    await entry.trigger('submit')
    expect(added()).toMatchObject({ properties: { trend: 200, plunge: 0 } })
  })
})

describe('the reading of a lineation on the sheet', () => {
  const lineation = aPoint('lineation', PLACE, {
    trend: 110,
    plunge: 35,
    plane: { type: 'cleavage', strike: 35, dip: 36, overturned: false },
    reading: { text: '120/35', convention: 'trend-plunge', northReference: 'magnetic', declination: -10 },
  })
  function mountExisting() {
    const sheet = useSheetFake()
    sheet.start([lineation, aSheetFace()])
    const props = { place: PLACE, item: lineation, start: { ...start, planeType: 'cleavage' as const } }
    return { sheet, entry: mount(LineationEntry, { props }) }
  }
  const valueOf = (entry: ReturnType<typeof mountExisting>['entry'], field: string) =>
    entry.get<HTMLInputElement>(field).element.value

  it('starts as it was written, its plane against the same north', () => {
    const { entry } = mountExisting()
    expect(valueOf(entry, 'input.reading')).toBe('120/35')
    expect(valueOf(entry, 'input.plane')).toBe('045/36')
    expect(valueOf(entry, 'input.declination')).toBe('10 W')
  })

  it('changes nothing when nothing was changed, and once when the field is left', async () => {
    const { sheet, entry } = mountExisting()
    await entry.trigger('submit')
    expect(sheet.committed).toEqual([])
    await entry.get('input.reading').setValue('125/33')
    await entry.get('input.reading').trigger('change')
    expect(sheet.committed).toHaveLength(1)
    expect(sheet.get(lineation.id)).toMatchObject({
      properties: { trend: 115, plunge: 33, plane: { strike: 35 } },
    })
  })

  it('keeps what does not read yet, line and plane, for who comes back', async () => {
    const { sheet, entry } = mountExisting()
    await entry.get('input.plane').setValue('045/')
    await entry.get('input.reading').setValue('125/33')
    entry.unmount()
    expect(sheet.committed).toEqual([])
    const { entry: again } = mountExisting()
    expect(valueOf(again, 'input.reading')).toBe('125/33')
    expect(valueOf(again, 'input.plane')).toBe('045/')
  })

  it('forgets its plane when none is stated', async () => {
    const { sheet, entry } = mountExisting()
    await entry.get('select').setValue('')
    await entry.get('select').trigger('change')
    expect(sheet.get(lineation.id)).toMatchObject({ properties: { trend: 110, plane: null } })
  })
})
