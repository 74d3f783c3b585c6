import { familyWiseError } from '../sensitivity/family-wise-error'
import type { Audit, Family, Report, Statistic } from '../types'
import { rComment, rLogical, rNumber, rNumbers, rString, rStrings, rVector } from './literals'
import { writeScript, type RFunctions } from './script'

/**
 * The audit as an R script that computes again, from the printed numbers alone, the range of p that each report and
 * statistic stands for, and for each family the raw and adjusted ranges, the decisions, the largest m at which each
 * is kept and what reproduces the printed adjusted values; and prints "agrees" or what differs (see `writeScript`).
 */
export function writeAuditScript(audit: Audit): string {
  return write(audit, audit.families, 'Recomputation of an audit')
}

/** The same for one family and what it rests on. Throws RangeError where the audit has no such family. */
export function writeFamilyScript(audit: Audit, familyId: string): string {
  const family = audit.families.find(({ id }) => id === familyId)
  if (!family) throw new RangeError(`the audit has no family '${familyId}'`)
  const used = listUsed(family)
  const reports = audit.reports.filter(({ id }) => used.has(id))
  const statistics = audit.statistics.filter(({ id }) => used.has(id))
  return write({ ...audit, reports, statistics }, [family], `Recomputation of one family: ${family.label}`)
}

function listUsed(family: Family): Set<string> {
  const tests = family.working?.tests ?? []
  const ofTests = tests.flatMap(({ statistics, witnesses }) => [
    ...statistics,
    ...witnesses.map(({ id }) => id),
  ])
  return new Set([...ofTests, ...family.members, ...family.decisions.map(({ report }) => report)])
}

function write(audit: Audit, families: readonly Family[], title: string): string {
  const { document, table, alpha, engine } = audit
  const kept = families.filter(({ working }) => working !== null)
  const untold = families.length - kept.length
  return writeScript({
    title: `Assize, engine ${engine}. ${title}.`,
    facts: [
      `Manuscript: ${document.title ?? 'without a title'}, ${document.pages} pages, SHA-256 ${document.sha256}`,
      ...(table ? [`Results table: ${table.file}, ${table.rows} rows, SHA-256 ${table.sha256}`] : []),
      `Level: ${alpha.value}${alpha.quote === null ? ' (not stated)' : ''}`,
      'It helps a qualified statistician and decides nothing. What was misread is computed as it was read.',
      ...(untold > 0
        ? [
            `${untold} of the families were kept without how they were computed, and are left out: audit again.`,
          ]
        : []),
    ],
    functions: listFunctions(kept),
    body: [
      writeReports(audit.reports),
      writeStatistics(audit.statistics),
      'check_reports()',
      'check_statistics()',
      ...kept.map((family) => writeFamily(family)),
      ...kept.flatMap((family) => writeLevels(audit, family)),
    ].join('\n\n'),
  })
}

function listFunctions(families: readonly Family[]): RFunctions[] {
  const many = families.some(({ working }) => working?.procedure === 'dunnett')
  return ['tails', 'audit', ...(many ? (['dunnett'] as const) : [])]
}

function writeReports(reports: readonly Report[]): string {
  const items = reports.map(({ id, place, relation, value, decimals, low, high }) => {
    const where = place.page === null ? `row ${place.row ?? '?'}` : `page ${place.page}`
    return [
      `  ${rComment(`${where}: ${place.quote}`)}`,
      `  ${rString(id)} = list(relation = ${rString(relation)}, value = ${rNumber(value)}, decimals = ${rNumber(decimals)}, shown = ${rNumbers([low, high])})`,
    ].join('\n')
  })
  return `# p-values as printed, and the range that each stands for\nreports <- ${listOf(items)}`
}

