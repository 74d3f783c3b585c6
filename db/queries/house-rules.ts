import type { Reader } from '@/db/client'
import type { FullHouseRules } from '@/lib/rules/house-rules'
import type { Actor } from '@/lib/rules/roles'

export type HouseRulesView = {
  /** 0 while nobody has decided anything and the defaults hold. */
  version: number
  rules: FullHouseRules
  createdBy: string | null
  createdAt: number | null
}

/** The version in force unless told. */
export function getHouseRules(_db: Reader, _actor: Actor, _version?: number): HouseRulesView | null {
  throw new Error('not yet')
}

/** Newest first. */
export function listHouseRules(_db: Reader, _actor: Actor): HouseRulesView[] {
  throw new Error('not yet')
}
