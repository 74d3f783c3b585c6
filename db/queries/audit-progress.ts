import { and, desc, eq, sql } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { audits, files, rounds } from '@/db/schema'
import type { Actor } from '@/lib/rules/roles'
import { seesSubmitter } from '@/lib/rules/sight'
import type { AuditStatus } from '@/lib/rules/words'
import { findViewing, hideFileName, type Viewing } from './viewing'

export type AuditProgress = {
  auditId: string
  status: AuditStatus
  stage: string
  /** Within the stage, in [0, 1]. */
  progress: number
  trouble: string | null
  queuedAt: number
  startedAt: number | null
  finishedAt: number | null
}

/** The newest audit of the current round. */
export function getAuditProgress(db: Reader, actor: Actor, manuscriptId: string): AuditProgress | null {
  const viewing = findViewing(db, actor, manuscriptId, 'audit.follow')
  return viewing && readProgress(db, viewing)
}

/** For who may follow it already. */
export function readProgress(db: Reader, { manuscript, sight, blinding }: Viewing): AuditProgress | null {
  const row = db
    .select({
      auditId: audits.id,
      roundId: audits.roundId,
      status: audits.status,
      stage: audits.stage,
      progress: audits.progress,
      trouble: audits.trouble,
      queuedAt: audits.queuedAt,
      startedAt: audits.startedAt,
      finishedAt: audits.finishedAt,
    })
    .from(audits)
    .innerJoin(rounds, eq(rounds.id, audits.roundId))
    .where(and(eq(rounds.manuscriptId, manuscript.id), eq(rounds.number, manuscript.currentRound)))
    .orderBy(desc(audits.queuedAt), desc(sql`${audits}.rowid`))
    .limit(1)
    .get()
  if (!row) return null
  const { roundId, ...progress } = row
  if (progress.trouble === null || seesSubmitter(sight, blinding)) return progress
  return { ...progress, trouble: hideFileNames(db, roundId, progress.trouble) }
}

function hideFileNames(db: Reader, roundId: string, text: string): string {
  const named = db
    .select({ kind: files.kind, name: files.name })
    .from(files)
    .where(eq(files.roundId, roundId))
    .all()
  return named.reduce((hidden, { kind, name }) => hidden.replaceAll(name, hideFileName(kind, name)), text)
}
