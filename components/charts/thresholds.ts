import type { ClaimedProcedure } from '@/lib/checks/vocabulary'

/** The largest raw p-value that is significant at a rank, for the procedures whose thresholds are fixed in advance. */
type Threshold = (rank: number, m: number, alpha: number) => number

const holm: Threshold = (rank, m, alpha) => alpha / (m - rank + 1)
const harmonic = (m: number): number => {
  let sum = 0
  for (let i = 1; i <= m; i += 1) sum += 1 / i
  return sum
}

export const STEPPED = ['bonferroni', 'sidak', 'holm', 'holm-sidak', 'hochberg', 'bh', 'by'] as const
export type Stepped = (typeof STEPPED)[number]

export const thresholdOf: Record<Stepped, Threshold> = {
  bonferroni: (_rank, m, alpha) => alpha / m,
  sidak: (_rank, m, alpha) => -Math.expm1(Math.log1p(-alpha) / m),
  holm,
  'holm-sidak': (rank, m, alpha) => -Math.expm1(Math.log1p(-alpha) / (m - rank + 1)),
  hochberg: holm,
  bh: (rank, m, alpha) => (rank / m) * alpha,
  by: (rank, m, alpha) => ((rank / m) * alpha) / harmonic(m),
}

export const procedureNames: Record<ClaimedProcedure, string> = {
  bonferroni: 'Bonferroni',
  sidak: 'Šidák',
  holm: 'Holm',
  'holm-sidak': 'Holm–Šidák',
  hochberg: 'Hochberg',
  hommel: 'Hommel',
  bh: 'Benjamini–Hochberg',
  by: 'Benjamini–Yekutieli',
  bky: 'Benjamini–Krieger–Yekutieli',
  storey: 'Storey',
  tukey: 'Tukey',
  'games-howell': 'Games–Howell',
  dunnett: 'Dunnett',
  scheffe: 'Scheffé',
  dunn: 'Dunn',
  lsd: 'Fisher’s LSD',
  duncan: 'Duncan',
  snk: 'Student–Newman–Keuls',
  permutation: 'permutation',
  'single-step': 'single-step (max-T)',
  fdr: 'false discovery rate, procedure not named',
  unspecified: 'corrected, procedure not named',
  none: 'no correction',
}

/** Which step line stands for a claim: some have no thresholds of their own on the scale of raw p-values. */
export function steppedFor(procedure: ClaimedProcedure | null): Stepped | null {
  if (procedure === null) return null
  if (procedure === 'fdr') return 'bh'
  return STEPPED.find((one) => one === procedure) ?? null
}
