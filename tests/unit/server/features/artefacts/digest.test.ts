import { expect, it } from 'vitest'
import { revisionDigest } from '../../../../../server/features/artefacts/digest'
import { canonicalJson } from '../../../../../server/platform/canonical-json'
import { aPrintedSheet, mapItems, unitItems } from '../../../../support/printed-sheet'

it('writes equal content as equal text, whatever the order of keys', () => {
  expect(canonicalJson({ b: [1, { d: null, c: 'x' }], a: true })).toBe(
    '{"a":true,"b":[1,{"c":"x","d":null}]}',
  )
  expect(canonicalJson({ a: undefined, b: 1 })).toBe('{"b":1}')
})

it('does not depend on the order in which items come', () => {
  const items = [...unitItems(3), ...mapItems()]
  const sheet = aPrintedSheet()
  expect(revisionDigest(sheet, 37, items.toReversed())).toBe(revisionDigest(sheet, 37, items))
})

it('changes with any item, with the revision and with the sheet', () => {
  const items = [...unitItems(3), ...mapItems()]
  const sheet = aPrintedSheet()
  const digest = revisionDigest(sheet, 37, items)
  const [first, ...rest] = items
  if (first?.kind !== 'unit') throw new Error('The builder begins with a unit.')
  const renamed = { ...first, properties: { ...first.properties, name: 'Other' } }
  const others = [
    revisionDigest(sheet, 37, [renamed, ...rest]),
    revisionDigest(sheet, 37, rest),
    revisionDigest(sheet, 38, items),
    revisionDigest({ ...sheet, scale: 25_000 }, 37, items),
  ]
  expect(new Set([digest, ...others]).size).toBe(5)
  expect(digest).toMatch(/^[0-9a-f]{64}$/)
})
