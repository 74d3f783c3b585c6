import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { RULES, SEVERITIES } from '@/lib/checks/vocabulary'
import {
  ASSIGNMENT_STATUSES,
  AUDIENCES,
  CHANGE_KINDS,
  COMMENT_TARGETS,
  POINT_STATUSES,
  VERDICT_STATUSES,
  VERDICTS,
} from '@/lib/rules/words'
import { audits } from './audits'
import { at, id, json } from './columns'
import { manuscripts, rounds } from './manuscripts'
import { people } from './people'

const roundId = () =>
  text('round_id')
    .notNull()
    .references(() => rounds.id, { onDelete: 'cascade' })
const manuscriptId = () =>
  text('manuscript_id')
    .notNull()
    .references(() => manuscripts.id, { onDelete: 'cascade' })
const personId = (name: string) =>
  text(name)
    .notNull()
    .references(() => people.id)

export const assignments = sqliteTable(
  'assignments',
  {
    id: id(),
    manuscriptId: manuscriptId(),
    roundId: roundId(),
    reviewerId: personId('reviewer_id'),
    assignedBy: personId('assigned_by'),
    status: text('status', { enum: ASSIGNMENT_STATUSES }).notNull(),
    reason: text('reason').notNull().default(''),
    dueAt: at('due_at').notNull(),
    createdAt: at('created_at').notNull(),
    answeredAt: at('answered_at'),
    endedAt: at('ended_at'),
  },
  (t) => [
    index('assignments_reviewer_status_due').on(t.reviewerId, t.status, t.dueAt),
    index('assignments_manuscript_status').on(t.manuscriptId, t.status),
    index('assignments_round').on(t.roundId),
    index('assignments_assigned_by').on(t.assignedBy),
  ],
)

export const conflicts = sqliteTable(
  'conflicts',
  {
    id: id(),
    manuscriptId: manuscriptId(),
    personId: personId('person_id'),
    declaredBy: personId('declared_by'),
    reason: text('reason').notNull(),
    createdAt: at('created_at').notNull(),
    liftedAt: at('lifted_at'),
    liftedBy: text('lifted_by').references(() => people.id),
  },
  (t) => [
    index('conflicts_manuscript_person').on(t.manuscriptId, t.personId),
    index('conflicts_person').on(t.personId),
    index('conflicts_declared_by').on(t.declaredBy),
    index('conflicts_lifted_by').on(t.liftedBy),
  ],
)

/** The reviewer's changes to an audit, in order; undoing one sets `undoneAt`. */
export const changes = sqliteTable(
  'changes',
  {
    id: id(),
    auditId: text('audit_id')
      .notNull()
      .references(() => audits.id, { onDelete: 'cascade' }),
    personId: personId('person_id'),
    kind: text('kind', { enum: CHANGE_KINDS }).notNull(),
    targetKey: text('target_key').notNull(),
    before: json('before'),
    after: json('after'),
    reason: text('reason').notNull().default(''),
    createdAt: at('created_at').notNull(),
    undoneAt: at('undone_at'),
  },
  (t) => [index('changes_audit_created').on(t.auditId, t.createdAt), index('changes_person').on(t.personId)],
)

/** A point for the letter: a finding of the audit as the reviewer left it, or one of their own. */
export const points = sqliteTable(
  'points',
  {
    id: id(),
    roundId: roundId(),
    auditId: text('audit_id').references(() => audits.id, { onDelete: 'set null' }),
    /** Key of the finding it came from, null for the reviewer's own. */
    findingKey: text('finding_key'),
    rule: text('rule', { enum: RULES }),
    familyKey: text('family_key'),
    familyLabel: text('family_label').notNull().default(''),
    status: text('status', { enum: POINT_STATUSES }).notNull(),
    reason: text('reason').notNull().default(''),
    severity: text('severity', { enum: SEVERITIES }).notNull(),
    /** To the reviewer, as the audit put it. */
    says: text('says').notNull().default(''),
    /** To the authors, as it will stand in the letter. */
    asks: text('asks').notNull(),
    quote: text('quote').notNull().default(''),
    page: integer('page'),
    /** Where it stands in the results table, 1-based, instead of a page. */
    row: integer('row'),
    sheet: text('sheet'),
    cites: json('cites').notNull(),
    position: integer('position').notNull(),
    decidedBy: text('decided_by').references(() => people.id),
    decidedAt: at('decided_at'),
  },
  (t) => [
    index('points_round_position').on(t.roundId, t.position),
    uniqueIndex('points_audit_finding').on(t.auditId, t.findingKey),
    index('points_decided_by').on(t.decidedBy),
    index('points_rule_status').on(t.rule, t.status),
  ],
)

