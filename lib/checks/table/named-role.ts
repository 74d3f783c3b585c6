import type { NamedRole, Test } from '../vocabulary'
import { fold } from '../extract/grammar/fold'
import { dfOfHead, lastPart, type ColumnRole } from './roles'

const STATISTICS: Partial<Record<NamedRole, Test>> = {
  t: 't',
  F: 'F',
  chi2: 'chi2',
  z: 'z',
  r: 'r',
  'other-statistic': 'other',
}

type PlainKind = Exclude<ColumnRole['kind'], 'p' | 'statistic' | 'df'>

const NAMES = {
  comparison: 'comparison',
  group: 'group',
  group2: 'second-group',
  outcome: 'outcome',
  label: 'label',
  n: 'n',
  mean: 'mean',
  sd: 'sd',
  se: 'se',
  estimate: 'estimate',
  ci: 'interval',
  stars: 'marks',
  call: 'call',
  other: 'unused',
} as const satisfies Record<PlainKind, NamedRole>

const KINDS = Object.fromEntries(Object.entries(NAMES).map(([kind, name]) => [name, kind])) as Record<
  (typeof NAMES)[PlainKind],
  PlainKind
>

/** The role that a person gave a column, with the degrees of freedom and the procedure that its head names. */
export function toColumnRole(named: NamedRole, header: string, found: ColumnRole): ColumnRole {
  const test = STATISTICS[named]
  if (test) return { kind: 'statistic', test, df: dfOfHead(lastPart(fold(header).trim()), test) }
  if (named === 'p' || named === 'p-unadjusted') {
    return { kind: 'p', scale: named === 'p' ? 'unknown' : 'raw', procedure: null }
  }
  if (named === 'p-adjusted') {
    return { kind: 'p', scale: 'adjusted', procedure: found.kind === 'p' ? found.procedure : null }
  }
  if (named === 'df' || named === 'df-error') return { kind: 'df', index: named === 'df' ? 0 : 1 }
  return { kind: KINDS[named as keyof typeof KINDS] }
}

/** The name for a role that was found: the other way round of `toColumnRole`. */
export function nameRole(role: ColumnRole): NamedRole {
  if (role.kind === 'p') {
    return role.scale === 'raw' ? 'p-unadjusted' : role.scale === 'adjusted' ? 'p-adjusted' : 'p'
  }
  if (role.kind === 'statistic') return role.test === 'other' ? 'other-statistic' : role.test
  if (role.kind === 'df') return role.index === 0 ? 'df' : 'df-error'
  return NAMES[role.kind]
}
