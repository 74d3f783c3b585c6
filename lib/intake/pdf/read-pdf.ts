import { Worker } from 'node:worker_threads'
import type { ReadDocument } from '@/lib/checks/types'
import { refuse } from '@/lib/rules/refusal'

export type ReadingLimits = { milliseconds: number; megabytes: number; pages: number }

export const defaultLimits: ReadingLimits = { milliseconds: 120_000, megabytes: 1_024, pages: 2_000 }

export type ThreadTask = { path: string; maxPages: number }
export type ThreadMessage =
  | { kind: 'page'; page: number; of: number }
  | { kind: 'read'; document: ReadDocument }
  | { kind: 'trouble'; name: string; message: string }

/**
 * Reads a PDF's positioned text in a worker thread under limits of time, memory and pages. Rejects with a
 * refusal `unreadable` whose message says what is wrong and what to do.
 */
export function readPdf(
  path: string,
  limits: ReadingLimits = defaultLimits,
  onPage: (page: number, of: number) => void = () => undefined,
): Promise<ReadDocument> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(new URL('./thread-start.mjs', import.meta.url), {
      workerData: { path, maxPages: limits.pages } satisfies ThreadTask,
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: limits.megabytes },
    })
    const timer = setTimeout(
      () => settle(() => reject(unreadable(troubles.slow(limits.milliseconds)))),
      limits.milliseconds,
    )
    const settle = (finish: () => void) => {
      clearTimeout(timer)
      finish()
      void worker.terminate()
    }
    worker.on('message', (message: ThreadMessage) => {
      if (message.kind === 'page') onPage(message.page, message.of)
      else if (message.kind === 'read') settle(() => resolve(message.document))
      else settle(() => reject(unreadable(describe(message.name), message)))
    })
    worker.on('error', (error: NodeJS.ErrnoException) =>
      settle(() =>
        reject(
          unreadable(error.code === 'ERR_WORKER_OUT_OF_MEMORY' ? troubles.memory : troubles.damaged, error),
        ),
      ),
    )
    worker.on('exit', () => settle(() => reject(unreadable(troubles.damaged))))
  })
}

const troubles = {
  encrypted: 'The PDF is protected by a password; please save it without protection and hand it in again.',
  damaged:
    'The PDF is damaged and cannot be opened; please export it again from its source and hand that in.',
  notPdf: 'The file is not a PDF; please export the manuscript as PDF and hand that in.',
  pages:
    'The PDF has more pages than can be read here; please hand in the manuscript without its supplements.',
  memory: 'The PDF needs more memory than one file may take; please export it again with smaller pictures.',
  slow: (ms: number) =>
    `The PDF could not be read within ${Math.round(ms / 1000)} seconds; please export it again from its source, as text and not as pictures.`,
}

function describe(name: string): string {
  if (name === 'PasswordException') return troubles.encrypted
  if (name === 'RangeError') return troubles.pages
  if (name === 'InvalidPDFException') return troubles.damaged
  return troubles.damaged
}

function unreadable(message: string, cause?: unknown) {
  return Object.assign(refuse('unreadable', message), { cause })
}
