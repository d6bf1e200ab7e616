import type { AuditEvent, AuditKind } from './audit-event'

/** What a person calls each kind of entry in the audit trail. */
export const auditKindWords: Record<AuditKind, string> = {
  'sign-in': 'sign-in',
  'sign-in-refused': 'sign-in refused',
  'sign-out': 'sign-out',
  invitation: 'invitation',
  'password-set': 'password set',
  membership: 'membership',
  submission: 'submission',
  decision: 'decision',
  'release-asked': 'release asked for',
  release: 'release',
  download: 'download',
  'revision-named': 'revision named',
  'revision-unnamed': 'name taken off',
}

/** What happened, as a phrase that goes on from the name of who did it. */
export function describeAudit(event: AuditEvent): string {
  switch (event.kind) {
    case 'sign-in':
      return `signed in from ${event.address}`
    case 'sign-in-refused':
      return `was refused to sign in as “${event.email}” from ${event.address}`
    case 'sign-out':
      return 'signed out'
    case 'invitation':
      return `invited ${event.email}${event.administrator ? ' as an administrator' : ''}`
    case 'password-set':
      return `set name and password by ${event.purpose === 'invitation' ? 'an invitation' : 'the first link'}`
    case 'membership':
      return `changed the roles of ${event.email}: ${rolesWords(event.before)} → ${rolesWords(event.after)}`
    case 'submission':
      return `submitted revision ${event.revision}`
    case 'decision':
      return `${event.decision} revision ${event.revision}`
    case 'release-asked':
      return `asked for the release of revision ${event.revision}`
    case 'release':
      return `released edition ${event.edition}, revision ${event.revision}`
    case 'download':
      return `downloaded ${event.path}`
    case 'revision-named':
      return `named revision ${event.revision} “${event.name}”`
    case 'revision-unnamed':
      return `took the name “${event.name}” off revision ${event.revision}`
  }
}

const rolesWords = (roles: readonly string[]): string => roles.join(', ') || 'none'
