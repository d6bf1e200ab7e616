import { randomUUID } from 'node:crypto'
import type { ErrorRequestHandler } from 'express'
import { MulterError } from 'multer'
import { problems, type Problem } from '@shared/api/problems'
import { problem, ProblemError } from '../problem'
import { MAX_UPLOAD_BYTES } from './read-body'

/** Writes every problem as RFC 9457 problem details. What is not a problem of ours is 'unexpected': its number goes out,
 *  everything else into the log. */
export const handleProblems: ErrorRequestHandler = (fault, request, response, _next) => {
  const known = classify(fault)
  const id = typeof request.id === 'string' ? request.id : randomUUID()
  if (known.status >= 500) request.log.error({ err: fault, instance: id }, 'A request failed')
  if (response.headersSent) {
    // Half an answer is out: cutting the connection is the only way left to say that it is not whole.
    response.destroy()
    return
  }
  response.status(known.status).type('application/problem+json').set('Cache-Control', 'no-store')
  response.send(JSON.stringify(toProblem(known, id)))
}

const toProblem = ({ slug, detail, extras }: ProblemError, id: string): Problem => ({
  type: `/problems/${slug}`,
  title: problems[slug].title,
  status: problems[slug].status,
  detail,
  instance: `urn:uuid:${id}`,
  todo: problems[slug].todo,
  ...extras,
})

function classify(fault: unknown): ProblemError {
  if (fault instanceof ProblemError) return fault
  if (fault instanceof MulterError) return uploadFault(fault)
  if (isLostDatabase(fault)) return problem('unavailable', 'The database does not answer at the moment.')
  return parserFault(fault) ?? problem('unexpected', 'This is our fault, not yours. Nothing was changed.')
}

function uploadFault(fault: MulterError): ProblemError {
  if (fault.code === 'LIMIT_FILE_SIZE') {
    return problem('file-too-large', `A file may have at most ${MAX_UPLOAD_BYTES / 1024 / 1024} MB.`)
  }
  return problem('invalid-input', 'An upload carries one file, in the field “file”.')
}

/** Faults that Express and its body parsers raise carry a status and a type. */
function parserFault(fault: unknown): ProblemError | undefined {
  if (!(fault instanceof Error) || !('status' in fault)) return undefined
  const type = 'type' in fault ? fault.type : undefined
  if (type === 'entity.too.large')
    return problem('file-too-large', 'What was sent is too large for one call.')
  if (type === 'entity.parse.failed') return problem('invalid-input', 'The body is not JSON.')
  if (fault instanceof URIError) return problem('not-found', 'This address names nothing that there is.')
  if (fault.status === 404) return problem('not-found', 'This address names nothing that there is.')
  if (typeof fault.status === 'number' && fault.status < 500) {
    return problem('invalid-input', 'The request cannot be read as it was sent.')
  }
  return undefined
}

/** Node's codes for a connection that is not there, PostgreSQL's classes 08 and 57P, and its 53300: too many connections. */
const LOST_DATABASE = /^(ECONNREFUSED|ECONNRESET|ENOENT|EPIPE|ETIMEDOUT|08\w{3}|57P0\d|53300)$/

function isLostDatabase(fault: unknown): boolean {
  if (!(fault instanceof Error)) return false
  // TypeORM wraps what the driver says; pg says of a connection cut in the middle only this sentence.
  const cause = 'driverError' in fault ? fault.driverError : fault
  if (!(cause instanceof Error)) return false
  const fromDatabase = 'driverError' in fault || ('syscall' in cause && cause.syscall === 'connect')
  const code = 'code' in cause ? String(cause.code) : ''
  return (fromDatabase && LOST_DATABASE.test(code)) || cause.message.startsWith('Connection terminated')
}
