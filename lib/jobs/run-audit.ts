import { and, eq, inArray } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { audits } from '@/db/schema'
import { keepAudit } from '@/lib/desk/keep-audit'
import { stopAudit } from '@/lib/desk/stop-audit'
import { auditFiles } from '@/lib/intake/audit-files'
import { keepReadingCopy } from '@/lib/intake/store/reading-copy'
import { defaultLimits } from '@/lib/intake/thread/run-thread'
import { isRefusal } from '@/lib/rules/refusal'
import { systemActor } from '@/lib/rules/roles'
import { getAuditFiles } from './audit-files-of'
import { hopeless, type JobCall, type Write } from './kind'

const reportEvery = 300

/** Audits a manuscript's files in a thread of their own. A file that cannot be read stops the audit, in words. */
export async function runAudit({ db, settings, clock, signal, subjectId }: JobCall): Promise<Write> {
  const files = getAuditFiles(db, settings.uploads, subjectId)
  if (!files) throw hopeless('The audit has no manuscript.')
  const report = makeReporter(db, subjectId, clock)
  report('opening', 0)
  try {
    const { audit, readingCopy } = await auditFiles(files, {
      limits: {
        ...defaultLimits,
        milliseconds: settings.auditMilliseconds,
        megabytes: settings.auditMegabytes,
      },
      signal,
      onProgress: report,
    })
    report('keeping', 0)
    // Before the audit is kept: whoever sees the audit can open the pages it speaks of.
    if (readingCopy) await keepReadingCopy(files.manuscript, readingCopy)
    return (now) => void keepAudit(db, systemActor, { auditId: subjectId, audit }, now)
  } catch (error) {
    if (!isRefusal(error)) throw error
    const trouble = error.message
    return (now) => void stopAudit(db, systemActor, { auditId: subjectId, trouble }, now)
  }
}

/** Keeps the stage for those who wait: at once when it changes, else a few times a second. */
function makeReporter(db: Db, auditId: string, clock: () => number) {
  let last = { stage: '', at: 0 }
  return (stage: string, progress: number): void => {
    const now = clock()
    if (stage === last.stage && now - last.at < reportEvery) return
    const started = last.stage === '' ? { startedAt: now } : {}
    last = { stage, at: now }
    db.update(audits)
      .set({ status: 'running', stage, progress, ...started })
      .where(and(eq(audits.id, auditId), inArray(audits.status, ['queued', 'running'])))
      .run()
  }
}

const ourFault =
  'The audit could not be finished, through a fault on our side and not of your file. Those who run this installation find it in the queue; please ask them, or try again later.'

/** After the last try the manuscript must not wait for ever. */
export function giveUpAudit(db: Db, auditId: string, about: { final: boolean }, now: number): void {
  if (about.final) stopAudit(db, systemActor, { auditId, trouble: ourFault }, now)
}
