import type { z } from 'zod'
import type { Role } from './accounts'
import type { ProblemSlug } from './problems'

/** Who may call: anyone; whoever is signed in; administrators; or members of the sheet with one of the roles.
 *  Every membership may read its sheet, so `roles` is stated only where the call does more than read. */
export type Access =
  { to: 'anyone' } | { to: 'signed-in' } | { to: 'administrator' } | { to: 'members'; roles: readonly Role[] }

/** How a call travels: JSON both ways; a multipart upload; an answer that is a file; a stream of events. */
export type Form = 'json' | 'upload' | 'download' | 'events'

/** An endpoint as data: the server serves it, the client calls it, OpenAPI and the route × role test are made from it. */
export interface Endpoint<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  A extends z.ZodType = z.ZodType,
  X extends Access = Access,
  F extends Form = Form,
> {
  /** Unique, camelCase: the OpenAPI operation id. */
  id: string
  room: string
  method: 'get' | 'post' | 'put' | 'delete'
  /** Path under /api with {name} parameters, for example /sheets/{sheet}/items. */
  path: string
  summary: string
  access: X
  params: P
  query: Q
  /** JSON body; of an upload, the fields beside the file. */
  body: B
  answer: A
  /** 'json' unless the call takes a file (multipart, field `file`), answers with one, or streams events. */
  form?: F
  /** Success status; 200 unless given. */
  status?: 200 | 201 | 202 | 204
  problems: readonly ProblemSlug[]
}

/** Gives an endpoint its exact types. */
export const endpoint = <
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
  X extends Access,
  F extends Form = 'json',
>(
  definition: Endpoint<P, Q, B, A, X, F>,
): Endpoint<P, Q, B, A, X, F> => definition
