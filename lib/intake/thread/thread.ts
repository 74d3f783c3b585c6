import { readFile } from 'node:fs/promises'
import { parentPort, workerData } from 'node:worker_threads'
import { isRefusal } from '@/lib/rules/refusal'
import { readPages } from '../pdf/open-document'
import { readTableFile } from '../table/read-table'
import type { AuditTask, Phase, ThreadMessage, ThreadTask } from './messages'

// Runs in a worker thread of its own: a file that eats memory or time ends this thread and nothing else.
const task = workerData as ThreadTask
const send = (message: ThreadMessage) => parentPort?.postMessage(message)
let phase: Phase = 'opening'

try {
  const bytes = new Uint8Array(await readFile(task.path))
  phase = 'reading'
  const document = await readPages(bytes, task.maxPages, (page, of) => send({ kind: 'page', page, of }))
  if (task.kind === 'read') send({ kind: 'read', document })
  else send({ kind: 'audited', audit: await judge(task, document) })
} catch (error) {
  send(describe(error))
}

async function judge({ table, rules }: AuditTask, document: Awaited<ReturnType<typeof readPages>>) {
  phase = 'reading the table'
  const rows = table ? await readTableFile(table.path, table.name) : null
  phase = 'judging'
  const { audit } = await import('@/lib/checks/audit')
  return audit(document, rows, rules, (stage) => send({ kind: 'stage', stage }))
}

function describe(error: unknown): ThreadMessage {
  if (isRefusal(error)) return { kind: 'refused', refusal: error.refusal, message: error.message }
  const thrown = error instanceof Error ? error : new Error(String(error))
  const { name, message, stack = '' } = thrown
  const code = 'code' in thrown && typeof thrown.code === 'string' ? thrown.code : null
  return { kind: 'trouble', phase, name, message, stack, code }
}
