import { pipeline } from 'node:stream/promises'
import type { Router } from 'express'
import { getArtefact, getEdition, listEditions } from '@shared/api/catalogue'
import { serve } from '../../platform/http/serve'
import { downloadName } from '../artefacts/edition-files'
import type { EditionsService } from '../editions/editions.service'

/** The public catalogue: no sign-in. */
export function mountCatalogue(router: Router, editions: EditionsService): void {
  serve(router, listEditions, ({ query }) => editions.list(query.text))
  serve(router, getEdition, ({ params }) => editions.get(params.sheet, params.edition))
  serve(router, getArtefact, async ({ params, request, response }) => {
    const { artefact, open } = await editions.openFile(params.sheet, params.edition, params.name)
    const name = downloadName(params.sheet, params.edition, artefact.name)
    const isPicture = artefact.mediaType.startsWith('image/')
    response.set({
      'Content-Type': artefact.mediaType,
      'Content-Disposition': `${isPicture ? 'inline' : 'attachment'}; filename="${name}"`,
      ETag: `"${artefact.sha256}"`,
      'Cache-Control': 'public, no-cache',
      'X-Content-Type-Options': 'nosniff',
      // A picture opened by itself runs nothing and loads nothing but the letters that it carries.
      'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'; font-src data:; sandbox",
    })
    if (request.fresh) {
      response.status(304).end()
      return
    }
    response.set('Content-Length', String(artefact.bytes))
    await pipeline(await open(), response)
  })
}
