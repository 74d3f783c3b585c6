import type { Tx } from '@/db/client'
import { findRulesInForce } from '@/db/queries/rules-in-force'
import { houseRulesVersions } from '@/db/schema'
import { defaultFullHouseRules } from '@/lib/rules/house-rules'

/** Version of the house rules in force. A round needs one to point at: the defaults become the first. */
export function holdHouseRules(tx: Tx, now: number): number {
  const inForce = findRulesInForce(tx)
  if (inForce) return inForce.version
  return tx
    .insert(houseRulesVersions)
    .values({ body: defaultFullHouseRules, createdBy: null, createdAt: now })
    .returning({ version: houseRulesVersions.version })
    .get().version
}
