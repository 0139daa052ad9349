import { startMailWorker } from './mail/worker'
import type { StartWorker } from './services/running-worker'

/** Every worker that the server starts. */
export const WORKERS: readonly StartWorker[] = [startMailWorker]
