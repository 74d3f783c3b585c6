import { and, desc, eq, isNull } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { audits, files, houseRulesVersions, rounds } from '@/db/schema'
import type { AuditFiles } from '@/lib/intake/audit-files'
import { getStoredPath } from '@/lib/intake/store/stored-path'
import { houseRulesSchema } from '@/lib/rules/house-rules'
import { parseNamedColumns } from '@/lib/rules/named-columns'
import type { FileKind } from '@/lib/rules/words'

/**
 * The files of an audit's round and the rules of the day it was handed in; null where there is no manuscript
 * left. An alpha that the submitter states goes before the house's.
 */
export function getAuditFiles(db: Db, uploads: string, auditId: string): AuditFiles | null {
  const round = db
    .select({ id: rounds.id, alpha: rounds.alpha, body: houseRulesVersions.body })
    .from(audits)
    .innerJoin(rounds, eq(rounds.id, audits.roundId))
    .innerJoin(houseRulesVersions, eq(houseRulesVersions.version, rounds.houseRulesVersion))
    .where(eq(audits.id, auditId))
    .get()
  if (!round) return null
  const manuscript = findFile(db, round.id, 'manuscript')
  if (!manuscript) return null
  const table = findFile(db, round.id, 'table')
  const { alpha, accepted, correctionFrom, secondaryApart } = houseRulesSchema.parse(round.body)
  return {
    manuscript: getStoredPath(uploads, manuscript.sha256),
    table: table
      ? {
          path: getStoredPath(uploads, table.sha256),
          name: table.name,
          roles: parseNamedColumns(table.columnRoles),
        }
      : null,
    rules: { alpha: round.alpha ?? alpha, accepted, correctionFrom, secondaryApart },
  }
}

function findFile(db: Db, roundId: string, kind: FileKind) {
  return db
    .select({ sha256: files.sha256, name: files.name, columnRoles: files.columnRoles })
    .from(files)
    .where(and(eq(files.roundId, roundId), eq(files.kind, kind), isNull(files.replacedAt)))
    .orderBy(desc(files.createdAt))
    .get()
}
