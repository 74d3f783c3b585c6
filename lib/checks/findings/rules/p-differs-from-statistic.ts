import type { Bench } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { listChecked, type Checked } from '../recompute'
import { listSome, showRange, showReport, showStatistic } from '../wording'

/**
 * Major where printed and recomputed p lie on different sides of the level, else minor. Where most values that can be
 * checked differ, one question: then something else than the statistic printed lies behind them.
 */
function find(bench: Bench): Found[] {
  const checked = listChecked(bench)
  const off = checked.filter(({ verdict }) => verdict === 'differs')
  if (off.length >= 4 && off.length > checked.length / 2) return [asQuestion(off, checked.length)]
  return off.map((each) => toFound(each, bench))
}

function toFound({ report, statistic, computed, family }: Checked, { reading }: Bench): Found {
  const alpha = reading.alpha.value
  const crosses =
    (report.high <= alpha && computed.low > alpha) || (report.low >= alpha && computed.high < alpha)
  return {
    severity: crosses ? 'major' : 'minor',
    family,
    reports: [report.id],
    place: report.place,
    says: `${showStatistic(statistic)} corresponds to a ${hasSides(statistic) ? 'two-sided ' : ''}p-value of ${showRange(computed)}; printed is ${showReport(report)}.${crosses ? ` The two lie on different sides of ${alpha}.` : ''}`,
    asks: 'Please check the statistic, its degrees of freedom and the p-value, and say how the p-value was obtained if not from them.',
    cites: ['sampl', 'apa-7'],
  }
}

/** F and χ² have an upper tail alone. */
function hasSides({ test }: Checked['statistic']): boolean {
  return test !== 'F' && test !== 'chi2'
}

function asQuestion(off: readonly Checked[], of: number): Found {
  const examples = off.map(({ report, statistic }) => `${showStatistic(statistic)}, ${showReport(report)}`)
  return {
    severity: 'question',
    family: null,
    reports: off.map(({ report }) => report.id),
    place: off[0]?.report.place ?? null,
    says: `${off.length} of ${of} p-values do not follow from the statistic and degrees of freedom beside them: ${listSome(examples, 3)}.`,
    asks: 'Please describe how the p-values were obtained from the statistics (model, correction, exact or permutation test).',
    cites: ['sampl'],
  }
}

export const pDiffersFromStatistic: RuleRow = {
  rule: 'p-differs-from-statistic',
  says: 'the printed p does not follow from its statistic and degrees of freedom, either tail',
  find,
}
