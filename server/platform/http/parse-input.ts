import type { z } from 'zod'
import { problem, type ProblemError } from '../problem'

type Fault = { pointer: string; detail: string }

/** Most faults that one answer lists. */
const MAX_FAULTS = 100

/** Input as its schema gives it.
 *  Throws 'invalid-input' with a JSON pointer per fault. */
export function parseInput<S extends z.ZodType>(schema: S, input: unknown): z.output<S> {
  const unusable = findUnusable(input)
  if (unusable) throw invalidInput([unusable])
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  throw invalidInput(parsed.error.issues.slice(0, MAX_FAULTS).flatMap(toFaults))
}

/** Parts of a path as their schema gives them; undefined where they can name nothing. */
export function parsePath<S extends z.ZodType>(schema: S, parts: unknown): z.output<S> | undefined {
  return findUnusable(parts) ? undefined : schema.safeParse(parts).data
}

function invalidInput(errors: Fault[]): ProblemError {
  const [first] = errors
  const more = errors.length > 1 ? ` (and ${errors.length - 1} more)` : ''
  return problem('invalid-input', `${first ? first.detail : 'It is not what was expected.'}${more}`, {
    errors,
  })
}

function toFaults(issue: z.core.$ZodIssue): Fault[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      pointer: toPointer([...issue.path, key]),
      detail: `There is no field “${key}” here.`,
    }))
  }
  return [{ pointer: toPointer(issue.path), detail: issue.message }]
}

/** JSON pointer (RFC 6901) of a path of keys. */
export const toPointer = (path: readonly PropertyKey[]): string =>
  path.map((key) => `/${String(key).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('')

/** A NUL or half a surrogate pair: valid in a JSON string, but PostgreSQL can store neither. */
const UNSTORABLE = /\0|\p{Surrogate}/u

/** Deepest nesting that is read: none of ours needs a tenth of it, and schemas walk it on the stack. */
const MAX_DEPTH = 100

/** Where the input cannot be used whatever its schema: text that cannot be stored, or nesting without end. Walks with a
 *  stack of its own, so that deep nesting cannot exhaust ours. */
function findUnusable(input: unknown): Fault | undefined {
  const open: { value: unknown; path: PropertyKey[] }[] = [{ value: input, path: [] }]
  for (let place = open.pop(); place; place = open.pop()) {
    const { value, path } = place
    const at = (detail: string): Fault => ({ pointer: toPointer(path), detail })
    if (typeof value === 'string' && UNSTORABLE.test(value)) {
      return at('This text holds a character that cannot be stored.')
    }
    if (typeof value !== 'object' || value === null) continue
    if (path.length > MAX_DEPTH) return at('This is nested too deep to be read.')
    for (const [key, inner] of Object.entries(value)) {
      if (UNSTORABLE.test(key)) return at('A field name here holds a character that cannot be stored.')
      if (typeof inner === 'string' || typeof inner === 'object')
        open.push({ value: inner, path: [...path, key] })
    }
  }
  return undefined
}
