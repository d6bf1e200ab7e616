import { problems, problemSchema, type Problem, type ProblemSlug } from '@shared/api/problems'

/** What the API answered instead of what was asked for, or why no answer came. */
export class ApiProblem extends Error {
  constructor(
    readonly problem: Problem,
    options?: ErrorOptions,
  ) {
    super(problem.detail, options)
    this.name = 'ApiProblem'
  }

  /** Which row of the table of problems it is; undefined for one that this page does not know. */
  get slug(): ProblemSlug | undefined {
    return slugOf(this.problem)
  }
}

const isSlug = (text: string): text is ProblemSlug => Object.hasOwn(problems, text)

/** The last part of a problem's type, where the table knows it. */
export function slugOf(problem: Problem): ProblemSlug | undefined {
  const last = problem.type.split('/').at(-1) ?? ''
  return isSlug(last) ? last : undefined
}

/** A problem found on this side, in the same shape as the server's. */
export function ownProblem(slug: ProblemSlug, detail: string): Problem {
  const { status, title, todo } = problems[slug]
  return { type: `/problems/${slug}`, title, status, detail, instance: '', todo }
}

/** No answer: the network or the server is away. */
export const noAnswer = (): Problem =>
  ownProblem(
    'unavailable',
    'The server does not answer. Perhaps the network is down, or the server is being restarted.',
  )

/** Reads the problem in an answer; what a gateway in between wrote becomes a problem of ours. */
export function parseProblem(status: number, body: unknown): Problem {
  const parsed = problemSchema.safeParse(body)
  if (parsed.success) return parsed.data
  if (status >= 502 && status <= 504) return noAnswer()
  if (status === 413) return ownProblem('file-too-large', 'The file is larger than the server takes.')
  return ownProblem('unexpected', `The server answered with status ${status} and no explanation.`)
}

/** Sentences about one field, by its JSON pointer; also those about places below it. */
export function sentencesAt(problem: Problem | null | undefined, pointer: string): string[] {
  return (problem?.errors ?? [])
    .filter((error) => error.pointer === pointer || error.pointer.startsWith(`${pointer}/`))
    .map((error) => error.detail)
}
