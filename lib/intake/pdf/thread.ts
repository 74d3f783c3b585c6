import { parentPort, workerData } from 'node:worker_threads'
import { readFile } from 'node:fs/promises'
import { readPages } from './open-document'
import type { ThreadMessage, ThreadTask } from './read-pdf'

// Runs in a worker thread of its own: a file that eats memory or time ends this thread and nothing else.
const task = workerData as ThreadTask
const send = (message: ThreadMessage) => parentPort?.postMessage(message)

try {
  const bytes = new Uint8Array(await readFile(task.path))
  const document = await readPages(bytes, task.maxPages, (page, of) => send({ kind: 'page', page, of }))
  send({ kind: 'read', document })
} catch (error) {
  send({
    kind: 'trouble',
    name: error instanceof Error ? error.name : 'Error',
    message: error instanceof Error ? error.message : String(error),
  })
}
