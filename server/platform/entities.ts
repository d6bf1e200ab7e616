import { Account } from '../features/accounts/account.entity'
import { Link } from '../features/accounts/link.entity'
import { Membership } from '../features/accounts/membership.entity'
import { ArtefactRow } from '../features/editions/artefact.entity'
import { EditionRow } from '../features/editions/edition.entity'
import { FaceBuildRow } from '../features/faces/face-build.entity'
import { FaceRow } from '../features/faces/face.entity'
import { IntakeRow } from '../features/intake/intake.entity'
import { ItemVersionRow } from '../features/ledger/item-version.entity'
import { NamedRevisionRow } from '../features/ledger/named-revision.entity'
import { RevisionRow } from '../features/ledger/revision.entity'
import { SubmissionRow } from '../features/review/submission.entity'
import { SheetRow } from '../features/sheets/sheet.entity'
import { AuditEntryRow } from './audit-entry.entity'
import { AuditHeadRow } from './audit-head.entity'
import { JobRow } from './job.entity'
import { SessionRow } from './session.entity'

/** Every entity; each room appends its own. */
export const entities = [
  Account,
  Membership,
  Link,
  SessionRow,
  JobRow,
  AuditEntryRow,
  AuditHeadRow,
  SheetRow,
  RevisionRow,
  ItemVersionRow,
  NamedRevisionRow,
  FaceBuildRow,
  FaceRow,
  IntakeRow,
  SubmissionRow,
  EditionRow,
  ArtefactRow,
]
