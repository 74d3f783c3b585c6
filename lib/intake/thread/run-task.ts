import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import type { ReadDocument, ReadTable } from '@/lib/checks/types'
import { isRefusal } from '@/lib/rules/refusal'
import { isZip } from '../check/check-manuscript'
import { readPages } from '../pdf/open-document'
import { readTableFile } from '../table/read-table'
import type { Phase, TableFile, ThreadMessage, ThreadTask } from './messages'

type Send = (message: ThreadMessage) => void

/** Does what a thread is asked to; all that comes out of it, a failure too, is sent as a message. */
export async function runTask(task: ThreadTask, send: Send): Promise<void> {
  let phase: Phase = 'opening'
  const enter = (next: Phase) => {
    phase = next
  }
  try {
    const { document, readingCopy } = await readManuscript(task, send, enter)
    if (task.kind === 'read') return send({ kind: 'read', document, readingCopy })
    enter('reading the table')
    const table = task.table ? await readNamed(task.table) : null
    enter('judging')
    const { audit } = await import('@/lib/checks/audit')
    const result = audit(document, table, task.rules, (stage) => send({ kind: 'stage', stage }))
    send({ kind: 'audited', audit: result, readingCopy })
  } catch (error) {
    send(describe(error, phase))
  }
}

async function readManuscript(
  { path, maxPages, recognition }: ThreadTask,
  send: Send,
  enter: (phase: Phase) => void,
) {
  const reading = {
    maxPages,
    recognition,
    onPage: (page: number, of: number) => send({ kind: 'page', page, of }),
    onRecognise: () => send({ kind: 'recognising' }),
  }
  const bytes = new Uint8Array(await readFile(path))
  if (!(await isZip(path))) {
    enter('reading')
    return { document: await readPages(bytes, reading), readingCopy: null }
  }
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const { makeReadingCopy } = await import('../word/make-reading-copy')
  enter('reading')
  const { pdf, remarks } = await makeReadingCopy(path)
  const document = await readPages(new Uint8Array(pdf), reading)
  // The document is the one that was handed in; its pages are those of the copy.
  const read: ReadDocument = { ...document, sha256, ...(remarks.length > 0 ? { remarks } : {}) }
  return { document: read, readingCopy: new Uint8Array(pdf) }
}

function describe(error: unknown, phase: Phase): ThreadMessage {
  if (isRefusal(error)) return { kind: 'refused', refusal: error.refusal, message: error.message }
  const thrown = error instanceof Error ? error : new Error(String(error))
  const { name, message, stack = '' } = thrown
  const code = 'code' in thrown && typeof thrown.code === 'string' ? thrown.code : null
  return { kind: 'trouble', phase, name, message, stack, code }
}

/** The results table with the columns that a person named. */
async function readNamed({ path, name, roles = [] }: TableFile): Promise<ReadTable> {
  return { ...(await readTableFile(path, name)), roles }
}
