import { desc, eq } from 'drizzle-orm'
import type { Reader } from '@/db/client'
import { houseRulesVersions } from '@/db/schema'
import { defaultFullHouseRules, houseRulesSchema, type FullHouseRules } from '@/lib/rules/house-rules'

const columns = {
  version: houseRulesVersions.version,
  body: houseRulesVersions.body,
  createdBy: houseRulesVersions.createdBy,
  createdAt: houseRulesVersions.createdAt,
}

/** What a version decided; what it did not know of yet is as by default. */
export function parseHouseRules(body: unknown): FullHouseRules {
  return houseRulesSchema.parse({ ...defaultFullHouseRules, ...(body as object) })
}

/** The newest version; null while nobody has decided anything. */
export function findRulesInForce(db: Reader) {
  const row = db
    .select(columns)
    .from(houseRulesVersions)
    .orderBy(desc(houseRulesVersions.version))
    .limit(1)
    .get()
  return row ? { ...row, rules: parseHouseRules(row.body) } : null
}

/** The rules that a round is judged by. */
export function getRulesOf(db: Reader, version: number): FullHouseRules {
  const row = db.select(columns).from(houseRulesVersions).where(eq(houseRulesVersions.version, version)).get()
  if (!row) throw new Error(`there is no version ${version} of the house rules`)
  return parseHouseRules(row.body)
}

/** Every version's rules; there are as many as a house changed its mind. */
export function getAllRules(db: Reader): Map<number, FullHouseRules> {
  const rows = db.select(columns).from(houseRulesVersions).all()
  return new Map(rows.map((row) => [row.version, parseHouseRules(row.body)]))
}
