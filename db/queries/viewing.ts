import { and, asc, eq, inArray, isNotNull, or } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { assignments, houseRulesVersions, manuscripts, rounds } from '@/db/schema'
import { may, type Permission, type Standing } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { getSight, strictest, type PersonRef, type Sight } from '@/lib/rules/sight'
import type { State } from '@/lib/rules/states'
import type { Blinding, FileKind } from '@/lib/rules/words'
import { parseHouseRules } from './rules-in-force'
import { getStanding } from './standing'

/** One manuscript as one person may look at it. */
export type Viewing = {
  manuscript: { id: string; state: State; currentRound: number }
  standing: Standing
  sight: Sight
  blinding: Blinding
}

/** Null where the actor does not have the permission here: then there is nothing for them. */
export function findViewing(
  db: Reader,
  actor: Actor,
  manuscriptId: string,
  permission: Permission = 'manuscript.see',
): Viewing | null {
  const standing = getStanding(db, actor, manuscriptId)
  const sight = getSight(actor, standing)
  if (sight === null || !may(actor, permission, standing)) return null
  const manuscript = db
    .select({ id: manuscripts.id, state: manuscripts.state, currentRound: manuscripts.currentRound })
    .from(manuscripts)
    .where(eq(manuscripts.id, manuscriptId))
    .get()
  if (!manuscript) return null
  return { manuscript, standing, sight, blinding: getBlinding(db, manuscriptId) }
}

/** The strictest of its rounds' rules: a name that was hidden once stays hidden. */
export function getBlinding(db: Reader, manuscriptId: string): Blinding {
  const versions = db
    .selectDistinct({ body: houseRulesVersions.body })
    .from(rounds)
    .innerJoin(houseRulesVersions, eq(houseRulesVersions.version, rounds.houseRulesVersion))
    .where(eq(rounds.manuscriptId, manuscriptId))
    .all()
  return strictest(versions.map(({ body }) => parseHouseRules(body).blinding))
}

/**
 * For each manuscript, what its reviewers are called where their names are hidden: "Reviewer 1" for the first
 * who accepted, the same in every round.
 */
export function listPseudonyms(
  db: Reader,
  manuscriptIds: readonly string[],
): Map<string, Map<string, string>> {
  if (manuscriptIds.length === 0) return new Map()
  const rows = db
    .select({ manuscriptId: assignments.manuscriptId, reviewerId: assignments.reviewerId })
    .from(assignments)
    .where(
      and(
        inArray(assignments.manuscriptId, [...manuscriptIds]),
        or(
          inArray(assignments.status, ['accepted', 'done']),
          and(eq(assignments.status, 'ended'), isNotNull(assignments.answeredAt)),
        ),
      ),
    )
    .orderBy(asc(assignments.createdAt), asc(assignments.id))
    .all()
  const all = new Map<string, Map<string, string>>()
  for (const { manuscriptId, reviewerId } of rows) {
    const names = all.get(manuscriptId) ?? new Map<string, string>()
    if (!names.has(reviewerId)) names.set(reviewerId, `Reviewer ${names.size + 1}`)
    all.set(manuscriptId, names)
  }
  return all
}

/** A person as they may be shown where reviewers' names are hidden; null for a reviewer without a number yet. */
export function hideReviewer(
  person: { id: string; name: string },
  names: ReadonlyMap<string, string> | undefined,
): PersonRef {
  const name = names?.get(person.id)
  return name === undefined ? person : { id: null, name }
}

/** A file's name where it may tell who the authors are. */
export function hideFileName(kind: FileKind, name: string): string {
  // The ending alone, such as ".xlsx".
  const ending = /\.[a-z0-9]{1,5}$/i.exec(name)?.[0].toLowerCase() ?? ''
  if (kind === 'table') return `table${ending}`
  return ending === '.docx' ? 'manuscript.docx' : 'manuscript.pdf'
}
