import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { parseInput, toPointer } from '../../../../../server/platform/http/parse-input'
import { ProblemError } from '../../../../../server/platform/problem'

const schema = z.strictObject({
  name: z.string().min(1, 'A name is needed.'),
  places: z.array(z.strictObject({ east: z.number() })).default([]),
})

function faultsOf(input: unknown, of: z.ZodType = schema) {
  try {
    parseInput(of, input)
  } catch (fault) {
    if (fault instanceof ProblemError) return fault.extras.errors
    throw fault
  }
  throw new Error('It was not refused.')
}

describe('parsing input', () => {
  it('gives what the schema gives, defaults included', () => {
    expect(parseInput(schema, { name: 'a' })).toEqual({ name: 'a', places: [] })
  })

  it('names places by RFC 6901 pointers', () => {
    // Source: RFC 6901 section 5, "/a~1b" and "/m~0n"; the empty pointer is the whole document.
    expect(toPointer(['a/b'])).toBe('/a~1b')
    expect(toPointer(['m~n'])).toBe('/m~0n')
    expect(toPointer(['foo', 0])).toBe('/foo/0')
    expect(toPointer([])).toBe('')
  })

  it('names each fault, and each field that does not belong there', () => {
    expect(faultsOf({ name: '', places: [{ east: 'x' }, { east: 1, 'no/th': 2 }] })).toEqual([
      { pointer: '/name', detail: 'A name is needed.' },
      { pointer: '/places/0/east', detail: expect.any(String) },
      { pointer: '/places/1/no~1th', detail: 'There is no field “no/th” here.' },
    ])
  })

  it.each([
    [{ name: 'a\0' }, '/name'],
    [{ name: 'a\udc00' }, '/name'],
    [{ name: 'a', places: [{ 'east\0': 1 }] }, '/places/0'],
  ])('refuses text that no database can keep: %j', (input, pointer) => {
    expect(faultsOf(input)).toEqual([{ pointer, detail: expect.stringContaining('cannot be stored') }])
  })

  it('lets whole surrogate pairs and every other character pass', () => {
    const name = '𝕄errow Ünit €  \u2028'
    expect(parseInput(schema, { name }).name).toBe(name)
  })

  it('refuses a nesting of a million, and reads one of fifty', () => {
    const nest = (depth: number) => {
      let nested: unknown = 'bottom'
      for (let level = 0; level < depth; level++) nested = [nested]
      return nested
    }
    expect(faultsOf(nest(1_000_000), z.any())?.[0]?.detail).toBe('This is nested too deep to be read.')
    expect(parseInput(z.any(), nest(50))).toEqual(nest(50))
  })

  it('lists at most a hundred faults', () => {
    const places = Array.from({ length: 5000 }, () => ({ east: 'x' }))
    expect(faultsOf({ name: 'a', places })).toHaveLength(100)
  })

  it('names the innermost item that a fault is about', () => {
    const item = z.strictObject({ id: z.uuid(), dip: z.number() })
    const [first, second] = ['7b3e9b5e-0f1c-4b62-8a56-0f8f2c1d3a01', '7b3e9b5e-0f1c-4b62-8a56-0f8f2c1d3a02']
    const sent = {
      items: [
        { id: first, dip: 4 },
        { id: second, dip: 'steep' },
      ],
    }
    expect(faultsOf(sent, z.strictObject({ items: z.array(item) }))).toMatchObject([
      { pointer: '/items/1/dip', item: second },
    ])
  })
})
