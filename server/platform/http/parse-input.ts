import { z } from 'zod'
import type { ProblemExtras } from '@shared/api/problems'
import { problem, type ProblemError } from '../problem'

type Fault = NonNullable<ProblemExtras['errors']>[number]

/** Most faults that one answer lists. */
const MAX_FAULTS = 100

/** Input as its schema gives it.
 *  Throws 'invalid-input' with a JSON pointer per fault. */
export function parseInput<S extends z.ZodType>(schema: S, input: unknown): z.output<S> {
  const unusable = findUnusable(input)
  if (unusable) throw invalidInput([unusable])
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  const issues = parsed.error.issues.slice(0, MAX_FAULTS)
  throw invalidInput(issues.flatMap((issue) => toFaults(issue, input)))
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

function toFaults(issue: z.core.$ZodIssue, input: unknown): Fault[] {
  const item = findItem(input, issue.path)
  const at = (path: readonly PropertyKey[], detail: string): Fault => ({
    pointer: toPointer(path),
    detail,
    ...(item ? { item } : {}),
  })
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => at([...issue.path, key], `There is no field “${key}” here.`))
  }
  return [at(issue.path, issue.message)]
}

const idSchema = z.looseObject({ id: z.uuid() })

/** Id of the innermost thing with an id that a path leads through: the item that a fault is about. */
function findItem(input: unknown, path: readonly PropertyKey[]): string | undefined {
  let value = input
  let found: string | undefined
  for (const key of path) {
    if (typeof value !== 'object' || value === null) return found
    value = Reflect.get(value, key)
    found = idSchema.safeParse(value).data?.id ?? found
  }
  return found
}

/** JSON pointer (RFC 6901) of a path of keys. */
export const toPointer = (path: readonly PropertyKey[]): string =>
  path.map((key) => `/${String(key).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('')

/** A NUL or half a surrogate pair: valid in a JSON string, but PostgreSQL can store neither. */
const UNSTORABLE = /\0|\p{Surrogate}/u

/** Deepest nesting that is read: none of ours needs a tenth of it, and schemas walk it on the stack. */
const MAX_DEPTH = 100

/** A place in the input, with the way to it only as a chain: a million places need no million lists of keys. */
interface Place {
  value: unknown
  key: string
  outer: Place | undefined
  depth: number
}

function pathTo(place: Place): string[] {
  const path: string[] = []
  for (let at: Place | undefined = place; at?.outer; at = at.outer) path.unshift(at.key)
  return path
}

/** Where the input cannot be used whatever its schema: text that cannot be stored, or nesting without end. Walks with a
 *  stack of its own, so that deep nesting cannot exhaust ours. */
function findUnusable(input: unknown): Fault | undefined {
  const open: Place[] = [{ value: input, key: '', outer: undefined, depth: 0 }]
  for (let place = open.pop(); place; place = open.pop()) {
    const { value, depth } = place
    const detail = whyUnusable(value, depth)
    if (detail) return { pointer: toPointer(pathTo(place)), detail }
    if (typeof value !== 'object' || value === null) continue
    for (const key of Object.keys(value)) {
      const inner: unknown = Reflect.get(value, key)
      if (typeof inner === 'string' || typeof inner === 'object')
        open.push({ value: inner, key, outer: place, depth: depth + 1 })
    }
  }
  return undefined
}

function whyUnusable(value: unknown, depth: number): string | undefined {
  if (typeof value === 'string') {
    return UNSTORABLE.test(value) ? 'This text holds a character that cannot be stored.' : undefined
  }
  if (typeof value !== 'object' || value === null) return undefined
  if (depth > MAX_DEPTH) return 'This is nested too deep to be read.'
  const isOdd = !Array.isArray(value) && Object.keys(value).some((key) => UNSTORABLE.test(key))
  return isOdd ? 'A field name here holds a character that cannot be stored.' : undefined
}
