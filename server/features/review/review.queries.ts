import type { EntityManager } from 'typeorm'
import type { Person } from '@shared/api/common'
import type { RevisionContents, Submission } from '@shared/api/review'
import type { SheetState } from '@shared/api/sheets'

/** A sheet whose state nobody else can change until the transaction ends. */
export interface LockedSheet {
  id: string
  number: string
  state: SheetState
  revision: number
}

export async function lockSheetState(em: EntityManager, sheetId: string): Promise<LockedSheet> {
  const [row] = await em.query<LockedSheet[]>(
    'SELECT id, number, state, revision FROM sheet WHERE id = $1 FOR UPDATE',
    [sheetId],
  )
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row
}

export async function setSheetState(em: EntityManager, sheetId: string, state: SheetState): Promise<void> {
  await em.query('UPDATE sheet SET state = $2 WHERE id = $1', [sheetId, state])
}

/** A submission with its people and the edition that it became. */
export interface StoredSubmission {
  id: string
  sheetId: string
  revision: number
  since: number
  digest: string
  contents: RevisionContents['contents']
  differences: RevisionContents['differences']
  submittedBy: Person
  at: Date
  message: string
  decision: NonNullable<Submission['decision']>['decision'] | null
  decidedBy: Person | null
  decidedAt: Date | null
  note: string
  jobId: string | null
  edition: number | null
}

const person = (table: string): string =>
  `json_build_object('id', ${table}.id, 'name', ${table}.name, 'initials', ${table}.initials)`

const submissionQuery = `SELECT submission.id, submission.sheet_id AS "sheetId", submission.revision, submission.since,
    submission.digest, submission.contents, submission.differences, submission.at, submission.message,
    submission.decision, submission.decided_at AS "decidedAt", submission.note, submission.job_id AS "jobId",
    ${person('submitter')} AS "submittedBy",
    CASE WHEN decider.id IS NULL THEN NULL ELSE ${person('decider')} END AS "decidedBy",
    edition.number AS edition
  FROM submission
  JOIN account AS submitter ON submitter.id = submission.submitted_by
  LEFT JOIN account AS decider ON decider.id = submission.decided_by
  LEFT JOIN edition ON edition.submission_id = submission.id`

export async function findLatestSubmission(
  em: EntityManager,
  sheetId: string,
): Promise<StoredSubmission | undefined> {
  const [row] = await em.query<StoredSubmission[]>(
    `${submissionQuery} WHERE submission.sheet_id = $1 ORDER BY submission.at DESC LIMIT 1`,
    [sheetId],
  )
  return row
}

export async function findSubmission(em: EntityManager, id: string): Promise<StoredSubmission | undefined> {
  const [row] = await em.query<StoredSubmission[]>(`${submissionQuery} WHERE submission.id = $1`, [id])
  return row
}

export interface NewSubmission extends RevisionCounts {
  revision: number
  since: number
  digest: string
  submittedBy: string
  message: string
}

type RevisionCounts = Pick<RevisionContents, 'contents' | 'differences'>

export async function insertSubmission(
  em: EntityManager,
  sheetId: string,
  submission: NewSubmission,
): Promise<void> {
  await em.query(
    `INSERT INTO submission (sheet_id, revision, since, digest, contents, differences, submitted_by, at, message)
     VALUES ($1, $2, $3, $4, $5, $6, $7, clock_timestamp(), $8)`,
    [
      sheetId,
      submission.revision,
      submission.since,
      submission.digest,
      JSON.stringify(submission.contents),
      JSON.stringify(submission.differences),
      submission.submittedBy,
      submission.message,
    ],
  )
}

export async function decide(
  em: EntityManager,
  submissionId: string,
  decision: { decision: 'approved' | 'returned'; by: string; note: string },
): Promise<void> {
  await em.query(
    `UPDATE submission SET decision = $2, decided_by = $3, decided_at = clock_timestamp(), note = $4 WHERE id = $1`,
    [submissionId, decision.decision, decision.by, decision.note],
  )
}

export async function setReleaseJob(em: EntityManager, submissionId: string, jobId: string): Promise<void> {
  await em.query('UPDATE submission SET job_id = $2 WHERE id = $1', [submissionId, jobId])
}
