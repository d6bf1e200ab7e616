import { rm } from 'node:fs/promises'
import { basename } from 'node:path'
import express, { type Request, type RequestHandler, type Response } from 'express'
import multer from 'multer'
import { problem } from '../problem'

/** Largest JSON body from someone who is not signed in: they send a name and a password. */
const ANONYMOUS_BODY_LIMIT = '64kb'
/** Largest JSON body of a signed-in person: a change set of 5000 items. */
const SIGNED_IN_BODY_LIMIT = '32mb'
/** Largest file that can be brought. */
export const MAX_UPLOAD_BYTES = 256 * 1024 * 1024

/** A file that came with a call; it is removed when the call ends. */
export interface UploadedFile {
  /** Where it lies meanwhile. */
  path: string
  /** Its own name, without folders. */
  name: string
  bytes: number
}

const anonymousJson = express.json({ limit: ANONYMOUS_BODY_LIMIT })
const signedInJson = express.json({ limit: SIGNED_IN_BODY_LIMIT })

/** The JSON body of a request; an empty object if it has none. */
export async function readJson(request: Request, response: Response): Promise<unknown> {
  const hasBody =
    request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length'] ?? 0) > 0
  if (!hasBody) return {}
  if (!request.is('application/json')) {
    throw problem('invalid-input', 'The body has to be JSON, sent as application/json.')
  }
  await run(request.user ? signedInJson : anonymousJson, request, response)
  return request.body
}

/** The file of a multipart upload (field `file`) and the fields beside it. */
export async function readUpload(
  request: Request,
  response: Response,
  folder: string,
): Promise<{ file: UploadedFile; fields: unknown }> {
  const receive = multer({
    dest: folder,
    limits: { fileSize: MAX_UPLOAD_BYTES, files: 1, fields: 20, fieldSize: 64 * 1024, parts: 21 },
    defParamCharset: 'utf8',
  }).single('file')
  if (!request.is('multipart/form-data')) {
    throw problem('invalid-input', 'A file is sent as multipart/form-data, in the field “file”.')
  }
  await run(receive, request, response)
  if (!request.file) throw problem('invalid-input', 'No file came with this: choose one and send it again.')
  const { path, originalname, size } = request.file
  // Multer's fields have no prototype; spread makes them a plain object that schemas accept.
  return { file: { path, name: basename(originalname), bytes: size }, fields: { ...request.body } }
}

/** Removes an uploaded file once its call has ended. */
export const removeUpload = (file: UploadedFile): Promise<void> => rm(file.path, { force: true })

/** A middleware as a promise. */
export const run = (handler: RequestHandler, request: Request, response: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    void handler(request, response, (fault?: unknown) => (fault ? reject(fault) : resolve()))
  })
