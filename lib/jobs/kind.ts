import type { Db } from '@/db/client'
import type { Settings } from '@/lib/settings'

export type JobCall = {
  db: Db
  settings: Settings
  clock: () => number
  /** Aborted when the lease is lost or the worker stops. */
  signal: AbortSignal
  subjectId: string
}

/** What a job leads to, written in the transaction that marks it done. */
export type Write = (now: number) => void

/** What the queue must know of a kind of job. */
export type JobRow = {
  run: (call: JobCall) => Promise<Write>
  /** Milliseconds to wait after a try that failed, the first being 1. */
  backoff: (attempt: number) => number
  /** In the transaction that puts the job back, or (`final`) gives it up. */
  onTrouble: (db: Db, subjectId: string, about: { trouble: string; final: boolean }, now: number) => void
}

/** An error that no further try will mend. */
export function hopeless(message: string, cause?: unknown): Error {
  return Object.assign(new Error(message, { cause }), { hopeless: true })
}

export function isHopeless(error: unknown): boolean {
  return error instanceof Error && 'hopeless' in error
}
