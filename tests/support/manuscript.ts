import { read } from '@/lib/checks/extract/read'
import { judge } from '@/lib/checks/families/judge'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { kindOfHeading } from '@/lib/checks/text/headings'
import type { Family, Finding, HouseRules, PdfTable, ReadTable, SectionKind } from '@/lib/checks/types'
import { makeLaidOut, type Part } from './prose'

export type Judgement = { families: Family[]; findings: Finding[] }

/** Judges a made-up manuscript: lines that begin with '#' are headings, the rest is text of their section. */
export function judgeManuscript(
  source: string,
  given: { tables?: PdfTable[]; results?: string; rules?: Partial<HouseRules> } = {},
): Judgement {
  const laidOut = makeLaidOut(toParts(source), given.tables ?? [])
  const rules = { ...defaultHouseRules, ...given.rules }
  const results = given.results === undefined ? null : toResults(given.results)
  const { families, findings } = judge(read(laidOut, results, rules), laidOut, rules)
  return { families, findings }
}

function toParts(source: string): Part[] {
  const parts: Part[] = []
  let kind: SectionKind = 'other'
  for (const line of source.split('\n').map((each) => each.trim())) {
    if (line === '') continue
    if (!line.startsWith('#')) {
      const last = parts.at(-1)
      if (last) last.text += last.text === '' ? line : ` ${line}`
      else parts.push({ kind, heading: '', text: line })
      continue
    }
    const heading = line.replace(/^#+\s*/, '')
    kind = kindOfHeading(heading) ?? kind
    parts.push({ kind, heading, text: '' })
  }
  return parts.filter(({ text }) => text !== '')
}

/** A results file of one sheet from lines of values between semicolons. */
export function toResults(lines: string): ReadTable {
  const rows = lines
    .trim()
    .split('\n')
    .map((line) =>
      line
        .trim()
        .split(';')
        .map((text) => ({ text: text.trim(), value: text.trim() === '' ? null : asNumber(text) })),
    )
  return { file: 'results.csv', sha256: '0'.repeat(64), sheets: [{ name: null, rows }] }
}

function asNumber(text: string): number | null {
  const value = Number(text)
  return Number.isFinite(value) ? value : null
}

/** 'severity rule' of every finding, in their order. */
export function listFindings({ findings }: Judgement): string[] {
  return findings.map(({ severity, rule }) => `${severity} ${rule}`)
}

export function listOutcomes({ families }: Judgement): string[] {
  return families.map(({ outcome }) => outcome)
}

/** One comparison as a sentence: groups, statistic, printed p, and whether it is called significant. */
export type Row = [a: string, b: string, statistic: string, p: string, called: boolean]

export function sayPairs(outcome: string, rows: readonly Row[]): string {
  return rows
    .map(([a, b, statistic, p, called]) => {
      const verb = called ? 'differed significantly' : 'did not differ significantly'
      const shown = [statistic, p].filter((part) => part !== '').join(', ')
      return `${a} and ${b} ${verb} in ${outcome} (${shown}).`
    })
    .join(' ')
}
