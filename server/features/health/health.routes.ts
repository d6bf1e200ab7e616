import type { Router } from 'express'
import { getHealth } from '@shared/api/health'
import { serve } from '../../platform/http/serve'
import type { HealthService } from './health.service'

export function mountHealth(router: Router, health: HealthService): void {
  serve(router, getHealth, () => health.check())
}
