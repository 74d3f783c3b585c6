import type { Reader } from '@/db/client'
import type { Event } from '@/lib/rules/events'
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

/** Newest first. Lines on manuscripts are for editors who may see them; administrators get the others. */
export function listRecord(_db: Reader, _actor: Actor, _filter: RecordFilter = {}): RecordPage {
  throw new Error('not yet')
}
