import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { PERSON_STATUSES, ROLES } from '@/lib/rules/roles'
import { LINK_PURPOSES } from '@/lib/rules/words'
import { at, id } from './columns'

export const people = sqliteTable(
  'people',
  {
    id: id(),
    email: text('email').notNull(),
    name: text('name').notNull(),
    affiliation: text('affiliation').notNull().default(''),
    expertise: text('expertise').notNull().default(''),
    status: text('status', { enum: PERSON_STATUSES }).notNull(),
    passwordHash: text('password_hash'),
    createdAt: at('created_at').notNull(),
  },
  (t) => [uniqueIndex('people_email').on(t.email), index('people_status_name').on(t.status, t.name)],
)

export const personRoles = sqliteTable(
  'person_roles',
  {
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    role: text('role', { enum: ROLES }).notNull(),
  },
  (t) => [primaryKey({ columns: [t.personId, t.role] }), index('person_roles_role').on(t.role)],
)

export const sessions = sqliteTable(
  'sessions',
  {
    id: id(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    createdAt: at('created_at').notNull(),
    seenAt: at('seen_at').notNull(),
    expiresAt: at('expires_at').notNull(),
    revokedAt: at('revoked_at'),
    agent: text('agent').notNull().default(''),
  },
  (t) => [index('sessions_person').on(t.personId)],
)

/** Links sent by mail. Only the hash of the token is kept; a link works once and until it expires. */
export const mailedLinks = sqliteTable(
  'mailed_links',
  {
    id: id(),
    purpose: text('purpose', { enum: LINK_PURPOSES }).notNull(),
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    tokenHash: text('token_hash').notNull(),
    createdAt: at('created_at').notNull(),
    expiresAt: at('expires_at').notNull(),
    usedAt: at('used_at'),
  },
  (t) => [uniqueIndex('mailed_links_token').on(t.tokenHash), index('mailed_links_person').on(t.personId)],
)

/** Tries to sign in, for the limit of their rate. `key` is a hash of the address or of the network address. */
export const signInTries = sqliteTable(
  'sign_in_tries',
  {
    id: integer('id').primaryKey({ autoIncrement: true }),
    key: text('key').notNull(),
    at: at('at').notNull(),
  },
  (t) => [index('sign_in_tries_key_at').on(t.key, t.at)],
)
