import { problems, type ProblemExtras, type ProblemSlug } from '@shared/api/problems'

/** A problem that the API answers as RFC 9457 problem details; thrown by services, written by the one handler. */
export class ProblemError extends Error {
  constructor(
    readonly slug: ProblemSlug,
    /** What happened this time, a plain sentence. */
    readonly detail: string,
    readonly extras: ProblemExtras = {},
    options?: ErrorOptions,
  ) {
    super(detail, options)
    this.name = 'ProblemError'
  }

  /** HTTP status of its kind. */
  get status(): number {
    return problems[this.slug].status
  }
}

/** A problem to throw.
 *  @param detail what happened this time, a plain sentence
 *  @param extras where in the input (JSON pointers) and which items */
export const problem = (slug: ProblemSlug, detail: string, extras: ProblemExtras = {}): ProblemError =>
  new ProblemError(slug, detail, extras)
