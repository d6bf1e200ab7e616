import { describe, expect, it } from 'vitest'
import {
  dipDirection,
  dot,
  lineDirection,
  poleDirection,
  strikeDirection,
} from '@shared/structure/directions'
import { lineVectors, poleVectors } from '../../../reference/orientation'

const near = (vector: readonly number[]) => vector.map((part) => expect.closeTo(part, 11) as number)

describe('directions as vectors', () => {
  it.each(lineVectors)('of the line $trend/$plunge', ({ vector, ...line }) => {
    expect(lineDirection(line)).toEqual(near(vector))
  })

  it.each(poleVectors)('of the pole of $strike/$dip', ({ vector, ...plane }) => {
    expect(poleDirection(plane)).toEqual(near(vector))
  })

  it('of strike, dip and pole stand square to one another, all round the compass', () => {
    for (let strike = 0; strike < 360; strike++) {
      for (const dip of [0, 30, 77, 90]) {
        const plane = { strike, dip }
        const [along, down, up] = [strikeDirection(plane), dipDirection(plane), poleDirection(plane)]
        for (const pair of [dot(along, down), dot(down, up), dot(up, along)]) expect(pair).toBeCloseTo(0, 12)
        for (const direction of [along, down, up]) expect(dot(direction, direction)).toBeCloseTo(1, 12)
      }
    }
  })
})
