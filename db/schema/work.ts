import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { EVENTS } from '@/lib/rules/events'
import { JOB_KINDS, JOB_STATUSES, MAIL_STATUSES } from '@/lib/rules/words'
import { at, id, json } from './columns'
import { manuscripts } from './manuscripts'

/** The outbox: a mail is written in the transaction that causes it and sent by the worker. */
export const mails = sqliteTable(
  'mails',
  {
    id: id(),
    manuscriptId: text('manuscript_id').references(() => manuscripts.id, { onDelete: 'set null' }),
    template: text('template').notNull(),
    recipient: text('recipient').notNull(),
    subject: text('subject').notNull(),
    text: text('text').notNull(),
    html: text('html').notNull(),
    /** Stable over retries, so that a receiver can tell a repeated mail. */
    messageId: text('message_id').notNull(),
    status: text('status', { enum: MAIL_STATUSES }).notNull(),
    attempts: integer('attempts').notNull().default(0),
    trouble: text('trouble'),
    createdAt: at('created_at').notNull(),
    sentAt: at('sent_at'),
  },
  (t) => [
    uniqueIndex('mails_message_id').on(t.messageId),
    index('mails_status_created').on(t.status, t.createdAt),
    index('mails_manuscript').on(t.manuscriptId),
  ],
)

/** The queue. A job is claimed with a lease; a worker that dies leaves the lease to run out. */
export const jobs = sqliteTable(
  'jobs',
  {
    id: id(),
    kind: text('kind', { enum: JOB_KINDS }).notNull(),
    /** What it is about: the audit's or the mail's id. One open job a kind and subject. */
    subjectId: text('subject_id').notNull(),
    status: text('status', { enum: JOB_STATUSES }).notNull(),
    attempts: integer('attempts').notNull().default(0),
    maxAttempts: integer('max_attempts').notNull(),
    runAt: at('run_at').notNull(),
    leaseUntil: at('lease_until'),
    leasedBy: text('leased_by'),
    trouble: text('trouble'),
    createdAt: at('created_at').notNull(),
    finishedAt: at('finished_at'),
  },
  (t) => [
    index('jobs_status_run_at').on(t.status, t.runAt),
    uniqueIndex('jobs_kind_subject').on(t.kind, t.subjectId),
  ],
)

/** Who did what and when. Append-only: triggers refuse update and delete. */
export const record = sqliteTable(
  'record',
  {
    sequence: integer('sequence').primaryKey({ autoIncrement: true }),
    at: at('at').notNull(),
    event: text('event', { enum: EVENTS }).notNull(),
    /** No foreign key: the record outlives what it speaks of. */
    actorId: text('actor_id').notNull(),
    actorName: text('actor_name').notNull(),
    manuscriptId: text('manuscript_id'),
    subject: text('subject'),
    detail: json('detail').notNull(),
  },
  (t) => [
    index('record_manuscript_at').on(t.manuscriptId, t.at),
    index('record_actor_at').on(t.actorId, t.at),
    index('record_event_at').on(t.event, t.at),
  ],
)
