import { describe, expect, it } from 'vitest'
import { edgeMeetsBox, edgesOf, isInside, leaveBox } from '@shared/geometry/box-edges'

const box = { x: 0, y: 0, width: 4, height: 2 }

describe('an edge and a box', () => {
  it('meet where the edge ends in the box, runs through it, or touches its corner', () => {
    expect(edgeMeetsBox([1, 1], [9, 9], box)).toBe(true)
    expect(edgeMeetsBox([-1, 1], [5, 1.2], box)).toBe(true)
    expect(edgeMeetsBox([3, 3], [5, 1], box)).toBe(true)
  })

  it('do not meet where it passes by, even if their bounds do', () => {
    expect(edgeMeetsBox([3, 4], [6, 1], box)).toBe(false)
    expect(edgeMeetsBox([-1, 3], [5, 3], box)).toBe(false)
  })
})

describe('a place in an area', () => {
  const outer: [number, number][] = [
    [0, 0],
    [10, 0],
    [10, 10],
    [0, 10],
    [0, 0],
  ]
  const hole: [number, number][] = [
    [4, 4],
    [6, 4],
    [6, 6],
    [4, 6],
    [4, 4],
  ]

  it('is within the outer ring and not in a hole', () => {
    expect(isInside(edgesOf([outer, hole]), [2, 5])).toBe(true)
    expect(isInside(edgesOf([outer, hole]), [5, 5])).toBe(false)
    expect(isInside(edgesOf([outer, hole]), [12, 5])).toBe(false)
  })
})

describe('the way out of a box', () => {
  it('leaves by the side that it meets first', () => {
    expect(leaveBox(box, [12, 1])).toEqual([4, 1])
    expect(leaveBox(box, [2, -7])).toEqual([2, 0])
    expect(leaveBox(box, [6, 3])).toEqual([4, 2])
  })
})
