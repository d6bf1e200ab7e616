import type { DataSource, EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { Person } from '@shared/api/common'
import type { Job } from '@shared/api/jobs'
import type { RevisionContents, Submission } from '@shared/api/review'
import type { AuditEvent } from '@shared/audit/audit-event'
import type { Item } from '@shared/items/item'
import { announce } from '../../platform/announce'
import { keepAudit } from '../../platform/audit'
import type { Jobs } from '../../platform/jobs'
import { problem } from '../../platform/problem'
import { revisionDigest } from '../artefacts/digest'
import type { EditionsService } from '../editions/editions.service'
import type { HistoryService } from '../ledger/history.service'
import type { SheetsService } from '../sheets/sheets.service'
import { ownWork } from './own-work'
import { printObstacle } from './print-obstacle'
import {
  decide,
  findLatestSubmission,
  insertSubmission,
  lockSheetState,
  setReleaseJob,
  setSheetState,
  type LockedSheet,
  type StoredSubmission,
} from './review.queries'
import { countContents, countDifferences } from './revision-summary'

/** Who asks, and as what on the sheet. */
export interface Viewer {
  person: Person
  roles: readonly Role[]
}

/** What an approver decides. `digest` is that of the submission they were shown. */
export interface Decision {
  decision: 'approved' | 'returned'
  digest: string
  note: string
}

/** The way of a revision from an editor over an approver to its release. */
export class ReviewService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly jobs: Jobs,
    private readonly sheets: SheetsService,
    private readonly history: HistoryService,
    private readonly editions: EditionsService,
  ) {}

  /** The latest submission as a member of the sheet sees it; null before the first. */
  async getLatest(sheetId: string, viewer: Viewer): Promise<Submission | null> {
    const em = this.dataSource.manager
    const submission = await findLatestSubmission(em, sheetId)
    return submission ? this.toAnswer(em, submission, viewer) : null
  }

  /** What a submission of the latest revision would hold, and what stands in its way. */
  async getSubmittable(sheetId: string): Promise<RevisionContents & { obstacle: string | null }> {
    return this.dataSource.transaction('REPEATABLE READ', async (em) => {
      const { revision } = await this.sheets.get(sheetId, null, em)
      const { contents, items } = await this.readContents(em, sheetId, revision)
      return { ...contents, obstacle: await this.submitObstacle(em, sheetId, contents, items) }
    })
  }

  /** Hands the latest revision to the approvers and makes the sheet read-only. */
  async submit(
    sheetId: string,
    viewer: Viewer,
    { revision, message }: { revision: number; message: string },
  ): Promise<Submission> {
    return this.dataSource.transaction(async (em) => {
      const sheet = await lockSheetState(em, sheetId)
      requireSubmittable(sheet, revision)
      const { contents, items } = await this.readContents(em, sheetId, revision)
      const obstacle = nothingToSubmit(contents)
      if (obstacle !== null) throw problem('wrong-state', obstacle)
      const whole = await this.sheets.get(sheetId, null, em)
      const reason = printObstacle(whole, items, contents.since, viewer.person.name)
      if (reason !== null) throw problem('cannot-print', reason)
      await insertSubmission(em, sheetId, {
        ...contents,
        digest: revisionDigest(whole, revision, items),
        submittedBy: viewer.person.id,
        message,
      })
      await this.enter(em, sheet, 'submitted')
      const answer = await this.latestAnswer(em, sheetId, viewer)
      const { digest } = answer
      await this.audit(em, sheet, viewer, { kind: 'submission', revision, digest })
      return answer
    })
  }

  /** Approves the submission or returns it with a note. Of two who decide at once, the second is told of the first. */
  async decide(sheetId: string, viewer: Viewer, decision: Decision): Promise<Submission> {
    return this.dataSource.transaction(async (em) => {
      const sheet = await lockSheetState(em, sheetId)
      const submission = await findLatestSubmission(em, sheetId)
      if (!submission)
        throw problem('wrong-state', `Nothing of sheet ${sheet.number} has been submitted yet.`)
      requireUndecided(submission)
      await this.requireOthersWork(em, submission, viewer)
      if (decision.digest !== submission.digest) {
        throw problem(
          'digest-changed',
          'The submission in the system is not the one that this decision is about.',
        )
      }
      if (decision.decision === 'approved') await this.requirePrintable(em, submission, viewer.person.name)
      await decide(em, submission.id, { ...decision, by: viewer.person.id })
      await this.enter(em, sheet, decision.decision === 'approved' ? 'approved' : 'drafting')
      const answer = await this.latestAnswer(em, sheetId, viewer)
      const { revision, digest } = submission
      await this.audit(em, sheet, viewer, { kind: 'decision', decision: decision.decision, revision, digest })
      return answer
    })
  }

  /** Asks for the release of the approved revision, in a job. Asked again while it runs, it answers with the same job. */
  async release(sheetId: string, viewer: Viewer): Promise<Job> {
    return this.dataSource.transaction(async (em) => {
      const sheet = await lockSheetState(em, sheetId)
      const submission = await findLatestSubmission(em, sheetId)
      if (!submission || (sheet.state !== 'approved' && sheet.state !== 'releasing')) {
        throw problem(
          'wrong-state',
          `Sheet ${sheet.number} is ${sheet.state}: only an approved sheet can be released.`,
        )
      }
      await this.requireOthersWork(em, submission, viewer)
      const running = sheet.state === 'releasing' ? await this.findOpenJob(submission) : undefined
      if (running) return running
      const job = await this.jobs.enqueue(em, {
        kind: 'release',
        sheet: sheet.number,
        data: { submission: submission.id },
      })
      await setReleaseJob(em, submission.id, job.id)
      await this.enter(em, sheet, 'releasing')
      await this.audit(em, sheet, viewer, { kind: 'release-asked', revision: submission.revision })
      return job
    })
  }

  private async readContents(
    em: EntityManager,
    sheetId: string,
    revision: number,
  ): Promise<{ contents: RevisionContents; items: Item[] }> {
    const since = (await this.editions.findLatest(em, sheetId))?.revision ?? 0
    const items = await this.history.itemsAt(em, sheetId, revision)
    const edits = await this.history.differences(em, sheetId, since, revision)
    return {
      items,
      contents: {
        revision,
        since,
        contents: countContents(items),
        differences: countDifferences(edits),
        authors: await this.history.authorsBetween(em, sheetId, since, revision),
        entries: await this.history.entriesBetween(em, sheetId, since, revision),
      },
    }
  }

  private async submitObstacle(
    em: EntityManager,
    sheetId: string,
    contents: RevisionContents,
    items: readonly Item[],
  ): Promise<string | null> {
    const sheet = await this.sheets.get(sheetId, null, em)
    if (sheet.state !== 'drafting') return `The sheet is ${sheet.state} already.`
    return nothingToSubmit(contents) ?? printObstacle(sheet, items, contents.since, '')
  }

  private async requirePrintable(
    em: EntityManager,
    submission: StoredSubmission,
    approver: string,
  ): Promise<void> {
    const sheet = await this.sheets.get(submission.sheetId, null, em)
    const items = await this.history.itemsAt(em, submission.sheetId, submission.revision)
    const reason = printObstacle(sheet, items, submission.since, approver)
    if (reason !== null) throw problem('cannot-print', reason)
  }

  private async requireOthersWork(
    em: EntityManager,
    submission: StoredSubmission,
    { person }: Viewer,
  ): Promise<void> {
    const { sheetId, since, revision } = submission
    const obstacle = ownWork(
      person,
      submission,
      await this.history.entriesBetween(em, sheetId, since, revision),
    )
    if (obstacle !== null) throw problem('own-work', obstacle)
  }

  private async findOpenJob({ jobId }: StoredSubmission): Promise<Job | undefined> {
    const job = jobId === null ? undefined : await this.jobs.find(jobId)
    return job?.state === 'waiting' || job?.state === 'running' ? job : undefined
  }

  private audit(em: EntityManager, sheet: LockedSheet, { person }: Viewer, event: AuditEvent): Promise<void> {
    return keepAudit(em, { event, accountId: person.id, sheet: sheet.number })
  }

  private async enter(
    em: EntityManager,
    sheet: LockedSheet,
    state: 'drafting' | 'submitted' | 'approved' | 'releasing',
  ): Promise<void> {
    await setSheetState(em, sheet.id, state)
    await announce(em, sheet.number, { event: 'state', state })
  }

  private async latestAnswer(em: EntityManager, sheetId: string, viewer: Viewer): Promise<Submission> {
    const submission = await findLatestSubmission(em, sheetId)
    if (!submission) throw new Error('The submission was not written.')
    return this.toAnswer(em, submission, viewer)
  }

  private async toAnswer(em: EntityManager, stored: StoredSubmission, viewer: Viewer): Promise<Submission> {
    const { sheetId, since, revision } = stored
    const entries = await this.history.entriesBetween(em, sheetId, since, revision)
    return {
      id: stored.id,
      revision,
      since,
      digest: stored.digest,
      submittedBy: stored.submittedBy,
      at: stored.at.toISOString(),
      message: stored.message,
      contents: stored.contents,
      differences: stored.differences,
      authors: await this.history.authorsBetween(em, sheetId, since, revision),
      entries,
      decision: toDecision(stored),
      obstacle: viewer.roles.includes('approver')
        ? ownWork(viewer.person, stored, entries)
        : 'Only an approver of this sheet decides and releases.',
      job: (stored.jobId && (await this.jobs.find(stored.jobId))) || null,
      edition: stored.edition,
    }
  }
}

