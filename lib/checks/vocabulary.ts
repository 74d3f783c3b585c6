/** Closed lists of the audit. Each feeds the types here, the database's columns and the input schemas. */

export const PROCEDURES = [
  'bonferroni',
  'sidak',
  'holm',
  'holm-sidak',
  'hochberg',
  'hommel',
  'bh',
  'by',
  'bky',
  'storey',
  'tukey',
  'games-howell',
  'dunnett',
  'scheffe',
  'dunn',
  'lsd',
  'duncan',
  'snk',
  'permutation',
  'single-step',
] as const
export type Procedure = (typeof PROCEDURES)[number]

/** Procedures that the engine computes but that no claim is read as. */
export const FURTHER_PROCEDURES = [
  'weighted-bonferroni',
  'weighted-holm',
  'shaffer',
  'fixed-sequence',
  'fallback',
  'graphical',
  'bky-unscaled',
  'tsbh',
  'fisher-hayter',
  'steel-dwass',
] as const
export const CATALOGUE = [...PROCEDURES, ...FURTHER_PROCEDURES] as const
export type CatalogueProcedure = (typeof CATALOGUE)[number]

export const CLAIMED_PROCEDURES = [...PROCEDURES, 'fdr', 'unspecified', 'none'] as const
export type ClaimedProcedure = (typeof CLAIMED_PROCEDURES)[number]

export const TESTS = ['t', 'F', 'chi2', 'z', 'r', 'other'] as const
export type Test = (typeof TESTS)[number]

export const RELATIONS = ['=', '<', '<=', '>', '>='] as const
export type Relation = (typeof RELATIONS)[number]

export const SCALES = ['raw', 'adjusted', 'unknown'] as const
export type Scale = (typeof SCALES)[number]

export const CALLS = ['significant', 'not significant'] as const
export type Call = (typeof CALLS)[number]

export const SOURCES = ['text', 'pdf-table', 'results-table'] as const
export type Source = (typeof SOURCES)[number]

/** What a person can say that a column of a results table holds. */
export const NAMED_ROLES = [
  'p',
  'p-unadjusted',
  'p-adjusted',
  't',
  'F',
  'chi2',
  'z',
  'r',
  'other-statistic',
  'df',
  'df-error',
  'comparison',
  'group',
  'second-group',
  'outcome',
  'label',
  'n',
  'mean',
  'sd',
  'se',
  'estimate',
  'interval',
  'marks',
  'call',
  'unused',
] as const
export type NamedRole = (typeof NAMED_ROLES)[number]

export const OUTCOMES = ['holds', 'fails', 'undecidable', 'uncorrected'] as const
export type Outcome = (typeof OUTCOMES)[number]

export const SEVERITIES = ['major', 'minor', 'question', 'note'] as const
export type Severity = (typeof SEVERITIES)[number]

export const RULES = [
  'call-not-upheld',
  'call-understated',
  'family-undercounted',
  'threshold-rounded-up',
  'adjustment-absent',
  'corrected-twice',
  'procedure-differs',
  'adjusted-below-raw',
  'adjusted-above-one',
  'comparisons-missing',
  'no-correction',
  'error-rate-mixed',
  'p-differs-from-statistic',
  'one-sided-unstated',
  'text-table-differ',
  'undecided-by-rounding',
  'p-out-of-range',
  'family-unclear',
  'unread-region',
  'procedure-unnamed',
  'procedure-does-not-control',
  'order-broken',
] as const
export type Rule = (typeof RULES)[number]
