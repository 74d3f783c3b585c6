import type { RuleRow } from './finding'

/** Every rule, in the order in which findings of one severity on one page are listed. */
export const ruleTable: readonly RuleRow[] = []
