import { parentPort } from 'node:worker_threads'
import { runTask, type IntakeTask } from './intake-task'

/** The other end of `intake-desk.ts`: does one task at a time and posts its answer. A throw ends the thread, which the
 *  desk reports and replaces. */
parentPort?.on('message', (task: IntakeTask) => parentPort?.postMessage(runTask(task)))
