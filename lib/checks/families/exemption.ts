import type { Assigned } from './assign'
import type { Setting } from './build-case'
import type { Exemption } from './case'
import type { Cluster } from './comparison'
import type { Design } from './design'
import { saysExploratory } from './remarks'

/** "planned contrasts", "a priori comparisons", "prespecified contrasts" */
const planned =
  /\b(?:planned|a priori|pre-?specified|pre-?planned|orthogonal)\s+(?:\w+\s+)?(?:contrasts?|comparisons?|tests?)\b/i

/**
 * Why the tests of a cluster are judged one by one at the full level: one test only; tests in a stated order; tests
 * that must all succeed; tests declared exploratory; a few planned contrasts; pairs of three groups after a
 * significant overall test. Null where a correction is called for or claimed.
 */
export function findExemption(
  cluster: Cluster,
  design: Design,
  assigned: Assigned,
  { remarks, rules }: Setting,
): Exemption | null {
  const claimed = assigned?.view.procedure ?? null
  const named = claimed !== null && claimed !== 'unspecified'
  if (cluster.comparisons.length < rules.correctionFrom && !named) return 'single'
  if (claimed === 'lsd') return design.groups.length <= 3 && cluster.kind === 'pairs' ? 'protected' : null
  if (named) return null
  if (remarks.order && cluster.kind === 'outcomes') return 'ordered'
  if (remarks.coPrimary && cluster.kind === 'outcomes') return 'co-primary'
  if (assigned || remarks.familyWise) return null
  if (planned.test(remarks.text) && design.kind !== 'all-pairs') return 'planned'
  const own = cluster.comparisons.flatMap(({ items }) =>
    items.map(({ report }) => `${report.heading} ${report.sentence}`),
  )
  const declared = remarks.exploratory && (own.some(saysExploratory) || declaresAll(remarks.text))
  return declared ? 'exploratory' : null
}

/** "all analyses are exploratory", "the p-values are nominal", "this exploratory study" */
function declaresAll(text: string): boolean {
  return /\b(?:all|these|this|the|our)\s+(?:\w+\s+){0,3}(?:(?:are|were|is|was)\s+(?:\w+\s+){0,3})?(?:exploratory|hypothesis-generating|nominal p|nominal$|nominal\.)\b/i.test(
    text,
  )
}
