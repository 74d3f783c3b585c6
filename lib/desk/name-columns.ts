import { and, eq, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { transact, type Db, type Tx } from '@/db/client'
import { files, rounds } from '@/db/schema'
import { recordEvent } from '@/lib/record/record-event'
import { NAMING_STATES } from '@/lib/rules/actions'
import {
  namedColumnsSchema,
  parseNamedColumns,
  storeNamedColumns,
  type NamedColumns,
} from '@/lib/rules/named-columns'
import { may } from '@/lib/rules/permissions'
import { refuse, refuseUnknown } from '@/lib/rules/refusal'
import type { Actor } from '@/lib/rules/roles'
import { canMove } from '@/lib/rules/states'
import { getManuscriptRow, getRoundRow, loadReview, refuseState } from './load-manuscript'
import { loadOpenFiles } from './load-open-files'
import { moveManuscript } from './move-manuscript'
import { requireOnManuscript } from './permission'
import { queueAudit } from './queue-audit'

export const nameColumnsInput = z.object({
  fileId: z.string(),
  /** The revision that the person saw: whoever comes second reloads first. */
  revision: z.number().int().min(0),
  /** All columns that are named from now on; those that are not here are taken for what the reader finds. */
  columns: namedColumnsSchema,
})

/** `auditId`: of the audit that was asked for; null while the manuscript is not handed in, or where nothing changed. */
export type NameColumnsResult = { revision: number; auditId: string | null }

/**
 * Says what the columns of a results table hold. A submitter says it of a file that is still theirs to change;
 * a reviewer at work and an editor of the round that is judged, which is then audited again: points that are decided
 * stay, and the state of a review under way does not change.
 */
export function nameColumns(
  db: Db,
  actor: Actor,
  input: z.infer<typeof nameColumnsInput>,
  now: number,
): NameColumnsResult {
  return transact(db, (tx) => {
    const file = loadTable(tx, input.fileId)
    const { manuscript, round, judged } = loadRound(tx, actor, file.manuscriptId)
    if (round.id !== file.roundId)
      throw refuse('conflict', 'This file belongs to an earlier round and is kept.')
    if (file.revision !== input.revision) {
      throw refuse('conflict', 'Somebody else named columns of this table meanwhile; please reload the page.')
    }
    const changes = listChanges(parseNamedColumns(file.columnRoles), input.columns)
    if (changes.length === 0) return { revision: file.revision, auditId: null }
    const revision = file.revision + 1
    tx.update(files)
      .set({ columnRoles: storeNamedColumns(input.columns), columnRolesRevision: revision })
      .where(eq(files.id, input.fileId))
      .run()
    recordEvent(tx, actor, 'columns named', now, {
      manuscriptId: manuscript.id,
      subject: input.fileId,
      detail: { round: round.number, changes: changes.slice(0, 20).join(', '), count: changes.length },
    })
    if (!judged) return { revision, auditId: null }
    if (canMove('run the audit again', manuscript.state)) {
      moveManuscript(tx, actor, manuscript.id, 'run the audit again', now)
    }
    const auditId = queueAudit(tx, round.id, now)
    recordEvent(tx, actor, 'audit asked again', now, {
      manuscriptId: manuscript.id,
      subject: auditId,
      detail: { round: round.number },
    })
    return { revision, auditId }
  })
}

function loadTable(tx: Tx, fileId: string) {
  const file = tx
    .select({
      roundId: files.roundId,
      manuscriptId: rounds.manuscriptId,
      columnRoles: files.columnRoles,
      revision: files.columnRolesRevision,
    })
    .from(files)
    .innerJoin(rounds, eq(rounds.id, files.roundId))
    .where(and(eq(files.id, fileId), eq(files.kind, 'table'), isNull(files.replacedAt)))
    .get()
  if (!file) throw refuseUnknown()
  return file
}

/** The round whose table the actor may name now; `judged`: it is handed in, so its audit is made again. */
function loadRound(tx: Tx, actor: Actor, manuscriptId: string) {
  const standing = requireOnManuscript(tx, actor, 'table.name-columns', manuscriptId)
  if (standing.relations.includes('own')) {
    return { ...loadOpenFiles(tx, actor, manuscriptId), judged: false }
  }
  // Whoever may offer a review manages the manuscript; anybody else must be at work on it.
  if (!may(actor, 'assignment.offer', standing)) {
    return { ...loadReview(tx, actor, 'table.name-columns', manuscriptId), judged: true }
  }
  const manuscript = getManuscriptRow(tx, manuscriptId)
  if (!NAMING_STATES.includes(manuscript.state)) throw refuseState(manuscript.state)
  return { manuscript, round: getRoundRow(tx, manuscript), judged: true }
}

/** 'sheet 1, row 2, column 5: p-adjusted', and 'as found' for one that is given back to the reader. */
function listChanges(before: NamedColumns, after: NamedColumns): string[] {
  const keyOf = (c: NamedColumns[number]) => `sheet ${c.sheet + 1}, row ${c.row + 1}, column ${c.column + 1}`
  const [old, next] = [before, after].map((all) => new Map(all.map((c) => [keyOf(c), c.role] as const)))
  const keys = [...new Set([...(old?.keys() ?? []), ...(next?.keys() ?? [])])]
  return keys
    .filter((key) => old?.get(key) !== next?.get(key))
    .map((key) => `${key}: ${next?.get(key) ?? 'as found'}`)
}