function requireSubmittable(sheet: LockedSheet, revision: number): void {
  if (sheet.state !== 'drafting') {
    throw problem('wrong-state', `Sheet ${sheet.number} is ${sheet.state} already.`)
  }
  if (sheet.revision !== revision) {
    throw problem(
      'wrong-state',
      `You saw revision ${revision}, but the sheet is at revision ${sheet.revision} now. Look at what has changed, then submit.`,
    )
  }
}

function nothingToSubmit({ since, differences }: RevisionContents): string | null {
  if (since > 0 && differences.length === 0) {
    return `Nothing has changed since the edition before, revision ${since}.`
  }
  if (differences.every(({ kind }) => kind === 'sheet-face')) {
    return since > 0 ? null : 'There is nothing on the sheet yet.'
  }
  return null
}

function requireUndecided(submission: StoredSubmission): void {
  if (submission.decision === null) return
  throw problem(
    'already-decided',
    `${submission.decidedBy?.name ?? 'Someone'} has ${submission.decision} revision ${submission.revision} already.`,
  )
}

const toDecision = ({ decision, decidedBy, decidedAt, note }: StoredSubmission): Submission['decision'] =>
  decision && decidedBy && decidedAt ? { decision, by: decidedBy, at: decidedAt.toISOString(), note } : null
