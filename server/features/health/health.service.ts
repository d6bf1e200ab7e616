import type { DataSource } from 'typeorm'
import { problem } from '../../platform/problem'

/** Tells a balancer whether this process can serve. */
export class HealthService {
  private stopping = false

  constructor(
    private readonly dataSource: DataSource,
    private readonly version: string,
  ) {}

  /** Up, with a database that answers; otherwise 'unavailable'. */
  async check(): Promise<{ status: 'ok'; version: string; database: string }> {
    if (this.stopping) throw problem('unavailable', 'This server is being stopped.')
    await this.dataSource.query('SELECT 1')
    return { status: 'ok', version: this.version, database: 'ready' }
  }

  /** From now on nobody new should be sent here. */
  stop(): void {
    this.stopping = true
  }
}
