import { parentPort, workerData } from 'node:worker_threads'
import type { ThreadTask } from './messages'
import { runTask } from './run-task'

// Runs in a worker thread of its own: a file that eats memory or time ends this thread and nothing else.
await runTask(workerData as ThreadTask, (message) => parentPort?.postMessage(message))
