import type { Router } from 'express'
import { getJob } from '@shared/api/jobs'
import type { AccessFinder } from '../../platform/http/access'
import { serve } from '../../platform/http/serve'
import type { Jobs } from '../../platform/jobs'
import { problem } from '../../platform/problem'

/** A job is seen by the members of its sheet and by administrators. */
export function mountJobs(router: Router, jobs: Jobs, access: AccessFinder): void {
  serve(router, getJob, async ({ params, account }) => {
    const job = await jobs.find(params.job)
    const sheet = job && (await access.findSheet(job.sheet))
    const maySee =
      sheet && (account.administrator || (await access.listRoles(account.id, sheet.id)).length > 0)
    if (!job || !maySee)
      throw problem('not-found', 'There is no such job, or you are not a member of its sheet.')
    return job
  })
}
