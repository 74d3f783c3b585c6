import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Readable } from 'node:stream'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { isZip } from '@/lib/intake/check/check-manuscript'
import { storeFile } from '@/lib/intake/store-file'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import type { ThreadMessage } from '@/lib/intake/thread/messages'
import { runTask } from '@/lib/intake/thread/run-task'
import { toFailure } from '@/lib/intake/thread/run-thread'
import { isRefusal } from '@/lib/rules/refusal'
import type { Format } from './fixtures'

export type Outcome = { kind: 'read' | 'refused' | 'fault'; says: string }

/** The whole intake of one file, in this process: checked, stored, read, audited, as an upload and its audit do. */
export async function takeIn(format: Format, bytes: Buffer, sound: Buffer): Promise<Outcome> {
  const folder = mkdtempSync(join(tmpdir(), 'assize-damage-'))
  try {
    const kind = format === 'pdf' || format === 'docx' ? 'manuscript' : 'table'
    const body = Readable.from(bytes.length > 0 ? [bytes] : [])
    const { sha256 } = await storeFile(body, { folder, kind, limit: 40_000_000 })
    const stored = getStoredPath(folder, sha256)
    const manuscript = kind === 'manuscript' ? stored : join(folder, 'sound.pdf')
    if (kind === 'table') writeFileSync(manuscript, sound)
    let last: ThreadMessage = { kind: 'stage', stage: 'opening' }
    await runTask(
      {
        kind: 'audit',
        path: manuscript,
        maxPages: 2000,
        recognition: { pages: 0, milliseconds: 0 },
        table: kind === 'table' ? { path: stored, name: `results.${format}` } : null,
        rules: defaultHouseRules,
      },
      (message) => {
        last = message
      },
    )
    const failure = toFailure(last, (await isZip(manuscript)) ? 'word' : 'pdf')
    if (failure) throw failure
    return { kind: 'read', says: '' }
  } catch (error) {
    const says = error instanceof Error ? error.message : String(error)
    if (isRefusal(error) && !leaks(says)) return { kind: 'refused', says }
    return { kind: 'fault', says: error instanceof Error ? (error.stack ?? says) : says }
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

/** A message for a person holds no path, no stack and no value that was meant for nobody. */
export function leaks(message: string): boolean {
  // "/tmp/x", "C:\x", "at read (file.ts:3)", "undefined", "[object Object]", "Error: …"
  return /(?:^|\s)\/\w|[A-Z]:\\|\bat \S+ \(|node_modules|undefined|\[object |Error:/.test(message)
}
