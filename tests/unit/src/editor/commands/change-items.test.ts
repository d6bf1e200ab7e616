import { describe, expect, it } from 'vitest'
import { changeProperties, reverseLines } from '@/editor/commands/change-items'
import type { Drafted } from '@/editor/commands/change-draft'
import { aLine, aPoint } from '../../../../support/sheet-items'

const fault = aLine(
  'fault',
  [
    [0, 0],
    [10, 0],
    [10, 20],
  ],
  { type: 'normal', side: 'left' },
)
const axis = aLine(
  'axial-trace',
  [
    [0, 0],
    [0, 50],
  ],
  { form: 'anticline', plunge: 21, trend: 28 },
)
const station = aPoint('station', [0, 0], {})
const view = { item: (id: string) => [fault, axis, station].find((item) => item.id === id) }
const afterOf = (answer: Drafted) => (answer.outcome === 'drafted' ? answer.draft.edits[0]?.after : undefined)

describe('reversing a line', () => {
  it('hands a fault’s side over, so that the same ground stays downthrown', () => {
    expect(afterOf(reverseLines(view, [fault.id]))).toMatchObject({
      geometry: {
        coordinates: [
          [10, 20],
          [10, 0],
          [0, 0],
        ],
      },
      properties: { side: 'right' },
    })
  })

  it('leaves the trend of a fold, which is an azimuth of its own', () => {
    expect(afterOf(reverseLines(view, [axis.id]))).toMatchObject({
      geometry: {
        coordinates: [
          [0, 50],
          [0, 0],
        ],
      },
      properties: { plunge: 21, trend: 28 },
    })
  })

  it('renames the side of a fold, and keeps that of a rotational fault, whose start moves to the other end', () => {
    expect(afterOf(reverseLines(view, [axis.id]))?.properties).toMatchObject({ side: 'left' })
    const rotational = { ...fault, properties: { ...fault.properties, type: 'rotational' as const } }
    const turned = afterOf(reverseLines({ item: () => rotational }, [fault.id]))
    expect(turned?.properties).toMatchObject({ side: 'left' })
  })

  it('twice gives the line as it was', () => {
    const once = afterOf(reverseLines(view, [fault.id]))
    const twice = afterOf(reverseLines({ item: () => once ?? undefined }, [fault.id]))
    expect(twice).toEqual(fault)
  })

  it('refuses where no line is selected', () => {
    expect(reverseLines(view, [station.id])).toMatchObject({ outcome: 'refused' })
  })
})

describe('changing properties', () => {
  it('changes what an item has, and leaves out items that do not have it', () => {
    const answer = changeProperties(view, {
      ids: [fault.id, station.id],
      change: { locationConfidence: 'concealed' },
      deed: 'made concealed:',
    })
    expect(answer).toMatchObject({ outcome: 'drafted', draft: { label: 'made concealed: a fault' } })
    expect(answer.outcome === 'drafted' && answer.draft.edits).toHaveLength(1)
  })
})
