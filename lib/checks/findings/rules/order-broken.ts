import type { Bench, Case, Judged } from '../../families/case'
import { wordsOf } from '../../families/names'
import type { Found, RuleRow } from '../finding'
import { leadOf, listSome, reportsOf, showReport } from '../wording'

/** Major: a conclusion rests on a test that the stated order no longer allows. Silent where the order is not spelt out. */
function find({ cases, remarks }: Bench): Found[] {
  const { order } = remarks
  if (!order) return []
  return cases
    .filter(({ exemption }) => exemption === 'ordered')
    .flatMap((judged) => inFamily(judged, order.sentence))
}

function inFamily({ comparisons, alpha, family }: Case, sentence: string): Found[] {
  const ordered = inOrder(comparisons, sentence)
  const stop = ordered.findIndex(({ raw }) => raw !== null && raw.low >= alpha)
  const failed = ordered[stop]
  if (!failed) return []
  const later = ordered.slice(stop + 1).filter((each) => each.called === true && !isNominal(each))
  const [first] = later
  if (!first) return []
  const values = later.flatMap((each) => {
    const lead = leadOf(each)
    return lead ? [`${each.label} (${showReport(lead)})`] : []
  })
  const lead = leadOf(failed)
  return [
    {
      severity: 'major',
      family: family.id,
      reports: reportsOf([failed, ...later]),
      place: leadOf(first)?.place ?? null,
      says: `In the stated order testing ends at ${failed.label}${lead ? ` (${showReport(lead)})` : ''}; after it these are called significant: ${listSome(values)}.`,
      asks: `Please present the results after ${failed.label} as nominal, or describe the order that was fixed beforehand.`,
      cites: ['marcus-peritz-gabriel', 'fda-2022'],
    },
  ]
}

/** The comparisons that the sentence names, in its order. */
function inOrder(comparisons: readonly Judged[], sentence: string): Judged[] {
  const text = wordsOf(sentence.replace(/[,;:.]/g, ' ')).join(' ')
  return comparisons
    .map((comparison) => ({ comparison, at: text.indexOf(wordsOf(comparison.label).join(' ')) }))
    .filter(({ at }) => at >= 0)
    .sort((a, b) => a.at - b.at)
    .map(({ comparison }) => comparison)
}

function isNominal({ items }: Judged): boolean {
  return items.some(({ report }) => /\bnominal|\bexploratory|\bdescriptive/i.test(report.sentence))
}

export const orderBroken: RuleRow = {
  rule: 'order-broken',
  says: 'a hierarchical order is claimed and testing went on past its first failure',
  find,
}
