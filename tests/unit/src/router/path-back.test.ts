import { expect, it } from 'vitest'
import { pathBack } from '@/router/path-back'

it('goes back to a path of ours', () => {
  expect(pathBack('/sheets/MI-14/compile?x=1')).toBe('/sheets/MI-14/compile?x=1')
})

it.each([
  '//elsewhere.example',
  '/\\elsewhere.example',
  'https://elsewhere.example',
  'sheets',
  '',
  undefined,
  ['/a'],
])('goes to the sheets rather than to %j', (back) => {
  expect(pathBack(back)).toBe('/sheets')
})
