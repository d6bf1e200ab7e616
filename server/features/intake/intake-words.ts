import type { Intake } from '@shared/api/intake'
import type { Applied } from '@shared/intake/apply'
import { problem } from '../../platform/problem'
import type { StoredIntake } from './intake.queries'

/** Refuses to take in nothing, and says whether all of it is elsewhere or each has its own reason. */
export function requireSomething({ items, refusals, outside, leftOut }: Applied, file: string): void {
  if (items.length > 0) return
  if (outside > 0 && outside === refusals.length) {
    const rest = leftOut === 0 ? '' : ` The other ${leftOut} would be left out.`
    throw problem(
      'outside-sheet',
      `All ${outside} records of ${file} that the mapping takes lie outside the neatline.${rest}`,
    )
  }
  const reason = refusals[0] ? ` The first reason: record ${refusals[0].record}, ${refusals[0].reason}` : ''
  throw problem(
    'nothing-to-take-in',
    `${refusals.length} refused and ${leftOut} left out of ${file}: nothing remains.${reason}`,
  )
}

/** An intake as the API answers it. */
export function toIntakeAnswer(intake: StoredIntake): Intake {
  const { same, summary } = intake
  return {
    id: intake.id,
    file: intake.file,
    bytes: intake.bytes,
    sha256: intake.sha256,
    state: intake.state,
    at: intake.createdAt.toISOString(),
    by: intake.by,
    mapping: intake.mapping,
    revision: intake.revision,
    sameFileTakenIn:
      same && `${same.name} took in the same file as “${same.file}” at revision ${same.revision}.`,
    ...summary,
  }
}
