import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { parentPort, workerData } from 'node:worker_threads'
import type { ReadDocument } from '@/lib/checks/types'
import { isRefusal } from '@/lib/rules/refusal'
import { isZip } from '../check/check-manuscript'
import { readPages } from '../pdf/open-document'
import { readTableFile } from '../table/read-table'
import type { AuditTask, Phase, ThreadMessage, ThreadTask } from './messages'

// Runs in a worker thread of its own: a file that eats memory or time ends this thread and nothing else.
const task = workerData as ThreadTask
const send = (message: ThreadMessage) => parentPort?.postMessage(message)
let phase: Phase = 'opening'

try {
  const { document, readingCopy } = await readManuscript(task)
  if (task.kind === 'read') send({ kind: 'read', document, readingCopy })
  else send({ kind: 'audited', audit: await judge(task, document), readingCopy })
} catch (error) {
  send(describe(error))
}

async function readManuscript({ path, maxPages, recognition }: ThreadTask) {
  const reading = {
    maxPages,
    recognition,
    onPage: (page: number, of: number) => send({ kind: 'page', page, of }),
    onRecognise: () => send({ kind: 'recognising' }),
  }
  const bytes = new Uint8Array(await readFile(path))
  if (!(await isZip(path))) {
    phase = 'reading'
    return { document: await readPages(bytes, reading), readingCopy: null }
  }
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const { makeReadingCopy } = await import('../word/make-reading-copy')
  phase = 'reading'
  const { pdf, remarks } = await makeReadingCopy(path)
  const document = await readPages(new Uint8Array(pdf), reading)
  // The document is the one that was handed in; its pages are those of the copy.
  const read: ReadDocument = { ...document, sha256, ...(remarks.length > 0 ? { remarks } : {}) }
  return { document: read, readingCopy: new Uint8Array(pdf) }
}

async function judge({ table, rules }: AuditTask, document: ReadDocument) {
  phase = 'reading the table'
  const rows = table ? { ...(await readTableFile(table.path, table.name)), roles: table.roles ?? [] } : null
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
