import { desc, eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { houseRulesVersions, people } from '@/db/schema'
import { defaultFullHouseRules, type FullHouseRules } from '@/lib/rules/house-rules'
import { may } from '@/lib/rules/permissions'
import type { Actor } from '@/lib/rules/roles'
import { parseHouseRules } from './rules-in-force'

export type HouseRulesView = {
  /** 0 while nobody has decided anything and the defaults hold. */
  version: number
  rules: FullHouseRules
  createdBy: string | null
  createdAt: number | null
}

/** The version in force unless told. */
export function getHouseRules(db: Reader, actor: Actor, version?: number): HouseRulesView | null {
  if (!may(actor, 'house-rules.read')) return null
  const row = readVersions(db, version)[0]
  if (row) return row
  if (version !== undefined && version !== 0) return null
  return { version: 0, rules: defaultFullHouseRules, createdBy: null, createdAt: null }
}

/** Newest first. */
export function listHouseRules(db: Reader, actor: Actor): HouseRulesView[] {
  return may(actor, 'house-rules.read') ? readVersions(db) : []
}

function readVersions(db: Reader, version?: number): HouseRulesView[] {
  return db
    .select({
      version: houseRulesVersions.version,
      body: houseRulesVersions.body,
      createdBy: people.name,
      createdAt: houseRulesVersions.createdAt,
    })
    .from(houseRulesVersions)
    .leftJoin(people, eq(people.id, houseRulesVersions.createdBy))
    .where(version === undefined ? undefined : eq(houseRulesVersions.version, version))
    .orderBy(desc(houseRulesVersions.version))
    .all()
    .map(({ body, ...row }) => ({ ...row, rules: parseHouseRules(body) }))
}
