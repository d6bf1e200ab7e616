import { describe, expect, it } from 'vitest'
import { composeSpecimen } from '@shared/specimen/specimen'
import { findSymbols } from '@/components/symbols/find-symbols'

const families = composeSpecimen()
const idsFor = (text: string): string[] =>
  findSymbols(families, text).flatMap(({ entries }) => entries.map(({ id }) => id))

describe('search in the symbol set', () => {
  it('finds by meaning, attribute, published number and case', () => {
    expect(idsFor('thrust')).toEqual(['fault.thrust'])
    expect(idsFor('FGDC 2.2.1')).toEqual(['fault.normal'])
    expect(idsFor('plunge')).toContain('axial-trace.anticline')
    expect(idsFor('tops known')).toEqual(['attitude.bedding'])
  })

  it('wants all words, in any order', () => {
    expect(idsFor('syncline overturned')).toEqual(idsFor('overturned syncline'))
    expect(idsFor('thrust limestone')).toEqual([])
  })

  it('keeps the whole set without words, and no family without a symbol', () => {
    expect(findSymbols(families, '  ')).toHaveLength(families.length)
    expect(findSymbols(families, 'limestone')).toHaveLength(1)
  })
})
