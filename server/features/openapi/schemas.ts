import { z } from 'zod'

/** A JSON Schema (2020-12), as plain data. */
export type JsonSchema = { [key: string]: unknown }

type Direction = 'input' | 'output'

interface Part {
  schema: JsonSchema
  /** Schemas with a name of their own that it refers to. */
  named: Map<string, JsonSchema>
}

/** Collects the schemas of an API, and names those that have an id. What is sent and what is answered may differ (a field
 *  with a default need not be sent, but is always answered): such a schema gets a second name for what is sent. */
export class Schemas {
  private readonly named = { input: new Map<string, JsonSchema>(), output: new Map<string, JsonSchema>() }

  /** A schema as it is sent or answered; its references hold only once `components` has been asked. */
  add(schema: z.ZodType, direction: Direction): JsonSchema {
    const { schema: found, named } = toJsonSchema(schema, direction)
    for (const [name, definition] of named) this.named[direction].set(name, definition)
    return direction === 'input' ? markInput(found) : found
  }

  /** Every named schema, and the names of those that differ when sent. */
  components(): { schemas: Record<string, JsonSchema>; differing: Set<string> } {
    const differing = this.findDiffering()
    const schemas: [string, JsonSchema][] = [...this.named.output]
    for (const [name, definition] of this.named.input) {
      if (differing.has(name)) schemas.push([`${name}Input`, markInput(definition)])
      else if (!this.named.output.has(name)) schemas.push([name, markInput(definition)])
    }
    schemas.sort(([a], [b]) => a.localeCompare(b, 'en'))
    return { schemas: Object.fromEntries(schemas), differing }
  }

  /** Named schemas that differ between the directions, themselves or in something that they refer to. */
  private findDiffering(): Set<string> {
    const differing = new Set<string>()
    const differs = (name: string, definition: JsonSchema): boolean => {
      const answered = this.named.output.get(name)
      if (!answered) return false
      const text = JSON.stringify(definition)
      return (
        text !== JSON.stringify(answered) || [...differing].some((other) => text.includes(`"${REF}${other}"`))
      )
    }
    for (let before = -1; before !== differing.size;) {
      before = differing.size
      for (const [name, definition] of this.named.input) if (differs(name, definition)) differing.add(name)
    }
    return differing
  }
}

const REF = '#/components/schemas/'
/** Stands in references of what is sent until it is known which schemas differ. */
const INPUT_MARK = '\u0001'

const markInput = (schema: JsonSchema): JsonSchema =>
  mapReferences(schema, (reference) => `${reference}${INPUT_MARK}`)

/** Settles the references of a whole document: to the second name where sending differs from answering. */
export const settleReferences = (document: JsonSchema, differing: ReadonlySet<string>): JsonSchema =>
  mapReferences(document, (reference) => {
    if (!reference.endsWith(INPUT_MARK)) return reference
    const plain = reference.slice(0, -INPUT_MARK.length)
    return differing.has(plain.slice(REF.length)) ? `${plain}Input` : plain
  })

function toJsonSchema(schema: z.ZodType, io: Direction): Part {
  // Inside another object a schema with an id becomes a reference; at the root it would be written out.
  const whole = z.toJSONSchema(z.strictObject({ it: schema }), {
    target: 'draft-2020-12',
    io,
    unrepresentable: 'any',
  })
  const { it } = whole.properties ?? {}
  const named = new Map<string, JsonSchema>()
  for (const [name, definition] of Object.entries(whole.$defs ?? {})) {
    const plain = toComponents(definition)
    // The name says it; `id` is not a word of JSON Schema.
    delete plain.id
    named.set(name, plain)
  }
  return { schema: toComponents(it ?? {}), named }
}

const toComponents = (schema: unknown): JsonSchema =>
  mapReferences(typeof schema === 'object' && schema !== null ? { ...schema } : {}, (reference) =>
    reference.replace('#/$defs/', REF),
  )

/** The same schema with every `$ref` changed. */
function mapReferences(schema: JsonSchema, change: (reference: string) => string): JsonSchema {
  const mapped = JSON.parse(JSON.stringify(schema), (key, value: unknown) =>
    key === '$ref' && typeof value === 'string' ? change(value) : value,
  )
  return mapped
}
