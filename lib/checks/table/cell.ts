import type { Relation } from '../vocabulary'
import { fold } from '../extract/grammar/fold'
import { parseNumber, RELATION_SIGN, SIGNED, UNSIGNED, type PrintedNumber } from '../extract/grammar/number'
import { toRelation } from '../extract/grammar/p-value'

/** A p-value in a cell, with the marks beside it ('*', '**', …, 'n.s.', '') and a label in brackets behind it. */
export type PCell = PrintedNumber & { relation: Relation; mark: string; label: string | null }

const MARK = String.raw`(?:\^?\{?\*{1,4}\}?|[†‡§#¶]{1,4}|n\.?\s?s\.?|NS)`

/** '0.032', '.032*', '<0.001', 'p < .001', '0,0246', '2.72E-04', '8.4 × 10-7', '>0.999', '0.032 a', '0.04 (ns)', '0.331 (A vs B)'. */
const P_CELL = new RegExp(
  String.raw`^\(?\s*(?:[pPqQ]\s?(?=[=<>≤≥]))?(?<relation>${RELATION_SIGN})?\s*(?<number>${UNSIGNED})\s?(?<percent>%)?\s*\(?(?<mark>(?:${MARK}\s?)*)\)?(?:\s?\^?\(?[a-f](?:\s?,\s?[a-f])*\)?)?\s*\)?(?:\s?\((?<label>[A-Za-z][^()=<>]{1,40})\))?$`,
)

/** The p-value that a cell holds: up to 1, or a product above it; null where it holds something else. */
export function readP(cell: string): PCell | null {
  const groups = P_CELL.exec(fold(cell).trim())?.groups
  const parsed = groups?.number === undefined ? null : parseNumber(groups.number, true)
  if (!groups || !parsed || parsed.value >= 100 || (parsed.value > 1 && parsed.decimals < 1)) return null
  const relation = groups.relation === undefined ? '=' : toRelation(groups.relation)
  const mark = (groups.mark ?? '').replace(/[\s^{}]/g, '')
  const label = groups.label?.trim() ?? null
  if (groups.percent)
    return {
      relation,
      mark,
      value: Number((parsed.value / 100).toPrecision(12)),
      decimals: parsed.decimals + 2,
      label,
    }
  return { relation, mark, label, ...parsed }
}

/** A signed number with marks: '-2.46', '−2,46', '3.06**', '0.57 ***', '|2.1|'. */
const NUMBER_CELL = new RegExp(
  String.raw`^[|(]?\s*(?<number>${SIGNED})[|)]?\s*(?<mark>(?:${MARK}\s?)*)(?:\s?\^?\(?[a-f](?:\s?,\s?[a-f])*\)?)?$`,
)

/** The number that a cell holds with its marks; null where it holds none. */
export function readNumber(cell: string): (PrintedNumber & { mark: string }) | null {
  const groups = NUMBER_CELL.exec(fold(cell).trim())?.groups
  const parsed = groups?.number === undefined ? null : parseNumber(groups.number.replace(/^([-–+])\s/, '$1'))
  return parsed ? { ...parsed, mark: (groups?.mark ?? '').replace(/[\s^{}]/g, '') } : null
}

const LONE_MARK = new RegExp(String.raw`^(?:${MARK}|\(\s?n\.?s\.?\s?\))$`)

/** Cells that hold only a mark: '*', '***', '†', 'n.s.', 'ns'. */
export function isMark(cell: string): boolean {
  return LONE_MARK.test(fold(cell).trim())
}

/** What stands for a missing value: '–', '-', '.', 'NA', 'n/a', 'n.a.', 'NaN', '#N/A', '#DIV/0!', 'null', 'missing'. */
export const isMissing = (cell: string): boolean =>
  /^(?:[-–—−.]{1,3}|#?n\/a!?|n\.\s?a\.?|NA|nan|null|none|missing|#[A-Z]+(?:\/0)?[!?])$/i.test(cell.trim())

export const isNotSignificantMark = (mark: string): boolean => /^\(?n/i.test(mark)

/** 'yes', 'no', 'TRUE', 'significant', 'not significant', '*', 'n.s.', 'reject' as a call. */
export function readCall(cell: string): 'significant' | 'not significant' | null {
  const text = fold(cell).trim().toLowerCase()
  if (
    /^(?:no|n|false|0|ns|n\.\s?s\.?|not sig(?:nificant|\.)?|non-?significant|-|accept(?:ed)?|retain(?:ed)?|keep|fail to reject|insignificant)$/.test(
      text,
    )
  )
    return 'not significant'
  return /^(?:yes|y|true|1|sig(?:nificant|\.)?|\*{1,4}|reject(?:ed)?|x|\+|✓|significantly different)$/.test(
    text,
  )
    ? 'significant'
    : null
}

/** What the marks of one table stand for: bound and relation by mark. */
export type Legend = Map<string, { relation: Relation; value: number; decimals: number }>

const LEGEND = new RegExp(
  String.raw`(?<mark>\*{1,4}|[†‡§#¶])\s?[,:=]?\s?(?:(?:indicates?|denotes?|means?|represents?|significant at|is|statistically|significan(?:t|ce)|difference|with|at|the|a|level|of|adjusted|corrected|Bonferroni-?(?:adjusted|corrected)?|FDR-?(?:adjusted|corrected)?|two-sided|by)\s){0,6}(?:[pPqQ](?:[\s-]?values?)?\s?(?:_?adj)?\s?)?(?<relation>[<≤]|less than|below)?\s?(?<number>0?\.\d+|0,\d+)`,
  'g',
)

/** Reads '* p < .05; ** p < .01', '*P<0.05, **P<0.01', '*** significant at 0.001' out of captions and notes. */
export function readLegend(text: string): Legend {
  const legend: Legend = new Map()
  for (const { groups } of fold(text).matchAll(LEGEND)) {
    const parsed = parseNumber(groups?.number ?? '')
    if (!parsed || !groups?.mark || parsed.value > 0.2) continue
    if (!legend.has(groups.mark))
      legend.set(groups.mark, { ...parsed, relation: toRelation(groups.relation ?? '<') })
  }
  return legend
}
