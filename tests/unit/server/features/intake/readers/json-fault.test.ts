import { expect, it } from 'vitest'
import { findJsonFault } from '../../../../../../server/features/intake/readers/json-fault'

const isJson = (text: string): boolean => {
  try {
    JSON.parse(text)
    return true
  } catch {
    return false
  }
}

it.each([
  ['{"a":[1,2,{"b":null}],"c":"\\u00e9\\n"}', undefined],
  ['  -0.5e+3 ', undefined],
  ['[]', undefined],
  ['', 0],
  ['{', 1],
  ['{"a"', 4],
  ['{"a":1', 6],
  ['[1,2', 4],
  ['[1 2]', 3],
  ['[01]', 2],
  ['{a:1}', 1],
  ['{"a":}', 5],
  ['{"a":1,}', 7],
  ['["x\ny"]', 1],
  ["['x']", 1],
  ['[1]]', 3],
  ['[1}', 2],
  ['nul', 0],
])('finds where %j stops being JSON', (text, at) => {
  expect(findJsonFault(text)).toBe(at)
})

// JSON.parse is the outside judge: both must agree on every text that a slip of the hand makes of a good one.
it('agrees with JSON.parse on every cut and every dropped character', () => {
  const good =
    '{"type":"Feature","geometry":{"type":"Point","coordinates":[3.5,-45e0]},"properties":{"a":[true,null,""]}}'
  for (let at = 0; at <= good.length; at++) {
    for (const text of [good.slice(0, at), good.slice(0, at) + good.slice(at + 1)]) {
      expect([text, findJsonFault(text) === undefined]).toEqual([text, isJson(text)])
    }
  }
})
