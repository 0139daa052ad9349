/** Work that goes on beside the answering of requests, in this process, until it is stopped. */
export interface RunningWorker {
  stop(): Promise<void>
}

export type StartWorker = (surroundings: WorkerSurroundings) => RunningWorker

export interface WorkerSurroundings {
  readonly smtpUrl: string
  readonly log: (error: unknown, says: string) => void
}
