import { Worker } from 'node:worker_threads'
import type { IntakeTask, TaskAnswer } from './intake-task'

/** Longest that one file may keep the thread busy, milliseconds. The largest allowed file takes a fraction of it. */
const TIME_LIMIT_MS = 120_000
/** Memory that reading one file may take, megabytes. */
const MEMORY_LIMIT_MB = 1536

/** Reading stopped because the file asked for too much time or memory. */
export class FileTooHard extends Error {}

/** Reads field files on a thread of its own, one after another, so that requests are answered meanwhile. The thread is
 *  started with the first file; one that runs out of time or memory is ended, and the next file gets a fresh one. */
export class IntakeDesk {
  private worker: Worker | undefined
  private last: Promise<unknown> = Promise.resolve()

  /** Does a task when those before it are done.
   *  @throws FileTooHard if the file asks for too much time or memory */
  run<T extends IntakeTask>(task: T): Promise<TaskAnswer<T>> {
    const answer = this.last.then(() => this.post(task))
    this.last = answer.catch(() => undefined)
    return answer
  }

  async close(): Promise<void> {
    await this.worker?.terminate()
    this.worker = undefined
  }

  private post<T extends IntakeTask>(task: T): Promise<TaskAnswer<T>> {
    const worker = (this.worker ??= startWorker())
    return new Promise((resolve, reject) => {
      const giveUp = (reason: Error) => {
        settle()
        this.worker = undefined
        void worker.terminate()
        reject(reason)
      }
      const timer = setTimeout(() => giveUp(new FileTooHard('Reading took too long.')), TIME_LIMIT_MS)
      const onMessage = (answer: TaskAnswer<T>) => {
        settle()
        resolve(answer)
      }
      const onError = (cause: unknown) => giveUp(toError(cause))
      const onExit = () => giveUp(new Error('The intake thread ended.'))
      const settle = () => {
        clearTimeout(timer)
        worker.off('message', onMessage).off('error', onError).off('exit', onExit)
        // An idle thread does not keep the process alive.
        worker.unref()
      }
      worker.ref()
      worker.on('message', onMessage).on('error', onError).on('exit', onExit)
      worker.postMessage(task)
    })
  }
}

function startWorker(): Worker {
  return new Worker(new URL('./intake-thread.mjs', import.meta.url), {
    // The main thread's flags are about its own loader and memory.
    execArgv: [],
    resourceLimits: { maxOldGenerationSizeMb: MEMORY_LIMIT_MB },
  })
}

function toError(cause: unknown): Error {
  const outOfMemory = cause instanceof Error && 'code' in cause && cause.code === 'ERR_WORKER_OUT_OF_MEMORY'
  if (outOfMemory) return new FileTooHard('Reading took too much memory.', { cause })
  return cause instanceof Error ? cause : new Error('The intake thread failed.', { cause })
}
