import { z } from 'zod'

/** Every problem the API can answer with, in one table: status, title and what to do. `type` is /problems/<slug>. */
export const problems = {
  'invalid-input': {
    status: 400,
    title: 'Something in the request is not right',
    todo: 'Correct the places named and send it again.',
  },
  'not-signed-in': { status: 401, title: 'You are not signed in', todo: 'Sign in and try again.' },
  'wrong-credentials': {
    status: 401,
    title: 'E-mail or password is not right',
    todo: 'Check both and try again.',
  },
  'not-allowed': {
    status: 403,
    title: 'Your role on this sheet does not allow this',
    todo: 'Ask the administrator for the role that does.',
  },
  'stale-form': { status: 403, title: 'This page is out of date', todo: 'Reload the page and try again.' },
  'own-work': {
    status: 403,
    title: 'Approval needs another person',
    todo: 'Ask an approver who neither changed nor submitted this revision.',
  },
  'not-found': {
    status: 404,
    title: 'There is nothing here',
    todo: 'Check the address, or go back to the list.',
  },
  'number-taken': { status: 409, title: 'This sheet number is taken', todo: 'Choose another number.' },
  'account-exists': {
    status: 409,
    title: 'An account with this e-mail exists',
    todo: 'Use another e-mail, or change the existing account.',
  },
  'item-conflict': {
    status: 409,
    title: 'Someone else changed the same items',
    todo: 'Compare both versions and choose.',
  },
  'later-changes': {
    status: 409,
    title: 'Later changes would be undone',
    todo: 'Look at the changes named here; go back further only if they may be undone too.',
  },
  'nothing-to-restore': {
    status: 409,
    title: 'Nothing would change',
    todo: 'The sheet is already as it would be.',
  },
  'name-taken': {
    status: 409,
    title: 'This name is taken',
    todo: 'Choose another name, or take it off the other revision first.',
  },
  'wrong-state': {
    status: 409,
    title: 'The sheet is not in the state this needs',
    todo: 'Look at the sheet’s state, then try again.',
  },
  'already-decided': {
    status: 409,
    title: 'This submission has been decided',
    todo: 'Reload to see the decision.',
  },
  'digest-changed': {
    status: 409,
    title: 'This is not what you were shown',
    todo: 'Look at the submission again before you decide.',
  },
  'key-reused': {
    status: 409,
    title: 'This idempotency key belongs to another request',
    todo: 'Send a new key with a new request.',
  },
  'link-used': { status: 410, title: 'This link has been used or has expired', todo: 'Ask for a new link.' },
  'file-too-large': {
    status: 413,
    title: 'The file is too large',
    todo: 'Split it, or ask the administrator for the limit.',
  },
  'unreadable-file': {
    status: 422,
    title: 'The file cannot be read',
    todo: 'Check that the file is what its name says, then choose it again.',
  },
  'outside-sheet': {
    status: 422,
    title: 'Nothing of this falls on the sheet',
    todo: 'Check the coordinate system of the file and the area of the sheet.',
  },
  'nothing-to-take-in': {
    status: 422,
    title: 'No record can be taken in',
    todo: 'Look at the reasons given, correct the mapping or the file.',
  },
  'cannot-restore': {
    status: 422,
    title: 'The sheet cannot go back like this',
    todo: 'Change what is named here first, or restore less.',
  },
  'cannot-print': {
    status: 422,
    title: 'The sheet cannot be printed as it is',
    todo: 'Change what is named here, then submit the sheet again.',
  },
  'too-many-requests': { status: 429, title: 'Too many tries', todo: 'Wait a little, then try again.' },
  unexpected: {
    status: 500,
    title: 'Something went wrong on our side',
    todo: 'Try again. If it stays, tell the administrator the number given here.',
  },
  unavailable: { status: 503, title: 'The service is not ready', todo: 'Try again in a moment.' },
} as const satisfies Record<string, { status: number; title: string; todo: string }>

export type ProblemSlug = keyof typeof problems

/** RFC 9457 problem details as the API answers them. */
export const problemSchema = z
  .looseObject({
    /** /problems/<slug> */
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    /** What happened this time. */
    detail: z.string(),
    /** urn:uuid of this occurrence, also in the log. */
    instance: z.string(),
    /** What to do. */
    todo: z.string(),
    /** Where in the input: JSON pointers, and the id of the item that the place belongs to. */
    errors: z
      .array(z.strictObject({ pointer: z.string(), detail: z.string(), item: z.uuid().optional() }))
      .optional(),
    /** Which items: their ids, with base, theirs and yours where they are in conflict. */
    items: z.array(z.unknown()).optional(),
  })
  .meta({ id: 'Problem' })
export type Problem = z.infer<typeof problemSchema>

/** What travels beside the sentence: where in the input, and which items. */
export type ProblemExtras = Pick<Problem, 'errors' | 'items'>
