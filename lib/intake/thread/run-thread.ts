import { Worker } from 'node:worker_threads'
import { refuse } from '@/lib/rules/refusal'
import type { RecognitionLimits } from '../recognise/recognise-pages'
import { isZip } from '../check/check-manuscript'
import { getThreadFile } from './bundle-thread'
import type { ThreadMessage, ThreadTask } from './messages'
import { describeTrouble, troubles, type Format } from './troubles'

export type ReadingLimits = {
  milliseconds: number
  megabytes: number
  pages: number
  /** What recognising the text of scanned pages may take, beside all else. */
  recognition: RecognitionLimits
}

export const defaultLimits: ReadingLimits = {
  milliseconds: 120_000,
  megabytes: 1_024,
  pages: 2_000,
  recognition: { pages: 40, milliseconds: 480_000 },
}

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
  const format: Format = (await isZip(told.task.path)) ? 'word' : 'pdf'
  return runFile(await getThreadFile(), format, told)
}

function runFile<T extends object>(
  file: string,
  format: Format,
  { task, limits, signal, onMessage }: Told<T>,
): Promise<T> {
  const says = troubles[format]
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
    const wait = (milliseconds: number) =>
      setTimeout(() => settle(() => reject(unreadable(says.slow(milliseconds)))), milliseconds)
    let timer = wait(limits.milliseconds)
    let recognises = false
    if (signal?.aborted) abort()
    signal?.addEventListener('abort', abort)
    worker.on('message', (message: ThreadMessage) => {
      if (message.kind === 'recognising' && !recognises) {
        recognises = true
        clearTimeout(timer)
        timer = wait(limits.milliseconds + limits.recognition.milliseconds)
      }
      const failure = toFailure(message, format)
      if (failure) return settle(() => reject(failure))
      const answer = onMessage(message)
      if (answer) settle(() => resolve(answer))
    })
    worker.on('error', (error: NodeJS.ErrnoException) =>
      settle(() =>
        reject(error.code === 'ERR_WORKER_OUT_OF_MEMORY' ? unreadable(says.memory, error) : error),
      ),
    )
    worker.on('exit', () => settle(() => reject(unreadable(says.damaged))))
  })
}

/** What a message of the thread fails with: a refusal, or a plain error for a fault of ours; null where it does not. */
export function toFailure(message: ThreadMessage, format: Format): Error | null {
  if (message.kind === 'refused') return refuse(message.refusal, message.message)
  if (message.kind !== 'trouble') return null
  const { phase, name, stack, code } = message
  const cause = Object.assign(new Error(message.message), { name, stack, ...(code ? { code } : {}) })
  return phase === 'reading' ? unreadable(describeTrouble(format, name), cause) : cause
}

function unreadable(message: string, cause?: unknown) {
  return Object.assign(refuse('unreadable', message), { cause })
}
