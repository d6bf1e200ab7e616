/** Deepest nesting of an attribute that is kept. */
const MAX_DEPTH = 32

/** Characters that PostgreSQL's jsonb cannot hold: zeros and halves of surrogate pairs. */
const unstorable = /\0|\p{Surrogate}/gu

/** Attributes as they can be stored: unstorable characters replaced by U+FFFD, what is nested too deeply by a remark. */
export const cleanAttributes = (attributes: object): Record<string, unknown> =>
  Object.fromEntries(
    Object.entries(attributes).map(([name, value]) => [cleanText(name), cleanValue(value, 0)]),
  )

export const cleanText = (text: string): string => text.replace(unstorable, '\ufffd')

function cleanValue(value: unknown, depth: number): unknown {
  if (typeof value === 'string') return cleanText(value)
  if (typeof value !== 'object' || value === null) return value
  if (depth >= MAX_DEPTH) return '(nested too deeply to be kept)'
  if (Array.isArray(value)) return value.map((member) => cleanValue(member, depth + 1))
  return Object.fromEntries(
    Object.entries(value).map(([name, member]) => [cleanText(name), cleanValue(member, depth + 1)]),
  )
}
