import type { Router } from 'express'
import {
  decideSubmission,
  getSubmission,
  getSubmittable,
  releaseSheet,
  submitSheet,
} from '@shared/api/review'
import { serve } from '../../platform/http/serve'
import type { ReviewService } from './review.service'

export function mountReview(router: Router, review: ReviewService): void {
  serve(router, getSubmission, ({ sheet, account, roles }) =>
    review.getLatest(sheet.id, { person: account, roles }),
  )
  serve(router, getSubmittable, ({ sheet }) => review.getSubmittable(sheet.id))
  serve(router, submitSheet, ({ sheet, account, roles, body }) =>
    review.submit(sheet.id, { person: account, roles }, body),
  )
  serve(router, decideSubmission, ({ sheet, account, roles, body }) =>
    review.decide(sheet.id, { person: account, roles }, body),
  )
  serve(router, releaseSheet, ({ sheet, account, roles }) =>
    review.release(sheet.id, { person: account, roles }),
  )
}
