import { and, eq, inArray, isNull, ne, notExists, or, sql, type SQL } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { assignments, conflicts, manuscripts, rounds } from '@/db/schema'
import type { DocketFilter } from '@/lib/rules/docket'
import type { FullHouseRules } from '@/lib/rules/house-rules'
import type { Actor } from '@/lib/rules/roles'
import { getAllRules } from './rules-in-force'

/**
 * What the permission table says of one manuscript, as conditions on `manuscripts` joined with its current
 * round. A test holds both against each other, person by person.
 */
export type DocketScope = {
  seen: SQL
  asSubmitter: SQL
  asReviewer: SQL
  asEditor: SQL
  readsAudit: SQL
  knowsSubmitter: SQL
}

const never = sql`0`

export function getDocketScope(db: Reader, actor: Actor, as?: DocketFilter['as']): DocketScope {
  const plays = (role: 'submitter' | 'reviewer' | 'editor') =>
    actor.roles.includes(role) && (as === undefined || as === role)
  const barred = db
    .select({ one: sql`1` })
    .from(conflicts)
    .where(
      and(
        eq(conflicts.manuscriptId, manuscripts.id),
        eq(conflicts.personId, actor.id),
        isNull(conflicts.liftedAt),
      ),
    )
  const free = and(ne(manuscripts.state, 'draft'), ne(manuscripts.submitterId, actor.id), notExists(barred))
  const reviewed = (statuses: ('offered' | 'accepted' | 'done')[]) =>
    inArray(
      manuscripts.id,
      db
        .select({ id: assignments.manuscriptId })
        .from(assignments)
        .where(and(eq(assignments.reviewerId, actor.id), inArray(assignments.status, statuses))),
    )
  const given = (played: boolean, condition: SQL | undefined) => (played && condition) || never
  const asSubmitter = given(plays('submitter'), eq(manuscripts.submitterId, actor.id))
  const asReviewer = given(plays('reviewer'), and(reviewed(['offered', 'accepted', 'done']), free))
  const asEditor = given(plays('editor'), free)
  const rules = getAllRules(db)
  const open = versionsWhere(rules, (r) => r.submitterSeesAudit)
  const double = versionsWhere(rules, (r) => r.blinding === 'double')
  const doubleBlind = inArray(
    manuscripts.id,
    db.select({ id: rounds.manuscriptId }).from(rounds).where(inArray(rounds.houseRulesVersion, double)),
  )
  return {
    // Without the parts that are never: beside them SQLite would not take the index of the one that counts.
    seen: or(...[asSubmitter, asReviewer, asEditor].filter((part) => part !== never)) ?? never,
    asSubmitter,
    asReviewer,
    asEditor,
    readsAudit:
      or(
        asEditor,
        given(plays('reviewer'), and(reviewed(['accepted', 'done']), free)),
        and(asSubmitter, inArray(rounds.houseRulesVersion, open)),
      ) ?? never,
    knowsSubmitter: or(asEditor, asSubmitter, sql`not ${doubleBlind}`) ?? never,
  }
}

function versionsWhere(
  rules: ReadonlyMap<number, FullHouseRules>,
  holds: (r: FullHouseRules) => boolean,
): number[] {
  return [...rules].filter(([, r]) => holds(r)).map(([version]) => version)
}
