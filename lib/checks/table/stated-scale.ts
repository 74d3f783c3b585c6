import { fold } from '../extract/grammar/fold'
import { findProcedures } from '../extract/grammar/procedure'
import type { ColumnRole } from './roles'

/** What caption and notes say of the p-values: 'pB: Bonferroni-corrected', 'adjusted P after Holm', 'P values are unadjusted'. */
export function statedScale(role: ColumnRole, around: string, header: string): ColumnRole {
  if (role.kind !== 'p' || role.scale !== 'unknown') return role
  const text = fold(around)
  const byMark = markedNote(header, text)
  if (byMark !== null) {
    const [mention] = findProcedures(byMark)
    if (/unadjusted|uncorrected|not (?:adjusted|corrected)/i.test(byMark)) return { ...role, scale: 'raw' }
    if (mention || /adjust|correct/i.test(byMark))
      return { kind: 'p', scale: 'adjusted', procedure: mention?.procedure ?? null }
  }
  if (
    /\b(?:unadjusted|uncorrected|raw|nominal)\s[pP]\b|[pP](?:[\s-]?values?)?\s(?:\w+\s){0,4}(?:unadjusted|uncorrected|not (?:adjusted|corrected)|nominal)/i.test(
      text,
    )
  )
    return { ...role, scale: 'raw' }
  if (
    /\b(?:adjusted|corrected)\s[pP](?:[\s-]values?)?\b|\b[pP](?:[\s-]?values?)?\s?(?:_?\w+\s?)?[:=]?\s?(?:\w+\s){0,3}(?:[A-ZŠ]\w+-)?(?:adjusted|corrected)\b(?!\s(?:mean|odds|for (?!mult)))/.test(
      text,
    ) &&
    header.length < 40
  )
    return { ...role, scale: 'adjusted' }
  return role
}

/** The note of the mark on a head, 'p†' with '†, false discovery rate correction …'; null where there is none. */
function markedNote(header: string, notes: string): string | null {
  const mark = /([*†‡§#¶]+)\s*$|\^\{?([a-z])\}?\s*$/.exec(fold(header).trim())
  const sign = mark?.[1] ?? mark?.[2]
  if (!sign) return null
  const at = notes.search(new RegExp(`(?:^|[\\s.;^])${sign.replace(/[*^]/g, '\\$&')}\\s?[,:=)]?\\s`))
  if (at < 0) return null
  return notes.slice(at + 1).split(/[.;](?:\s|$)/)[0] ?? null
}
