import type { Router } from 'express'
import { getSpecimen } from '@shared/api/symbols'
import { serve } from '../../platform/http/serve'
import { sha256 } from '../artefacts/manifest'
import { specimenPdf } from '../artefacts/specimen-pdf'

/** The symbol set for everybody: it is the same for all sheets, and changes only with the program. */
export function mountSymbols(router: Router): void {
  let made: Promise<{ content: Buffer; tag: string }> | undefined

  /** Drawn when it is first asked for, and kept. */
  const specimen = () =>
    (made ??= specimenPdf()
      .then((content) => ({ content, tag: `"${sha256(content)}"` }))
      .catch((error: unknown) => {
        made = undefined
        throw error
      }))

  serve(router, getSpecimen, async ({ request, response }) => {
    const { content, tag } = await specimen()
    response.set({
      'Content-Type': 'application/pdf',
      'Content-Disposition': 'attachment; filename="symbol-set.pdf"',
      ETag: tag,
      'Cache-Control': 'public, no-cache',
    })
    if (request.fresh) response.status(304).end()
    else response.end(content)
  })
}
