import { and, eq, isNull } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { files, rounds } from '@/db/schema'
import { listActions } from '@/lib/rules/actions'
import { parseNamedColumns, type NamedColumns } from '@/lib/rules/named-columns'
import type { Actor } from '@/lib/rules/roles'
import { getFile, type StoredFile } from './file'
import { getRulesOf } from './rules-in-force'
import { getSituation } from './situation'
import { findViewing } from './viewing'

export type TableColumns = {
  file: StoredFile
  round: number
  /** The level of the round, as its submitter or the house says. */
  alpha: number
  /** What people named so far, and the revision to name it with. */
  columns: NamedColumns
  revision: number
  mayName: boolean
  /** Naming asks for a new audit: the round is handed in. */
  asksAudit: boolean
}

/** A results table with the columns that people named; null where the file is not for the actor. */
export function getTableColumns(db: Reader, actor: Actor, fileId: string): TableColumns | null {
  const file = getFile(db, actor, fileId)
  if (file?.kind !== 'table') return null
  const viewing = findViewing(db, actor, file.manuscriptId, 'file.read')
  const row = db
    .select({
      round: rounds.number,
      alpha: rounds.alpha,
      houseRulesVersion: rounds.houseRulesVersion,
      columnRoles: files.columnRoles,
      revision: files.columnRolesRevision,
      replacedAt: files.replacedAt,
    })
    .from(files)
    .innerJoin(rounds, eq(rounds.id, files.roundId))
    .where(eq(files.id, fileId))
    .get()
  if (!viewing || !row) return null
  const { manuscript, standing } = viewing
  const can = listActions(actor, standing, getSituation(db, actor, manuscript)).includes('nameColumns')
  const begun = begunRound(db, manuscript.id)
  const open = viewing.sight === 'submitter' && begun !== null ? begun : manuscript.currentRound
  return {
    file,
    round: row.round,
    alpha: row.alpha ?? getRulesOf(db, row.houseRulesVersion).alpha,
    columns: parseNamedColumns(row.columnRoles),
    revision: row.revision,
    mayName: can && row.replacedAt === null && row.round === open,
    asksAudit: viewing.sight !== 'submitter',
  }
}

function begunRound(db: Reader, manuscriptId: string): number | null {
  const row = db
    .select({ number: rounds.number })
    .from(rounds)
    .where(and(eq(rounds.manuscriptId, manuscriptId), isNull(rounds.handedInAt)))
    .get()
  return row?.number ?? null
}
