import { describe, expect, it } from 'vitest'
import { ownProblem, sentencesAt, slugOf } from '@/api/problem'
import { aProblem } from '../../../support/fake-network'

describe('slugOf', () => {
  it('reads the last part of the type, also of a whole address', () => {
    expect(slugOf(aProblem('own-work', 403))).toBe('own-work')
    expect(slugOf({ ...aProblem('x', 403), type: 'https://maps.example/problems/own-work' })).toBe('own-work')
  })

  it.each(['/problems/made-up', 'about:blank', '/problems/toString', ''])('does not know %j', (type) => {
    expect(slugOf({ ...aProblem('x', 400), type })).toBeUndefined()
  })
})

describe('sentencesAt', () => {
  const problem = aProblem('invalid-input', 400, {
    errors: [
      { pointer: '/area', detail: 'whole' },
      { pointer: '/area/west', detail: 'part' },
      { pointer: '/areas', detail: 'another field' },
    ],
  })

  it('takes the sentences of a place and of what is below it, and not of a longer name', () => {
    expect(sentencesAt(problem, '/area')).toEqual(['whole', 'part'])
    expect(sentencesAt(problem, '/area/west')).toEqual(['part'])
  })

  it('has none for no problem', () => {
    expect(sentencesAt(null, '/area')).toEqual([])
  })
})

it('makes a problem of our own from the table', () => {
  expect(ownProblem('unavailable', 'No answer.')).toMatchObject({
    type: '/problems/unavailable',
    status: 503,
    detail: 'No answer.',
  })
})
