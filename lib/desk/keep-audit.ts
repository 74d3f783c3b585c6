import { eq } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db } from '@/db/client'
import { audits } from '@/db/schema'
import type { Audit } from '@/lib/checks/types'
import { recordEvent } from '@/lib/record/record-event'
import type { Actor } from '@/lib/rules/roles'
import { loadAudit } from './load-audit'
import { moveManuscript } from './move-manuscript'
import { raisePoints } from './raise-points'
import { writeAuditRows } from './write-audit-rows'

export const keepAuditInput = z.object({
  auditId: z.string(),
  audit: z.custom<Audit>((value) => typeof value === 'object' && value !== null),
})

/** `kept` is false where the audit had ended before: a job may run twice. */
export type KeepAuditResult = { kept: boolean }

/** Writes what the engine found, raises a point of each finding, and makes the manuscript ready. For the worker. */
export function keepAudit(
  db: Db,
  actor: Actor,
  input: z.infer<typeof keepAuditInput>,
  now: number,
): KeepAuditResult {
  return transact(db, (tx) => {
    const { auditId, audit } = input
    const at = loadAudit(tx, actor, auditId)
    if (at.ended) return { kept: false }
    writeAuditRows(tx, auditId, audit)
    tx.update(audits)
      .set({
        status: 'done',
        stage: 'done',
        progress: 1,
        trouble: null,
        engine: audit.engine,
        pages: audit.document.pages,
        title: audit.document.title,
        documentSha256: audit.document.sha256,
        tableFile: audit.table?.file ?? null,
        tableRows: audit.table?.rows ?? null,
        tableSha256: audit.table?.sha256 ?? null,
        alpha: audit.alpha.value,
        alphaQuote: audit.alpha.quote,
        alphaPage: audit.alpha.page,
        finishedAt: now,
      })
      .where(eq(audits.id, auditId))
      .run()
    if (at.awaited || at.renews) raisePoints(tx, at.roundId, auditId, audit)
    if (at.awaited) moveManuscript(tx, actor, at.manuscriptId, 'finish the audit', now)
    recordEvent(tx, actor, 'audit finished', now, {
      manuscriptId: at.manuscriptId,
      subject: auditId,
      detail: {
        round: at.round,
        engine: audit.engine,
        families: audit.families.length,
        findings: audit.findings.length,
      },
    })
    return { kept: true }
  })
}
