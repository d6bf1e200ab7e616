import { z } from 'zod'

/** No parameters, query or body. */
export const nothing = z.strictObject({})
/** An empty answer. */
export const empty = z.null()

/** A sheet is named by its number, for example MI-14, in every path and link. */
export const sheetNumberSchema = z
  .string()
  .trim()
  .regex(
    /^[A-Z0-9][A-Z0-9-]{0,19}$/,
    'A sheet number is up to 20 capital letters, digits and hyphens, for example MI-14.',
  )
export const sheetParams = z.strictObject({ sheet: sheetNumberSchema })

export const timestamp = z.iso.datetime()
export const personSchema = z
  .strictObject({ id: z.uuid(), name: z.string(), initials: z.string() })
  .meta({ id: 'Person' })
export type Person = z.infer<typeof personSchema>
