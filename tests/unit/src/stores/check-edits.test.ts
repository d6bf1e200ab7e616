import { describe, expect, it } from 'vitest'
import { checkEdits } from '@/stores/check-edits'
import { aLine, aPoint } from '../../../support/sheet-items'

const contact = aLine(
  'contact',
  [
    [0, 0],
    [10, 0],
  ],
  {},
)

describe('the check at the one door', () => {
  it('puts coordinates on the 1 mm grid and takes the item’s present state as the one before', () => {
    const drawn = {
      ...contact,
      geometry: {
        ...contact.geometry,
        coordinates: [
          [0.00049, 0],
          [9.99951, 1],
        ] as [number, number][],
      },
    }
    const checked = checkEdits([{ before: null, after: drawn }], () => contact)
    expect(checked).toMatchObject({
      outcome: 'ok',
      edits: [
        {
          before: contact,
          after: {
            geometry: {
              coordinates: [
                [0, 0],
                [10, 1],
              ],
            },
          },
        },
      ],
    })
  })

  it('refuses what the item’s schema refuses, naming the field', () => {
    const attitude = aPoint('attitude', [0, 0], { strike: 45, dip: 40 })
    const wrong = { ...attitude, properties: { ...attitude.properties, dip: 95 } }
    expect(checkEdits([{ before: attitude, after: wrong }], () => attitude)).toMatchObject({
      outcome: 'refused',
      errors: [{ item: attitude.id, pointer: '/properties/dip' }],
    })
  })

  it('refuses a line without length', () => {
    const point = {
      ...contact,
      geometry: { ...contact.geometry, coordinates: [[0, 0]] as [number, number][] },
    }
    expect(checkEdits([{ before: null, after: point }], () => undefined).outcome).toBe('refused')
  })

  it('leaves out the removal of what is gone already', () => {
    expect(checkEdits([{ before: contact, after: null }], () => undefined)).toEqual({
      outcome: 'ok',
      edits: [],
    })
  })
})
