import type { Router } from 'express'
import { getFaces } from '@shared/api/faces'
import { serve } from '../../platform/http/serve'
import type { FacesService } from './faces.service'

export function mountFaces(router: Router, faces: FacesService): void {
  serve(router, getFaces, ({ sheet }) => faces.list(sheet.id))
}
