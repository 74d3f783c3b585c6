import type { Audit, Claim, Decision, Family, Finding, Place, Report } from '@/lib/checks/types'

const width = 100

/** The audit as a plain-text report of at most 100 columns, for the command line. */
export function printAudit(audit: Audit): string {
  return [
    ...headLines(audit),
    ...audit.families.flatMap((family) => ['', ...familyLines(family, audit)]),
    '',
    ...findingLines(audit.findings),
    '',
    'It helps a qualified statistician and decides nothing; numbers can be misread: check each in place.',
    'House policy, reporting guidelines and, in clinical work, licensed practice and protocol come first.',
  ].join('\n')
}

function headLines({ document, table, alpha, reports, statistics, claims, engine }: Audit): string[] {
  const stated = alpha.quote === null ? 'not stated, default' : `"${alpha.quote}"${onPage(alpha.page)}`
  return [
    ...wrap(document.title ?? 'Untitled manuscript', ''),
    `${count(document.pages, 'page')}; ${count(reports.length, 'p-value')}, ${count(statistics.length, 'test statistic')}; engine ${engine}`,
    ...(table ? wrap(`Results table: ${table.file}, ${count(table.rows, 'row')}`, '') : []),
    ...wrap(`Level: ${alpha.value} (${stated})`, ''),
    ...(claims.length === 0 ? ['No statement on a correction was found.'] : []),
    ...claims.flatMap((claim) => wrap(`Claim: ${describeClaim(claim)}`, '  ')),
  ]
}

function describeClaim({ procedure, m, threshold, place }: Claim): string {
  const facts = [procedure, m === null ? null : `m = ${m}`, threshold === null ? null : `level ${threshold}`]
  return `${facts.filter(Boolean).join(', ')}: "${place.quote}"${onPage(place.page)}`
}

function familyLines(family: Family, audit: Audit): string[] {
  const { label, outcome, why, m, decisions, fits } = family
  const claim = audit.claims.find(({ id }) => id === family.claim)
  const due = m.due === null ? 'open' : String(m.due)
  const reproduced = fits.slice(0, 4).map((fit) => `${fit.procedure} (m = ${fit.m})`)
  return [
    ...wrap(`${label}: ${outcome.toUpperCase()}`, ''),
    ...wrap(why, '  ', '  '),
    ...wrap(`claim: ${claim ? `${claim.procedure}${onPage(claim.place.page)}` : 'none'}`, '  ', '  '),
    ...wrap(
      `m: printed ${m.printed}, claimed ${m.claimed ?? 'not stated'}, due ${due} (${m.why})`,
      '    ',
      '  ',
    ),
    ...(reproduced.length > 0
      ? wrap(`printed adjusted values follow: ${reproduced.join(', ')}`, '    ', '  ')
      : []),
    ...(decisions.length > 0 ? decisionTable(decisions, audit.reports) : []),
  ]
}

function decisionTable(decisions: readonly Decision[], reports: readonly Report[]): string[] {
  const rows = decisions.map((decision) => {
    const report = reports.find(({ id }) => id === decision.report)
    const name = report?.comparison?.join(' – ') ?? whereRead(report?.place ?? null)
    return [
      cut(name, 34),
      cut(printedP(report?.place.quote ?? ''), 20),
      rangeOf(decision.adjusted),
      decision.called === null ? '-' : decision.called ? 'significant' : 'not sign.',
      decision.significant === null ? 'open' : decision.significant ? 'significant' : 'not sign.',
      decision.survivesUpTo === null ? '-' : String(decision.survivesUpTo),
    ]
  })
  const table = [['comparison', 'printed', 'adjusted', 'called', 'judged', 'up to m'], ...rows]
  const widths = (table[0] ?? []).map((_, column) =>
    Math.max(...table.map((row) => (row[column] ?? '').length)),
  )
  return table.map((row) =>
    `  ${row.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join('  ')}`.trimEnd().slice(0, width),
  )
}

/** The p-value at the end of a quote such as "t(36) = 2.43, p = .020"; else the quote. */
function printedP(quote: string): string {
  return /\b[pq]\s?[=<>≤≥][^;,]*$/iu.exec(quote)?.[0] ?? quote
}

function whereRead(place: Place | null): string {
  if (!place) return '-'
  return place.source === 'results-table'
    ? `results table, row ${place.row ?? '?'}`
    : `page ${place.page ?? '?'}`
}

function rangeOf([low, high]: Decision['adjusted']): string {
  const [from, to] = [toThree(low), toThree(high)]
  return from === to ? from : `${from}–${to}`
}

function toThree(p: number): string {
  return p !== 0 && p < 0.0001 ? p.toExponential(1) : String(Number(p.toPrecision(3)))
}

function findingLines(findings: readonly Finding[]): string[] {
  if (findings.length === 0) return ['No findings.']
  const body = findings.flatMap(({ id, severity, rule, place, says, asks }) => [
    ...wrap(`${id}  ${severity}: ${rule}${whereIs(place)}`, '    '),
    ...wrap(says, '    ', '    '),
    ...wrap(`Ask: ${asks}`, '    ', '    '),
  ])
  return [`Findings: ${findings.length}`, ...body]
}

function whereIs(place: Place | null): string {
  if (!place) return ''
  const row = place.row === null ? '' : `, row ${place.row}`
  return place.source === 'results-table' ? ` (results table${row})` : onPage(place.page)
}

function onPage(page: number | null): string {
  return page === null ? '' : ` (page ${page})`
}

function cut(text: string, length: number): string {
  return text.length <= length ? text : `${text.slice(0, length - 1)}…`
}

/** Breaks at spaces; a word longer than a line is broken where the line ends. */
function wrap(text: string, indent: string, first = ''): string[] {
  const lines: string[] = []
  let line = first
  for (const word of text.split(/\s+/).filter(Boolean)) {
    const room = line.trim() === '' ? line + word : `${line} ${word}`
    if (room.length <= width) {
      line = room
      continue
    }
    if (line.trim() !== '') lines.push(line)
    line = indent + word
    while (line.length > width) {
      lines.push(line.slice(0, width))
      line = indent + line.slice(width)
    }
  }
  return [...lines, line]
}

function count(n: number, thing: string): string {
  return `${n} ${thing}${n === 1 ? '' : 's'}`
}
