import { and, count, desc, eq, gte, inArray, isNull, lt, or, sql, type SQL } from 'drizzle-orm'
import { z } from 'zod'
import type { Reader } from '@/db/client'
import { conflicts, manuscripts, record } from '@/db/schema'
import type { Event } from '@/lib/rules/events'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'

export type RecordRow = {
  sequence: number
  at: number
  event: Event
  actorId: string
  actorName: string
  manuscriptId: string | null
  reference: string | null
  subject: string | null
  detail: Record<string, string | number | boolean | null>
}

export type RecordFilter = {
  manuscriptId?: string
  actorId?: string
  events?: readonly Event[]
  /** Half-open, ms. */
  from?: number
  to?: number
  page?: number
  pageSize?: number
}

export type RecordPage = { rows: RecordRow[]; total: number; page: number; pageSize: number }

const detailSchema = z.record(z.string(), z.union([z.string(), z.number(), z.boolean(), z.null()]))

/**
 * Newest first. Editors get the lines on manuscripts they may see. Administrators get every line but those on
 * manuscripts of their own or of a conflict; of a manuscript they learn that something was done, by whom and
 * when, not which one it was.
 */
export function listRecord(db: Reader, actor: Actor, filter: RecordFilter = {}): RecordPage {
  const { page = 1, pageSize = 100 } = filter
  if (!may(actor, 'record.read')) return { rows: [], total: 0, page, pageSize }
  const open = may(actor, 'manuscript.record') ? seenByEditor(actor) : sql`false`
  const told = actor.roles.includes('administrator') ? notOnes(actor) : sql`false`
  // A person's own deeds and the desk's (invitations, house rules) concern no manuscript.
  const where = and(
    filter.manuscriptId === undefined
      ? or(isNull(record.manuscriptId), open, told)
      : and(eq(record.manuscriptId, filter.manuscriptId), open),
    filter.actorId === undefined ? undefined : eq(record.actorId, filter.actorId),
    filter.events === undefined ? undefined : inArray(record.event, [...filter.events]),
    filter.from === undefined ? undefined : gte(record.at, filter.from),
    filter.to === undefined ? undefined : lt(record.at, filter.to),
  )
  const rows = db
    .select({
      sequence: record.sequence,
      at: record.at,
      event: record.event,
      actorId: record.actorId,
      actorName: record.actorName,
      manuscriptId: record.manuscriptId,
      reference: manuscripts.reference,
      subject: record.subject,
      detail: record.detail,
      open: sql<number>`(${record.manuscriptId} is null or ${open})`,
    })
    .from(record)
    .leftJoin(manuscripts, eq(manuscripts.id, record.manuscriptId))
    .where(where)
    .orderBy(desc(record.sequence))
    .limit(pageSize)
    .offset((page - 1) * pageSize)
    .all()
  const counted = db
    .select({ n: count() })
    .from(record)
    .leftJoin(manuscripts, eq(manuscripts.id, record.manuscriptId))
    .where(where)
    .get()
  return {
    rows: rows.map(({ open, ...row }) =>
      open === 1
        ? { ...row, detail: detailSchema.parse(row.detail) }
        : { ...row, manuscriptId: null, reference: null, subject: null, detail: {} },
    ),
    total: counted?.n ?? 0,
    page,
    pageSize,
  }
}

function seenByEditor(actor: Actor): SQL {
  return sql`(${manuscripts.state} <> 'draft' and ${notOnes(actor)})`
}

function notOnes(actor: Actor): SQL {
  return sql`(${manuscripts.submitterId} is null or ${manuscripts.submitterId} <> ${actor.id}) and not exists (
    select 1 from ${conflicts} where ${conflicts.manuscriptId} = ${record.manuscriptId}
    and ${conflicts.personId} = ${actor.id} and ${conflicts.liftedAt} is null)`
}
