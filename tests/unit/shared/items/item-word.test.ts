import { expect, it } from 'vitest'
import { describeChanges } from '@shared/changes/describe-changes'
import { itemWord } from '@shared/items/item'
import { aPoint } from '../../../support/sheet-items'

it('calls a place and a line by their type', () => {
  expect(itemWord(aPoint('station', [0, 0], { type: 'mine-adit' }))).toBe('mine adit')
  expect(itemWord(aPoint('station', [0, 0], {}))).toBe('station')
  const axis = aPoint('lineation', [0, 0], { type: 'minor-fold-axis', trend: 10, plunge: 5 })
  expect(itemWord(axis)).toBe('minor fold axis')
  expect(itemWord(aPoint('attitude', [0, 0], { strike: 10, dip: 5 }))).toBe('attitude')
})

it('says in the ledger what kind of place was placed', () => {
  const spring = aPoint('station', [0, 0], { type: 'spring', name: 'Cold Well' })
  expect(describeChanges([{ before: null, after: spring }])).toBe('placed 1 spring Cold Well')
  expect(describeChanges([{ before: spring, after: null }])).toBe('removed 1 spring Cold Well')
})

it('says in the ledger which plane a line lies on', () => {
  const line = aPoint('lineation', [0, 0], { trend: 10, plunge: 5, station: '14' })
  const plane = { type: 'cleavage', strike: 45, dip: 40, overturned: false } as const
  const after = { ...line, properties: { ...line.properties, plane } }
  expect(describeChanges([{ before: line, after }])).toBe('plane of lineation 14: none → cleavage 045/40')
})
