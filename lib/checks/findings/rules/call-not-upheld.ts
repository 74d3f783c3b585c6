import type { Bench, Case } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showDecision, showYardstick } from '../wording'

/** Major: a conclusion changes. Silent where nothing was corrected or claimed: that is a question of its own. */
function find({ cases }: Bench): Found[] {
  return cases.filter(({ family }) => family.outcome !== 'uncorrected').flatMap(inFamily)
}

function inFamily(judgedCase: Case): Found[] {
  const { comparisons, family, alpha, procedure } = judgedCase
  const wrong = comparisons.filter(({ called, significant }) => called === true && significant === false)
  const [first] = wrong
  if (!first) return []
  const values = listSome(wrong.map(showDecision))
  const implied = wrong.every((comparison) => comparison.implied) ? ' by the stated level' : ''
  return [
    {
      severity: 'major',
      family: family.id,
      reports: reportsOf(wrong),
      place: leadOf(first)?.place ?? null,
      says:
        procedure === 'raw'
          ? `${count(wrong.length)} called significant${implied} with a p-value at or above ${alpha}: ${values}.`
          : `${count(wrong.length)} called significant${implied}, but the adjusted p-value by ${showYardstick(judgedCase)} is not below ${alpha}: ${values}.`,
      asks: `Please align the statements on ${names(wrong.map(({ label }) => label))} with the adjusted values in text, tables and abstract, or describe the correction by which they stand.`,
      cites: ['sampl', ...citeFor(procedure)],
    },
  ]
}

function count(n: number): string {
  return n === 1 ? 'One comparison is' : `${n} comparisons are`
}

function names(labels: readonly string[]): string {
  return labels.length > 4 ? 'these comparisons' : labels.join(', ')
}

function citeFor(procedure: Case['procedure']): string[] {
  const key = {
    bonferroni: 'dunn',
    holm: 'holm',
    bh: 'benjamini-hochberg',
    tukey: 'tukey',
    dunnett: 'dunnett',
  }
  return procedure in key ? [key[procedure as keyof typeof key]] : []
}

export const callNotUpheld: RuleRow = {
  rule: 'call-not-upheld',
  says: 'called significant, is not after the claimed correction',
  find,
}
