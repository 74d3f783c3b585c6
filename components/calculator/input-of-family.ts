import { listComputable } from '@/lib/checks/calculate/calculate'
import type { Claim, Family, Report, Statistic } from '@/lib/checks/types'
import type { Test } from '@/lib/checks/vocabulary'
import { printedP } from '../charts/printed-p'
import { emptyInput, type CalculatorInput } from './calculator-input'

type FamilyParts = {
  family: Family
  claim: Claim | null
  alpha: number
  reports: ReadonlyMap<string, Report>
  statistics: ReadonlyMap<string, Statistic>
}

/**
 * A family of an audit as a list for the calculator: each comparison with its raw p-value, its statistic and its
 * adjusted p-value as they are printed, the level, the m that is due and the procedure that is claimed. `left` names the
 * comparisons of which only an adjusted value is printed: they cannot be corrected anew.
 */
export function inputOfFamily(parts: FamilyParts): { input: CalculatorInput; left: string[] } {
  const { family, claim, alpha } = parts
  const lines: string[] = []
  const left: string[] = []
  for (const { report: id } of family.decisions) {
    const report = parts.reports.get(id)
    if (!report) continue
    const name = nameOf(report)
    const line = writeLine(report, parts)
    if (line === null) left.push(name)
    else lines.push(`${name}: ${line}`)
  }
  const due = family.m.due
  const computable = listComputable()
  const claimed = computable.find((procedure) => procedure === claim?.procedure)
  const procedure = claimed ?? 'bonferroni'
  return {
    left,
    input: {
      ...emptyInput,
      values: lines.join('\n'),
      alpha: String(alpha),
      m: due !== null && due > lines.length ? String(due) : '',
      procedure,
      beside: (['bonferroni', 'holm', 'bh'] as const).filter((one) => one !== procedure),
      groupCount: family.groups === null ? '' : String(family.groups),
    },
  }
}

/** Signs that would be read as part of a number are taken out of a name. */
function nameOf(report: Report): string {
  const { page, row } = report.place
  const where = page !== null ? `on page ${page}` : row !== null ? `in row ${row}` : 'without a place'
  const name = report.comparison?.join(' – ') ?? where
  return name
    .replace(/[=<>≤≥;:|\n\t]+/g, ' ')
    .replace(/\s+/g, ' ')
    .trim()
}

/** What is printed of one comparison, in its report and in those beside it; null without a raw value. */
function writeLine(report: Report, { family, reports, statistics }: FamilyParts): string | null {
  const key = keyOf(report)
  const beside =
    key === null
      ? []
      : [...reports.values()].filter(
          (other) => other !== report && other.family === family.id && keyOf(other) === key,
        )
  const all = [report, ...beside]
  const raw = all.find((one) => one.scale === 'raw') ?? (report.scale === 'unknown' ? report : undefined)
  const adjusted = all.find((one) => one.scale === 'adjusted')
  const statistic = all
    .map((one) => (one.statistic === null ? null : writeStatistic(statistics.get(one.statistic))))
    .find((text) => text !== null)
  if (!raw && !statistic) return null
  return [
    statistic ?? null,
    raw ? `p ${withRelation(raw)}` : null,
    adjusted ? `adjusted p ${withRelation(adjusted)}` : null,
  ]
    .filter((part) => part !== null)
    .join(', ')
}

const withRelation = (report: Report) =>
  report.relation === '=' ? `= ${printedP(report)}` : printedP(report)

const letters: Record<Test, string> = { t: 't', F: 'F', chi2: 'χ2', z: 'z', r: 'r', other: '' }

function writeStatistic(statistic: Statistic | undefined): string | null {
  if (!statistic || statistic.test === 'other' || statistic.pLow === null) return null
  const { test, df, value, decimals } = statistic
  const inBrackets = test === 'z' || df.length === 0 ? '' : `(${df.join(', ')})`
  return `${letters[test]}${inBrackets} = ${value.toFixed(Math.min(Math.max(decimals, 0), 12))}`
}

function keyOf({ comparison }: Report): string | null {
  if (comparison === null) return null
  return [...comparison]
    .map((name) => name.toLowerCase())
    .sort()
    .join('\u0000')
}
