import { z } from 'zod'
import { empty, nothing, personSchema, sheetParams, timestamp } from './common'
import { endpoint } from './endpoint'

/** What a membership lets a person do on one sheet. */
export const roles = ['compiler', 'editor', 'approver'] as const
export const roleSchema = z.enum(roles)
export type Role = z.infer<typeof roleSchema>

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .pipe(z.email('This is not an e-mail address.').max(200))
export const passwordSchema = z
  .string()
  .min(12, 'A password has at least 12 characters.')
  .max(200, 'A password has at most 200 characters.')
const nameSchema = z.string().trim().min(1, 'A person needs a name.').max(120)

export const accountSchema = z
  .strictObject({ ...personSchema.shape, email: z.string(), administrator: z.boolean() })
  .meta({ id: 'Account' })
export type Account = z.infer<typeof accountSchema>

/** A demo account, shown on the sign-in page only while the demo is served on loopback. */
export const demoAccountSchema = z.strictObject({
  email: z.string(),
  password: z.string(),
  role: z.string(),
  name: z.string(),
})
export type DemoAccount = z.infer<typeof demoAccountSchema>

export const sessionSchema = z
  .strictObject({
    account: accountSchema.nullable(),
    /** Token to send as X-CSRF-Token with every call that changes something; a new one comes with each sign-in. */
    csrfToken: z.string(),
    demoAccounts: z.array(demoAccountSchema),
  })
  .meta({ id: 'Session' })
export type Session = z.infer<typeof sessionSchema>

export const getSession = endpoint({
  id: 'getSession',
  room: 'accounts',
  method: 'get',
  path: '/session',
  summary: 'Who is signed in',
  access: { to: 'anyone' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: sessionSchema,
  problems: [],
})

export const signIn = endpoint({
  id: 'signIn',
  room: 'accounts',
  method: 'post',
  path: '/session',
  summary: 'Sign in',
  access: { to: 'anyone' },
  params: nothing,
  query: nothing,
  body: z.strictObject({ email: z.string().max(200), password: z.string().max(200) }),
  answer: sessionSchema,
  problems: ['invalid-input', 'wrong-credentials', 'stale-form', 'too-many-requests'],
})

export const signOut = endpoint({
  id: 'signOut',
  room: 'accounts',
  method: 'delete',
  path: '/session',
  summary: 'Sign out',
  access: { to: 'anyone' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: sessionSchema,
  problems: ['stale-form'],
})

/** A one-time link: the first administrator's, printed at start, or an invitation's. */
export const acceptLink = endpoint({
  id: 'acceptLink',
  room: 'accounts',
  method: 'post',
  path: '/links/{token}',
  summary: 'Set name and password by a one-time link',
  access: { to: 'anyone' },
  params: z.strictObject({ token: z.string().min(20).max(200) }),
  query: nothing,
  body: z.strictObject({ email: emailSchema, name: nameSchema, password: passwordSchema }),
  answer: sessionSchema,
  problems: ['invalid-input', 'stale-form', 'link-used', 'account-exists', 'too-many-requests'],
})

export const getLink = endpoint({
  id: 'getLink',
  room: 'accounts',
  method: 'get',
  path: '/links/{token}',
  summary: 'What a one-time link is for',
  access: { to: 'anyone' },
  params: z.strictObject({ token: z.string().min(20).max(200) }),
  query: nothing,
  body: nothing,
  answer: z.strictObject({
    purpose: z.enum(['first-administrator', 'invitation']),
    email: z.string().nullable(),
    name: z.string().nullable(),
  }),
  problems: ['link-used', 'too-many-requests'],
})

export const memberSchema = z
  .strictObject({ person: personSchema, email: z.string(), roles: z.array(roleSchema) })
  .meta({ id: 'Member' })
export type Member = z.infer<typeof memberSchema>

const accountRowSchema = z.strictObject({
  ...accountSchema.shape,
  /** False until the person has set a password by the invitation link. */
  active: z.boolean(),
  createdAt: timestamp,
})
export type AccountRow = z.infer<typeof accountRowSchema>

export const listAccounts = endpoint({
  id: 'listAccounts',
  room: 'administration',
  method: 'get',
  path: '/accounts',
  summary: 'All accounts',
  access: { to: 'administrator' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: z.array(accountRowSchema),
  problems: [],
})

export const inviteAccount = endpoint({
  id: 'inviteAccount',
  room: 'administration',
  method: 'post',
  path: '/accounts',
  summary: 'Invite a person; answers with their one-time link',
  access: { to: 'administrator' },
  params: nothing,
  query: nothing,
  body: z.strictObject({ email: emailSchema, name: nameSchema, administrator: z.boolean().default(false) }),
  answer: z.strictObject({ account: accountRowSchema, link: z.string() }),
  status: 201,
  problems: ['invalid-input', 'account-exists', 'stale-form'],
})

export const listMembers = endpoint({
  id: 'listMembers',
  room: 'administration',
  method: 'get',
  path: '/sheets/{sheet}/members',
  summary: 'Who works on a sheet',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: z.array(memberSchema),
  problems: ['not-found'],
})

export const setMember = endpoint({
  id: 'setMember',
  room: 'administration',
  method: 'put',
  path: '/sheets/{sheet}/members/{account}',
  summary: 'Set a person’s roles on a sheet; none removes them',
  access: { to: 'administrator' },
  params: sheetParams.extend({ account: z.uuid() }),
  query: nothing,
  body: z.strictObject({ roles: z.array(roleSchema) }),
  answer: empty,
  status: 204,
  problems: ['invalid-input', 'not-found', 'not-allowed', 'stale-form'],
})
