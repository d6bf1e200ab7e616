import { z } from 'zod'

/** What the reading page needs of the OpenAPI document; it holds more, which stays unread here. */
const schemaSchema = z.record(z.string(), z.unknown())
const contentSchema = z.record(z.string(), z.object({ schema: schemaSchema.optional() }))
const operationSchema = z.object({
  operationId: z.string(),
  tags: z.array(z.string()).default([]),
  summary: z.string().default(''),
  description: z.string().default(''),
  parameters: z
    .array(
      z.object({
        name: z.string(),
        in: z.string(),
        required: z.boolean().default(false),
        description: z.string().optional(),
        schema: schemaSchema.optional(),
      }),
    )
    .default([]),
  requestBody: z.object({ content: contentSchema }).optional(),
  responses: z.record(
    z.string(),
    z.object({ description: z.string().default(''), content: contentSchema.optional() }),
  ),
})
export const documentSchema = z.object({
  info: z.object({ title: z.string(), version: z.string() }),
  paths: z.record(z.string(), z.record(z.string(), operationSchema)),
  components: z.object({ schemas: z.record(z.string(), schemaSchema).default({}) }).default({ schemas: {} }),
})
export type ApiDocument = z.infer<typeof documentSchema>
export type Operation = z.infer<typeof operationSchema> & { method: string; path: string }

/** Calls by room, rooms and calls in the document's order. */
export function byRoom(document: ApiDocument): { room: string; operations: Operation[] }[] {
  const rooms = new Map<string, Operation[]>()
  for (const [path, methods] of Object.entries(document.paths)) {
    for (const [method, operation] of Object.entries(methods)) {
      const room = operation.tags[0] ?? 'other'
      rooms.set(room, [...(rooms.get(room) ?? []), { ...operation, method, path }])
    }
  }
  return [...rooms].map(([room, operations]) => ({ room, operations }))
}

type Schema = z.infer<typeof schemaSchema>
const isSchema = (value: unknown): value is Schema =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
const schemas = (value: unknown): Schema[] => (Array.isArray(value) ? value.filter(isSchema) : [])

/** The shape of a value in one line: `{ number: text, scale: whole number, … }`. */
export function shapeWords(schema: Schema | undefined, depth = 0): string {
  if (!schema) return 'anything'
  const { $ref, type } = schema
  if (typeof $ref === 'string') return $ref.split('/').at(-1) ?? 'anything'
  if ('const' in schema) return JSON.stringify(schema['const'])
  if (Array.isArray(schema['enum'])) return schema['enum'].map((value) => JSON.stringify(value)).join(' | ')
  const choices = schemas(schema['anyOf'] ?? schema['oneOf'] ?? schema['allOf'])
  if (choices.length) return [...new Set(choices.map((choice) => shapeWords(choice, depth)))].join(' | ')
  if (Array.isArray(type)) return type.map((one) => shapeWords({ ...schema, type: one }, depth)).join(' | ')
  if (type === 'array')
    return `list of ${isSchema(schema['items']) ? shapeWords(schema['items'], depth + 1) : 'values'}`
  if (type === 'object') return objectWords(schema, depth)
  const format = typeof schema['format'] === 'string' ? ` (${schema['format']})` : ''
  const names: Record<string, string> = {
    string: 'text',
    integer: 'whole number',
    number: 'number',
    boolean: 'yes or no',
    null: 'nothing',
  }
  return typeof type === 'string' ? `${names[type] ?? type}${format}` : 'anything'
}

function objectWords(schema: Schema, depth: number): string {
  const properties = isSchema(schema['properties']) ? Object.entries(schema['properties']) : []
  if (properties.length === 0) return 'object'
  if (depth > 1) return '{ … }'
  const required = Array.isArray(schema['required']) ? schema['required'] : []
  const parts = properties.map(([name, value]) => {
    const optional = required.includes(name) ? '' : '?'
    return `${name}${optional}: ${shapeWords(isSchema(value) ? value : undefined, depth + 1)}`
  })
  return `{ ${parts.join(', ')} }`
}
