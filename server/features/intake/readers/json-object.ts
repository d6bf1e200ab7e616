export type JsonObject = Record<string, unknown>

/** A JSON object, not a list. */
export const isJsonObject = (value: unknown): value is JsonObject =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