function writeStatistics(statistics: readonly Statistic[]): string {
  const items = statistics.map(({ id, place, test, df, value, decimals, pLow, pHigh }) => {
    const where = place.page === null ? `row ${place.row ?? '?'}` : `page ${place.page}`
    return [
      `  ${rComment(`${where}: ${place.quote}`)}`,
      `  ${rString(id)} = list(test = ${rString(test)}, value = ${rNumber(value)}, decimals = ${rNumber(decimals)}, df = ${rStrings(df.map(String))}, shown = ${rNumbers([pLow, pHigh])})`,
    ].join('\n')
  })
  return `# statistics as printed, and the p-values that each can have (NA: none can be computed)\nstatistics <- ${listOf(items)}`
}

/** Items that each begin with a comment line: the comma goes before the next one's. */
function listOf(items: readonly string[]): string {
  return items.length === 0 ? 'list()' : `list(\n${items.join(',\n')}\n)`
}

function writeFamily(family: Family): string {
  const { label, decisions, fits, working, outcome } = family
  if (!working) return ''
  const { procedure, alpha, groups, sizes, parts, undone, trusted, fitsUpTo, tests } = working
  const lines = tests.map(({ statistics, oneSided, witnesses }) => {
    const ids = (is: 'raw' | 'adjusted' | 'open') =>
      rStrings(witnesses.filter((one) => one.is === is).map(({ id }) => id))
    return `    list(one_sided = ${rLogical(oneSided)}, raw = ${ids('raw')}, adjusted = ${ids('adjusted')}, open = ${ids('open')}, statistics = ${rStrings(statistics)})`
  })
  return [
    rComment(`${label}: ${outcome}`),
    'check_family(list(',
    `  label = ${rString(label)},`,
    `  procedure = ${rString(procedure)}, sizes = ${rNumbers(sizes)}, parts = ${rNumbers(parts)}, groups = ${rNumber(groups)}, alpha = ${rNumber(alpha)},`,
    `  undone = list(procedure = ${rString(undone.procedure ?? 'none')}, m = ${rNumber(undone.m)}), trusted = ${rLogical(trusted)}, fits_up_to = ${rNumber(fitsUpTo)},`,
    `  tests = ${listOf(lines)},`,
    '  shown = list(',
    `    raw_low = ${rNumbers(tests.map(({ raw }) => raw?.[0] ?? null))},`,
    `    raw_high = ${rNumbers(tests.map(({ raw }) => raw?.[1] ?? null))},`,
    `    low = ${rNumbers(decisions.map(({ adjusted }) => adjusted[0]))},`,
    `    high = ${rNumbers(decisions.map(({ adjusted }) => adjusted[1]))},`,
    `    significant = ${rVector(
      decisions.map(({ significant }) => rLogical(significant)),
      'numeric(0)',
    )},`,
    `    kept_up_to = ${rNumbers(decisions.map(({ survivesUpTo }) => survivesUpTo))},`,
    `    fits = ${rStrings(fits.map((fit) => `${fit.procedure} ${fit.m}`))}`,
    '  )',
    '))',
  ].join('\n')
}

/** What findings show beside p-values: the error rate without correction, the quotient of level and m. */
function writeLevels(audit: Audit, family: Family): string[] {
  const alpha = family.working?.alpha ?? audit.alpha.value
  const has = (rule: string) => audit.findings.some((one) => one.family === family.id && one.rule === rule)
  const count = family.decisions.length
  const m = audit.claims.find(({ id }) => id === family.claim)?.m ?? family.m.due
  const lines: string[] = []
  if (has('no-correction') && count > 0) {
    const shown = familyWiseError(alpha, count).toFixed(3)
    lines.push(
      `check(${rString(`${family.label}, family-wise error rate without correction`)}, ${shown}, round(1 - (1 - ${alpha})^${count}, 3))`,
    )
  }
  if (has('threshold-rounded-up') && m !== null) {
    const shown = Number((alpha / m).toPrecision(3))
    lines.push(
      `check(${rString(`${family.label}, level divided by m`)}, ${shown}, signif(${alpha} / ${m}, 3))`,
    )
  }
  return lines
}
