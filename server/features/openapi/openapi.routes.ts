import type { Router } from 'express'
import { endpoints } from '@shared/api'
import { getOpenApi } from '@shared/api/openapi'
import { serve } from '../../platform/http/serve'
import { describeApi } from './document'

export function mountOpenApi(router: Router, version: string): void {
  const document = getOpenApi.answer.parse(describeApi(endpoints, version))
  serve(router, getOpenApi, () => document)
}
