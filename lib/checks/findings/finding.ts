import type { Bench } from '../families/case'
import type { Finding } from '../types'
import type { Rule } from '../vocabulary'

/** What a rule finds, before it gets its name and its number. */
export type Found = Omit<Finding, 'id' | 'rule'>

/** `find`: every instance of the rule in what was read and judged, in the order of the manuscript. */
export type RuleRow = { rule: Rule; says: string; find: (bench: Bench) => Found[] }
