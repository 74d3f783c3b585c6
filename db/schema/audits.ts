import { index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import {
  CALLS,
  CLAIMED_PROCEDURES,
  OUTCOMES,
  RELATIONS,
  RULES,
  SCALES,
  SEVERITIES,
  SOURCES,
  TESTS,
} from '@/lib/checks/vocabulary'
import { AUDIT_STATUSES } from '@/lib/rules/words'
import { at, id, json } from './columns'
import { rounds } from './manuscripts'

export const audits = sqliteTable(
  'audits',
  {
    id: id(),
    roundId: text('round_id')
      .notNull()
      .references(() => rounds.id, { onDelete: 'cascade' }),
    status: text('status', { enum: AUDIT_STATUSES }).notNull(),
    /** One of the engine's stages, and how far within it in [0, 1]. */
    stage: text('stage').notNull().default('opening'),
    progress: real('progress').notNull().default(0),
    /** What is wrong and what to do, when stuck. */
    trouble: text('trouble'),
    engine: text('engine'),
    pages: integer('pages'),
    title: text('title'),
    documentSha256: text('document_sha256'),
    tableFile: text('table_file'),
    tableRows: integer('table_rows'),
    tableSha256: text('table_sha256'),
    alpha: real('alpha'),
    alphaQuote: text('alpha_quote'),
    alphaPage: integer('alpha_page'),
    queuedAt: at('queued_at').notNull(),
    startedAt: at('started_at'),
    finishedAt: at('finished_at'),
  },
  (t) => [index('audits_round_queued').on(t.roundId, t.queuedAt)],
)

const auditId = () =>
  text('audit_id')
    .notNull()
    .references(() => audits.id, { onDelete: 'cascade' })

/** Where an item stands, flattened where it is searched; boxes are not. */
const place = {
  source: text('source', { enum: SOURCES }).notNull(),
  page: integer('page'),
  row: integer('row'),
  sheet: text('sheet'),
  quote: text('quote').notNull(),
  boxes: json('boxes').notNull(),
}

/** `key` is the id within the audit (r1, s1, c1, f1, …); `position` keeps the audit's order. */
const item = { auditId: auditId(), key: text('key').notNull(), position: integer('position').notNull() }

export const reports = sqliteTable(
  'reports',
  {
    ...item,
    ...place,
    relation: text('relation', { enum: RELATIONS }).notNull(),
    value: real('value').notNull(),
    decimals: integer('decimals').notNull(),
    low: real('low').notNull(),
    high: real('high').notNull(),
    scale: text('scale', { enum: SCALES }).notNull(),
    statistic: text('statistic'),
    comparisonA: text('comparison_a'),
    comparisonB: text('comparison_b'),
    called: text('called', { enum: CALLS }),
    family: text('family'),
  },
  (t) => [
    primaryKey({ columns: [t.auditId, t.key] }),
    index('reports_audit_position').on(t.auditId, t.position),
    index('reports_audit_family').on(t.auditId, t.family),
  ],
)

export const statistics = sqliteTable(
  'statistics',
  {
    ...item,
    ...place,
    test: text('test', { enum: TESTS }).notNull(),
    df: json('df').notNull(),
    value: real('value').notNull(),
    decimals: integer('decimals').notNull(),
    pLow: real('p_low'),
    pHigh: real('p_high'),
    report: text('report'),
  },
  (t) => [
    primaryKey({ columns: [t.auditId, t.key] }),
    index('statistics_audit_position').on(t.auditId, t.position),
  ],
)

export const claims = sqliteTable(
  'claims',
  {
    ...item,
    ...place,
    procedure: text('procedure', { enum: CLAIMED_PROCEDURES }).notNull(),
    m: integer('m'),
    alpha: real('alpha'),
    threshold: real('threshold'),
    groups: integer('groups'),
  },
  (t) => [
    primaryKey({ columns: [t.auditId, t.key] }),
    index('claims_audit_position').on(t.auditId, t.position),
  ],
)

export const families = sqliteTable(
  'families',
  {
    ...item,
    label: text('label').notNull(),
    members: json('members').notNull(),
    claim: text('claim'),
    groups: integer('groups'),
    mPrinted: integer('m_printed').notNull(),
    mClaimed: integer('m_claimed'),
    mDue: integer('m_due'),
    mWhy: text('m_why').notNull(),
    outcome: text('outcome', { enum: OUTCOMES }).notNull(),
    why: text('why').notNull(),
    decisions: json('decisions').notNull(),
    fits: json('fits').notNull(),
    /** How the decisions came about; null where the engine of the time did not say. */
    working: json('working'),
  },
  (t) => [
    primaryKey({ columns: [t.auditId, t.key] }),
    index('families_audit_position').on(t.auditId, t.position),
    index('families_outcome').on(t.outcome),
  ],
)

export const findings = sqliteTable(
  'findings',
  {
    ...item,
    rule: text('rule', { enum: RULES }).notNull(),
    severity: text('severity', { enum: SEVERITIES }).notNull(),
    family: text('family'),
    reports: json('reports').notNull(),
    place: json('place'),
    says: text('says').notNull(),
    asks: text('asks').notNull(),
    cites: json('cites').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.auditId, t.key] }),
    index('findings_audit_position').on(t.auditId, t.position),
    index('findings_rule').on(t.rule),
  ],
)
