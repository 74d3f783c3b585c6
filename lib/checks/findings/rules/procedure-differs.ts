import { worksOnP, worksOnT } from '../../families/adjusted'
import type { Bench, Case } from '../../families/case'
import { expectAdjusted, independentRaw } from '../../families/evidence'
import { combine, overlaps, type Interval } from '../../families/interval'
import { countCalls, nameOf } from '../../families/outcome'
import { fits } from '../../recover/fits'
import type { Fit } from '../../types'
import { PROCEDURES, type Procedure } from '../../vocabulary'
import type { Found, RuleRow } from '../finding'
import { capitalise, leadOf, listSome, reportsOf, showRange, showReport } from '../wording'
import { listBelowRaw } from './adjusted-below-raw'

/** Major where a call depends on it, else minor where another procedure fits, else a question. */
function find({ cases }: Bench): Found[] {
  return cases.flatMap(inFamily)
}

type Pair = { at: number; printed: Interval; raw: Interval }

function inFamily(judged: Case): Found[] {
  const { assigned, family, comparisons, design, series } = judged
  const claimed = PROCEDURES.find((name): name is Procedure => name === assigned?.view.procedure) ?? null
  if (!assigned || !claimed || claimed === 'lsd' || (!worksOnP(claimed) && !worksOnT(claimed))) return []
  // values that turned out to be raw are found as adjustment-absent
  if (
    series.some(
      ({ presented, is, source }) => source !== 'results-table' && presented !== 'raw' && is === 'raw',
    )
  )
    return []
  const pairs = listPairs(judged)
  if (pairs.length < 2) return []
  const counts = [...new Set([assigned.view.m, design.due, ...design.alternatives])].flatMap((m) => m ?? [])
  const groups = Math.max(design.groups.length, assigned.view.groups ?? 0)
  const expected = expectAdjusted(
    comparisons,
    claimed,
    counts.length > 0 ? counts : [comparisons.length],
    groups,
    judged.alpha,
  )
  const loose = worksOnT(claimed) ? 0.15 : 0.001
  const offBy = expected.map(({ ranges }) =>
    pairs.filter((pair) => !agrees(pair, ranges[pair.at] ?? null, loose)),
  )
  const off = offBy.sort((a, b) => a.length - b.length)[0] ?? []
  if (off.length === 0 || isStepwiseWithoutOrder(claimed, pairs, counts)) return []
  const other = findOther(pairs, comparisons.length, claimed)
  const { wrong } = countCalls(comparisons)
  const [first] = off
  const concerned = off.flatMap(({ at }) => comparisons[at] ?? [])
  const entries = off.flatMap(({ at }) => {
    const comparison = comparisons[at]
    const lead = comparison && leadOf(comparison)
    const range = expected[0]?.ranges[at]
    return comparison && lead && range
      ? [`${comparison.label}: printed ${showReport(lead)}, ${nameOf(claimed)} gives ${showRange(range)}`]
      : []
  })
  const follows = other ? ` The printed values are those of ${describe(other)}.` : ''
  return [
    {
      severity: wrong > 0 ? 'major' : other ? 'minor' : 'question',
      family: family.id,
      reports: reportsOf(concerned),
      place:
        (first && comparisons[first.at] && leadOf(comparisons[first.at] ?? { items: [] })?.place) ??
        assigned.view.lead.place,
      says: `${capitalise(nameOf(claimed))} is named; ${off.length} of the ${pairs.length} adjusted values that can be checked ${off.length === 1 ? 'does' : 'do'} not follow from it: ${listSome(entries, 4)}.${follows}`,
      asks: 'Please check the adjusted values or name the procedure and the number of tests that were used.',
      cites: ['sampl', 'jars-quant'],
    },
  ]
}

/** Comparisons with a printed adjusted value and a raw p from elsewhere; values below their raw p are found as such. */
function listPairs(judged: Case): Pair[] {
  const below = new Set(listBelowRaw(judged).map(({ comparison }) => comparison.key))
  return judged.comparisons.flatMap((comparison, at) => {
    const known = combine(independentRaw(comparison))
    if (!comparison.printed || !known || known.conflict || below.has(comparison.key)) return []
    return [{ at, printed: comparison.printed, raw: known.range }]
  })
}

function agrees({ printed }: Pair, range: Interval | null, loose: number): boolean {
  return range === null || overlaps(printed, { low: range.low * (1 - loose), high: range.high * (1 + loose) })
}

/** Step-down multiples printed without carrying the largest forward are not another procedure. */
function isStepwiseWithoutOrder(
  claimed: Procedure,
  pairs: readonly Pair[],
  counts: readonly number[],
): boolean {
  if (claimed !== 'holm' && claimed !== 'holm-sidak') return false
  const sorted = [...pairs].sort((a, b) => a.raw.low - b.raw.low)
  return counts.some((m) =>
    sorted.every(({ printed, raw }, i) =>
      overlaps(printed, { low: Math.min(1, (m - i) * raw.low), high: Math.min(1, (m - i) * raw.high) }),
    ),
  )
}

/** Another procedure or another m that reproduces every value; the plainest of several. */
function findOther(pairs: readonly Pair[], size: number, claimed: Procedure): Fit | null {
  const found = fits(
    pairs.map(({ printed }) => printed),
    pairs.map(({ raw }) => raw),
    { mMax: Math.max(60, size) },
  ).filter(({ procedure }) => procedure !== 'raw')
  const atSize = found.find(({ m }) => m === size)
  return found.find(({ procedure, m }) => procedure === claimed && m !== size) ?? atSize ?? found[0] ?? null
}

function describe({ procedure, m }: Fit): string {
  return procedure === 'raw' ? 'no adjustment' : `${nameOf(procedure)} with m = ${m}`
}

export const procedureDiffers: RuleRow = {
  rule: 'procedure-differs',
  says: 'the printed values follow another procedure or another m than claimed',
  find,
}
