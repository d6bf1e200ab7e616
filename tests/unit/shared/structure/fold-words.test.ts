import { describe, expect, it } from 'vitest'
import { describeFold } from '@shared/structure/fold-words'
import type { AxialTraceProperties, FoldForm } from '@shared/items/lines'

const axis = (form: FoldForm, properties: Partial<AxialTraceProperties> = {}) => ({
  form,
  plunge: null,
  trend: null,
  doubly: 'no' as const,
  otherPlunge: null,
  ...properties,
})

describe('a fold in words', () => {
  it('says which way it plunges', () =>
    expect(describeFold(axis('anticline', { plunge: 21, trend: 28 }))).toBe(
      'Anticline, plunging 21° toward 028°',
    ))

  it('says what is known when there is no plunge', () => {
    expect(describeFold(axis('overturned-syncline'))).toBe('Overturned syncline')
    expect(describeFold(axis('synform', { plunge: 0, trend: 28 }))).toBe(
      'Synform, axis horizontal, trending 028°',
    )
    expect(describeFold(axis('syncline', { plunge: 90, trend: 28 }))).toBe('Syncline, axis vertical')
  })

  it('names the side of those that have one, and only of them', () => {
    expect(describeFold(axis('overturned-anticline'), 'east')).toBe(
      'Overturned anticline, limbs dip to the east',
    )
    expect(describeFold(axis('monocline-synclinal-bend'), 'south')).toBe(
      'Monocline, synclinal bend, steep limb dips to the south',
    )
    expect(describeFold(axis('anticline'), 'east')).toBe('Anticline')
  })

  it('gives the other half of a doubly plunging axis the opposite trend', () => {
    const both = axis('anticline', { plunge: 21, trend: 300, doubly: 'outward', otherPlunge: 12 })
    expect(describeFold(both)).toBe(
      'Anticline, plunging both ways from a culmination: 21° toward 300°, 12° toward 120°',
    )
    expect(describeFold(axis('syncline', { doubly: 'inward' }))).toBe(
      'Syncline, plunging both ways into a depression',
    )
  })
})
