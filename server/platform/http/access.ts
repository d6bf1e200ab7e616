import type {} from 'passport' // for Express's request.user
import type { Role } from '@shared/api/accounts'
import type { SheetState } from '@shared/api/sheets'

/** The person behind a session. */
export interface SignedIn {
  id: string
  email: string
  name: string
  initials: string
  administrator: boolean
}

/** The sheet that a call is about. */
export interface SheetIdentity {
  id: string
  number: string
  state: SheetState
}

/** What `serve` asks before it lets a call in. */
export interface AccessFinder {
  findSheet(number: string): Promise<SheetIdentity | undefined>
  listRoles(accountId: string, sheetId: string): Promise<Role[]>
}

/** What calls need besides the request itself. */
export interface CallContext {
  access: AccessFinder
  /** Folder for uploads while a call reads them. */
  uploadFolder: string
  /** Keeps in the audit trail that a member downloads what is not released. */
  noteDownload(account: SignedIn, sheet: SheetIdentity, path: string): Promise<void>
  /** Whether answers are checked against their schema before they are sent: on in tests. */
  checkAnswers: boolean
}

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- Express's types are extended by merging into theirs
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- merging needs an interface
    interface User extends SignedIn {}
    interface Locals {
      context: CallContext
    }
  }
}
