import { Worker } from 'node:worker_threads'
import { refuse } from '@/lib/rules/refusal'
import { getThreadFile } from './bundle-thread'
import type { ThreadMessage, ThreadTask } from './messages'
import { describeTrouble, troubles } from './troubles'

export type ReadingLimits = { milliseconds: number; megabytes: number; pages: number }

export const defaultLimits: ReadingLimits = { milliseconds: 120_000, megabytes: 1_024, pages: 2_000 }

type Told<T> = {
  task: ThreadTask
  limits: ReadingLimits
  signal?: AbortSignal
  /** The task's answer when the message holds it; undefined for a message on the way. */
  onMessage: (message: ThreadMessage) => T | undefined
}

/**
 * Runs a task in a worker thread under limits of time and memory. Rejects with a refusal `unreadable` (or the
 * refusal of the reader) whose message says what is wrong and what to do, and with a plain error where the
 * fault is not the file's.
 */
export async function runThread<T extends object>(told: Told<T>): Promise<T> {
  return runFile(await getThreadFile(), told)
}

function runFile<T extends object>(file: string, { task, limits, signal, onMessage }: Told<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(file, {
      workerData: task,
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: limits.megabytes },
    })
    const abort = () => settle(() => reject(signal?.reason))
    const settle = (finish: () => void) => {
      clearTimeout(timer)
      signal?.removeEventListener('abort', abort)
      finish()
      void worker.terminate()
    }
    const timer = setTimeout(
      () => settle(() => reject(unreadable(troubles.slow(limits.milliseconds)))),
      limits.milliseconds,
    )
    if (signal?.aborted) abort()
    signal?.addEventListener('abort', abort)
    worker.on('message', (message: ThreadMessage) => {
      const failure = toFailure(message)
      if (failure) return settle(() => reject(failure))
      const answer = onMessage(message)
      if (answer) settle(() => resolve(answer))
    })
    worker.on('error', (error: NodeJS.ErrnoException) =>
      settle(() =>
        reject(error.code === 'ERR_WORKER_OUT_OF_MEMORY' ? unreadable(troubles.memory, error) : error),
      ),
    )
    worker.on('exit', () => settle(() => reject(unreadable(troubles.damaged))))
  })
}

function toFailure(message: ThreadMessage): Error | null {
  if (message.kind === 'refused') return refuse(message.refusal, message.message)
  if (message.kind !== 'trouble') return null
  const { phase, name, stack, code } = message
  const cause = Object.assign(new Error(message.message), { name, stack, ...(code ? { code } : {}) })
  return phase === 'reading' ? unreadable(describeTrouble(name), cause) : cause
}

function unreadable(message: string, cause?: unknown) {
  return Object.assign(refuse('unreadable', message), { cause })
}
