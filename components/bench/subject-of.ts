import type { CommentRow } from '@/db/queries/comments'
import type { CommentSubject } from '../comments/use-comments'
import { nameOfReport } from '../charts/describe-dot'
import { ruleWords } from '../findings/rule-words'
import { placeOf, type AuditIndex, type Target } from './audit-index'

/** What a comment on a target is about, with where it stands. */
export function subjectOf(index: AuditIndex, target: Target): CommentSubject {
  const place = placeOf(index, target)
  const at = { page: place?.page ?? null, boxes: place?.boxes.slice(0, 100) ?? [] }
  if (target.kind === 'statistic' || target.kind === 'claim') {
    return { target: 'place', targetKey: target.id, targetLabel: place?.quote.slice(0, 300) ?? '', ...at }
  }
  return {
    target: target.kind,
    targetKey: target.id,
    targetLabel: labelOf(index, target).slice(0, 300),
    ...at,
  }
}

function labelOf(index: AuditIndex, { kind, id }: Target): string {
  if (kind === 'family') return index.families.get(id)?.label ?? ''
  const finding = index.findings.get(id)
  if (kind === 'finding') return finding ? ruleWords(finding.rule) : ''
  const report = index.reports.get(id)
  return report ? nameOfReport(report) : ''
}

/** Back from a comment to what it is about; null for the whole, and for a place that has no key. */
export function targetOfComment(comment: Pick<CommentRow, 'target' | 'targetKey'>): Target | null {
  const { target, targetKey } = comment
  if (target === 'whole' || targetKey === null) return null
  if (target !== 'place') return { kind: target, id: targetKey }
  return { kind: targetKey.startsWith('c') ? 'claim' : 'statistic', id: targetKey }
}
