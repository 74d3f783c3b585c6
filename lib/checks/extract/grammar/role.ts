import type { ReadReport } from '../../types'
import type { PrintedStatistic } from './statistic'

type Role = ReadReport['role']

/** Tests of assumptions: 'Shapiro–Wilk', 'Levene', 'did not depart from the normal distribution', 'sphericity'. */
const ASSUMPTION =
  /shapiro|levene|mauchly|bartlett|brown[-–\s]forsythe|kolmogorov|anderson[-–\s]darling|breusch|durbin|hosmer|normality|normal(?:ly)?\sdistribut|non-?normal|homogene\w+ of (?:the\s)?(?:variance|slopes)|homoscedastic|heteroscedastic|sphericity|equal(?:ity of)? variances?|proportional[\s-]hazards?|residuals|(?:depart|deviat)\w*\s(?:\w+\s)*from\s(?:the\s)?normal/i

/** 'at baseline', 'initial values, taken before anything was done', 'did not differ at entry'. */
const BASELINE =
  /\b(?:at|the) (?:baseline|outset|entry|enrolment|enrollment|randomi[sz]ation|inclusion|start of the (?:study|trial|experiment))\b|\bbaseline (?:characteristics|values?|data|demograph\w*|differences?|variables|measure\w*|scores?)\b|\binitial (?:values?|weights?|body weights?|measure\w*|readings)\b|\bbefore (?:anything|the (?:experiment|trial|treatment|intervention|study)|treatment|intervention|randomi[sz]ation)\b|\bdemographic/i

const INTERACTION = /\binteractions?\b|\bmoderat(?:ed|ion)\b|[A-Za-z]\s?[×]\s?[A-Za-z]/i

/** 'main effect of', 'overall effect', 'one-way ANOVA', 'Kruskal–Wallis', 'Treatment affected', 'omnibus'. */
const OMNIBUS =
  /\b(?:main effects?|overall|omnibus|global (?:test|effect|difference)|anova|ancova|manova|analysis of (?:co)?variance|kruskal|friedman|likelihood ratio|model fit|better fit|one-way|two-way|across (?:the\s)?(?:groups|treatments|conditions)|between (?:the )?(?:three|four|five|six|seven|eight) )/i

/**
 * What a p-value in running text is the result of, from its clause and statistic. 'comparison' is a member of a
 * family; the others are not. Without any cue: 'comparison' where a pair or a one-degree statistic is printed.
 */
export function findRole(
  clause: string,
  statistic: PrintedStatistic | null,
  of: string | null,
  hasPair: boolean,
): Role {
  if (ASSUMPTION.test(clause)) return 'assumption'
  if (BASELINE.test(clause)) return 'baseline'
  if (of === 'interaction' || (INTERACTION.test(clause) && !hasPair)) return 'interaction'
  if (of === 'trend' || of === 'heterogeneity') return 'other'
  const numerator = statistic?.test === 'F' || statistic?.test === 'chi2' ? (statistic.df[0] ?? null) : null
  if (numerator !== null && numerator > 1) return 'omnibus'
  if (statistic?.test === 'other' && /^[HQ]$|kruskal|friedman/i.test(clause) && !hasPair) return 'omnibus'
  if (OMNIBUS.test(clause) && !hasPair && statistic?.test !== 't' && statistic?.test !== 'z') return 'omnibus'
  return 'comparison'
}