export const comments = sqliteTable(
  'comments',
  {
    id: id(),
    roundId: roundId(),
    authorId: personId('author_id'),
    audience: text('audience', { enum: AUDIENCES }).notNull(),
    target: text('target', { enum: COMMENT_TARGETS }).notNull(),
    /** Key of the family, finding or report within the audit; null on the whole or on a place. */
    targetKey: text('target_key'),
    targetLabel: text('target_label').notNull().default(''),
    page: integer('page'),
    boxes: json('boxes'),
    parentId: text('parent_id'),
    body: text('body').notNull(),
    createdAt: at('created_at').notNull(),
    changedAt: at('changed_at'),
    resolvedAt: at('resolved_at'),
    resolvedBy: text('resolved_by').references(() => people.id),
  },
  (t) => [
    index('comments_round_created').on(t.roundId, t.createdAt),
    index('comments_author').on(t.authorId),
    index('comments_parent').on(t.parentId),
    index('comments_resolved_by').on(t.resolvedBy),
  ],
)

export const verdicts = sqliteTable(
  'verdicts',
  {
    id: id(),
    roundId: roundId(),
    reviewerId: personId('reviewer_id'),
    verdict: text('verdict', { enum: VERDICTS }).notNull(),
    /** To the editor, never to the authors. */
    remark: text('remark').notNull().default(''),
    effortMinutes: integer('effort_minutes'),
    /** The letter as it stands, Markdown. */
    body: text('body').notNull(),
    status: text('status', { enum: VERDICT_STATUSES }).notNull(),
    sentBackReason: text('sent_back_reason').notNull().default(''),
    draftedAt: at('drafted_at').notNull(),
    changedAt: at('changed_at').notNull(),
    releasedAt: at('released_at'),
    releasedBy: text('released_by').references(() => people.id),
  },
  (t) => [
    uniqueIndex('verdicts_round').on(t.roundId),
    index('verdicts_reviewer').on(t.reviewerId),
    index('verdicts_released_by').on(t.releasedBy),
  ],
)

/** What was sent, as it was sent. A correction is a new version. */
export const letters = sqliteTable(
  'letters',
  {
    id: id(),
    verdictId: text('verdict_id')
      .notNull()
      .references(() => verdicts.id, { onDelete: 'cascade' }),
    version: integer('version').notNull(),
    verdict: text('verdict', { enum: VERDICTS }).notNull(),
    subject: text('subject').notNull(),
    body: text('body').notNull(),
    html: text('html').notNull(),
    text: text('text').notNull(),
    sentAt: at('sent_at').notNull(),
    sentBy: personId('sent_by'),
  },
  (t) => [
    uniqueIndex('letters_verdict_version').on(t.verdictId, t.version),
    index('letters_sent_by').on(t.sentBy),
  ],
)

/** The authors' answer to one point. */
export const answers = sqliteTable(
  'answers',
  {
    id: id(),
    pointId: text('point_id')
      .notNull()
      .references(() => points.id, { onDelete: 'cascade' }),
    authorId: personId('author_id'),
    body: text('body').notNull(),
    createdAt: at('created_at').notNull(),
    changedAt: at('changed_at'),
  },
  (t) => [uniqueIndex('answers_point').on(t.pointId), index('answers_author').on(t.authorId)],
)
