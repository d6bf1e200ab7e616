import type { ChangeSet } from '@shared/changes/change-set'
import type { Problem } from '@shared/api/problems'
import { freezeFirst, type Batch } from './batches'

/** What became of one request. `unreachable`: no answer, so nobody knows whether it was done; the same key asks again. */
export type Delivery<A> =
  { outcome: 'done'; answer: A } | { outcome: 'refused'; problem: Problem } | { outcome: 'unreachable' }

export type SenderState = 'idle' | 'sending' | 'waiting' | 'stopped'

export interface SenderPorts<A> {
  batches(): readonly Batch[]
  /** Keeps changed batches in the outbox; resolves when they are on disk. */
  keep(batches: readonly Batch[]): Promise<void>
  post(body: ChangeSet, key: string): Promise<Delivery<A>>
  /** The first batch is done; must take it from the batches. May ask for other people's changes before the next. */
  acknowledge(answer: A): Promise<void>
  /** The first batch was refused. Whether the others may be sent all the same, or somebody has to act first. */
  refuse(problem: Problem): Promise<'go on' | 'stop'>
  state(state: SenderState): void
  newKey(): string
  /** Runs something later; answers how to cancel it. */
  later(work: () => void, delayMs: number): () => void
}

/** Waits between tries, milliseconds; the last one repeats. */
const BACKOFF_MS = [1000, 2000, 5000, 10_000, 30_000] as const

/** Sends waiting batches one at a time, in order. A request's key and body are on disk before its first sending and stay
 *  the same over all tries. A refusal may stop the sender until somebody acts; silence makes it wait and try again. */
export class Sender<A> {
  private state: SenderState = 'idle'
  private failures = 0
  private cancelWait: () => void = () => {}
  private closed = false

  constructor(private readonly ports: SenderPorts<A>) {}

  /** Something may be there to send. Does nothing while a request is under way, while waiting or stopped. */
  nudge(): void {
    if (this.state === 'idle') void this.run()
  }

  /** Tries now: after a refusal was settled, after signing in again, or when the network is back. */
  resume(): void {
    if (this.state === 'sending' || this.closed) return
    this.cancelWait()
    void this.run()
  }

  close(): void {
    this.closed = true
    this.cancelWait()
  }

  private enter(state: SenderState): void {
    this.state = state
    this.ports.state(state)
  }

  private async run(): Promise<void> {
    while (!this.closed && this.ports.batches().length > 0) {
      if (this.state !== 'sending') this.enter('sending')
      const request = await this.freeze()
      const delivery = await this.ports.post(request.body, request.key)
      if (this.closed) return
      if (delivery.outcome === 'unreachable') return this.wait()
      this.failures = 0
      if (delivery.outcome === 'refused') {
        if ((await this.ports.refuse(delivery.problem)) === 'stop') return this.enter('stopped')
      } else await this.ports.acknowledge(delivery.answer)
    }
    if (this.state !== 'idle') this.enter('idle')
  }

  private async freeze(): Promise<NonNullable<Batch['request']>> {
    const frozen = freezeFirst(this.ports.batches(), this.ports.newKey())
    await this.ports.keep(frozen)
    const request = frozen[0]?.request
    if (!request) throw new TypeError('There is no batch to send.')
    return request
  }

  private wait(): void {
    const delay = BACKOFF_MS[Math.min(this.failures, BACKOFF_MS.length - 1)] ?? 30_000
    this.failures += 1
    this.enter('waiting')
    this.cancelWait = this.ports.later(() => this.resume(), delay)
  }
}
