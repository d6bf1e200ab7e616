import { CreateAccounts20261201000001 } from './20261201000001-create-accounts'
import { CreateSheetsAndLedger20261201000002 } from './20261201000002-create-sheets-and-ledger'
import { CreateIntake20261201000003 } from './20261201000003-create-intake'
import { CreateReviewAndEditions20261201000004 } from './20261201000004-create-review-and-editions'
import { TellAndNameRevisions20261201000101 } from './20261201000101-tell-and-name-revisions'
import { CreateAuditTrail20261201000102 } from './20261201000102-create-audit-trail'

/** Every migration in order; each room appends its own. Never edit one that has been released. */
export const migrations = [
  CreateAccounts20261201000001,
  CreateSheetsAndLedger20261201000002,
  CreateIntake20261201000003,
  CreateReviewAndEditions20261201000004,
  TellAndNameRevisions20261201000101,
  CreateAuditTrail20261201000102,
]
