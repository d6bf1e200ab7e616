import type { DataSource } from 'typeorm'
import { z } from 'zod'
import { announce } from '../../platform/announce'
import type { Jobs, ReportProgress } from '../../platform/jobs'
import type { ReleaseService } from '../editions/release.service'
import { findSubmission, lockSheetState, setSheetState } from './review.queries'

const releaseDataSchema = z.object({ submission: z.uuid() })

/** Takes release jobs. Done twice, as after a crash, the second time finds the edition made and stops. */
export function handleReleases(jobs: Jobs, dataSource: DataSource, release: ReleaseService): void {
  jobs.handle('release', async (data, report) => {
    await releaseSubmission(dataSource, release, releaseDataSchema.parse(data).submission, report)
  })
}

async function releaseSubmission(
  dataSource: DataSource,
  release: ReleaseService,
  submissionId: string,
  report: ReportProgress,
): Promise<void> {
  const submission = await findSubmission(dataSource.manager, submissionId)
  if (!submission) throw new RangeError(`There is no submission ${submissionId}.`)
  const approver = submission.decidedBy
  if (submission.edition !== null || approver === null) return
  const number = await make(dataSource, submission.sheetId, () =>
    release.makeEdition(
      {
        submissionId,
        sheetId: submission.sheetId,
        revision: submission.revision,
        digest: submission.digest,
        approver,
      },
      report,
    ),
  )
  await report(1, `Edition ${number} is released`)
}

async function make(dataSource: DataSource, sheetId: string, work: () => Promise<number>): Promise<number> {
  try {
    return await work()
  } catch (cause) {
    await returnToApproved(dataSource, sheetId)
    throw cause
  }
}

/** After a failed release the sheet is approved as before, so that the release can be asked for again. */
async function returnToApproved(dataSource: DataSource, sheetId: string): Promise<void> {
  await dataSource.transaction(async (em) => {
    const sheet = await lockSheetState(em, sheetId)
    if (sheet.state !== 'releasing') return
    await setSheetState(em, sheetId, 'approved')
    await announce(em, sheet.number, { event: 'state', state: 'approved' })
  })
}
