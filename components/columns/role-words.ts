import type { NamedRole } from '@/lib/checks/vocabulary'

/** What a column holds, in plain words; the order is that of the list from which one chooses. */
export const roleWords: Record<NamedRole, string> = {
  'p-unadjusted': 'p-value, unadjusted',
  'p-adjusted': 'p-value, adjusted',
  p: 'p-value, scale not stated',
  t: 't statistic',
  F: 'F statistic',
  chi2: 'χ² statistic',
  z: 'z statistic',
  r: 'correlation r',
  'other-statistic': 'another statistic',
  df: 'degrees of freedom',
  'df-error': 'degrees of freedom, error',
  comparison: 'comparison of two groups',
  group: 'group',
  'second-group': 'second group',
  outcome: 'outcome',
  label: 'name of the row',
  n: 'number of observations (n)',
  mean: 'mean',
  sd: 'standard deviation',
  se: 'standard error',
  estimate: 'estimate or difference',
  interval: 'confidence interval',
  marks: 'marks (*, n.s.)',
  call: 'significant: yes or no',
  unused: 'not used',
}

export const roleOptions = (Object.keys(roleWords) as NamedRole[]).map((value) => ({
  value,
  label: roleWords[value],
}))

/** 'A' for the first column of a sheet, 'AB' for the 28th. */
export function letterOf(column: number): string {
  const last = String.fromCharCode(65 + (column % 26))
  return column < 26 ? last : letterOf(Math.floor(column / 26) - 1) + last
}
