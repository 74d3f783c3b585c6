import type { Bench } from '../../families/case'
import type { Found, RuleRow } from '../finding'
import { listChecked, type Checked } from '../recompute'
import { listSome, showRange, showReport, showStatistic } from '../wording'

/** One finding a family. Major where a call does not stand two-sided, else a question. */
function find(bench: Bench): Found[] {
  const checked = listChecked(bench)
  const half = checked.filter(({ verdict }) => verdict === 'one-sided')
  return [...new Set(half.map(({ family }) => family))].map((family) =>
    toFound(
      half.filter((each) => each.family === family),
      family,
      bench,
    ),
  )
}

function toFound(half: readonly Checked[], family: string | null, { cases }: Bench): Found {
  const judged = cases.find((each) => each.family.id === family)
  const ids = new Set(half.map(({ report }) => report.id))
  const changes = judged?.comparisons.some(
    ({ items, called, significant }) =>
      called === true && significant === false && items.some(({ report }) => ids.has(report.id)),
  )
  const entries = half.map(
    ({ report, statistic, computed }) =>
      `${showStatistic(statistic)}: two-sided ${showRange(computed)}, printed ${showReport(report)}`,
  )
  return {
    severity: changes && judged?.family.outcome === 'fails' ? 'major' : 'question',
    family,
    reports: [...ids],
    place: half[0]?.report.place ?? null,
    says: `${half.length === 1 ? 'One p-value follows from its statistic' : `${half.length} p-values follow from their statistics`} only as one-sided, and one-sided tests are not mentioned: ${listSome(entries)}.`,
    asks: 'Please state whether the tests were one-sided and why, or give two-sided p-values.',
    cites: ['sampl'],
  }
}

export const oneSidedUnstated: RuleRow = {
  rule: 'one-sided-unstated',
  says: 'it follows only as a one-sided p, which is not stated',
  find,
}
