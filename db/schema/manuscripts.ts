import { index, integer, real, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { STATES } from '@/lib/rules/states'
import { FILE_KINDS } from '@/lib/rules/words'
import { at, id, json } from './columns'
import { people } from './people'

export const houseRulesVersions = sqliteTable(
  'house_rules_versions',
  {
    version: integer('version').primaryKey({ autoIncrement: true }),
    body: json('body').notNull(),
    createdBy: text('created_by').references(() => people.id),
    createdAt: at('created_at').notNull(),
  },
  (t) => [index('house_rules_versions_created_by').on(t.createdBy)],
)

export const manuscripts = sqliteTable(
  'manuscripts',
  {
    id: id(),
    /** Shown to people, such as THC-2026-0012; null while a draft. */
    reference: text('reference'),
    submitterId: text('submitter_id')
      .notNull()
      .references(() => people.id),
    title: text('title').notNull().default(''),
    correspondingAuthor: text('corresponding_author').notNull().default(''),
    correspondingEmail: text('corresponding_email').notNull().default(''),
    state: text('state', { enum: STATES }).notNull(),
    stateSince: at('state_since').notNull(),
    currentRound: integer('current_round').notNull().default(1),
    createdAt: at('created_at').notNull(),
    receivedAt: at('received_at'),
    /** Due date of the assignment that is open, for the docket's order; null when nobody is due. */
    dueAt: at('due_at'),
  },
  (t) => [
    uniqueIndex('manuscripts_reference').on(t.reference),
    index('manuscripts_submitter_received').on(t.submitterId, t.receivedAt),
    index('manuscripts_state_since').on(t.state, t.stateSince),
    index('manuscripts_received').on(t.receivedAt),
    index('manuscripts_due').on(t.dueAt),
    index('manuscripts_title').on(t.title),
  ],
)

export const rounds = sqliteTable(
  'rounds',
  {
    id: id(),
    manuscriptId: text('manuscript_id')
      .notNull()
      .references(() => manuscripts.id, { onDelete: 'cascade' }),
    number: integer('number').notNull(),
    houseRulesVersion: integer('house_rules_version')
      .notNull()
      .references(() => houseRulesVersions.version),
    /** What the submitter says: alpha, what was corrected and how, which outcome is primary, a note. */
    alpha: real('alpha'),
    correction: text('correction').notNull().default(''),
    primaryOutcome: text('primary_outcome').notNull().default(''),
    note: text('note').notNull().default(''),
    openedAt: at('opened_at').notNull(),
    handedInAt: at('handed_in_at'),
    closedAt: at('closed_at'),
  },
  (t) => [
    uniqueIndex('rounds_manuscript_number').on(t.manuscriptId, t.number),
    index('rounds_house_rules_version').on(t.houseRulesVersion),
  ],
)

export const files = sqliteTable(
  'files',
  {
    id: id(),
    roundId: text('round_id')
      .notNull()
      .references(() => rounds.id, { onDelete: 'cascade' }),
    kind: text('kind', { enum: FILE_KINDS }).notNull(),
    name: text('name').notNull(),
    mediaType: text('media_type').notNull(),
    sha256: text('sha256').notNull(),
    bytes: integer('bytes').notNull(),
    uploadedBy: text('uploaded_by')
      .notNull()
      .references(() => people.id),
    createdAt: at('created_at').notNull(),
    /** A replaced file is kept; the newest one of a kind that is not replaced counts. */
    replacedAt: at('replaced_at'),
    /** Columns of a results table that a person named; null where nobody did. */
    columnRoles: json('column_roles'),
    /** Raised with every change of `columnRoles`, for two people at once. */
    columnRolesRevision: integer('column_roles_revision').notNull().default(0),
  },
  (t) => [
    index('files_round_kind').on(t.roundId, t.kind),
    index('files_sha256').on(t.sha256),
    index('files_uploaded_by').on(t.uploadedBy),
  ],
)
