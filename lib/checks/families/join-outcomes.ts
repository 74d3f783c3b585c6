import type { Assigned } from './assign'
import type { Cluster } from './comparison'

/** `parts`: the drafts that were joined, empty where none were. */
export type FamilyDraft = {
  cluster: Cluster
  assigned: Assigned
  alternatives: number[]
  parts: FamilyDraft[]
}

/** "within each outcome", "for each variable", "separately", "per endpoint" */
const perOutcome =
  /\b(?:within|for|in|per|by)\s+(?:each|every)\b|\bseparately\b|\bper\s+(?:outcome|endpoint|variable|measure)/i

/**
 * The same pairs compared for several outcomes under one claim that does not say whether the correction is within an
 * outcome or across them: one draft, with the number of tests of each outcome and of all together as alternatives.
 * A claim that states the number for all of them joins them too; any other leaves them apart.
 */
export function joinOutcomes(drafts: readonly FamilyDraft[]): FamilyDraft[] {
  const joined: FamilyDraft[] = []
  for (const draft of drafts) {
    const partners = joined.filter((other) => isRepeat(other.cluster, draft.cluster))
    const [partner] = partners
    const view = partner?.assigned?.view ?? draft.assigned?.view ?? null
    if (!partner || !view || view.procedure === 'none' || isOnePerOutcome(view.procedure)) {
      joined.push(draft)
      continue
    }
    const shared = !draft.assigned || !partner.assigned || draft.assigned.view === partner.assigned.view
    const together = partner.cluster.comparisons.length + draft.cluster.comparisons.length
    const explicit = view.all.some(({ sentence }) => perOutcome.test(sentence))
    if (!shared || explicit || (view.m !== null && view.m !== together)) {
      joined.push(draft)
      continue
    }
    const apart = draft.cluster.comparisons.length
    joined[joined.indexOf(partner)] = {
      cluster: append(partner.cluster, draft.cluster),
      assigned: partner.assigned ?? draft.assigned,
      alternatives: view.m === together ? [] : [apart, together],
      parts: [
        ...(partner.parts.length > 0 ? partner.parts : [partner]),
        { ...draft, assigned: draft.assigned ?? partner.assigned },
      ],
    }
  }
  return joined
}

/** Procedures on all means of one outcome cannot reach across outcomes. */
function isOnePerOutcome(procedure: string): boolean {
  return ['tukey', 'games-howell', 'dunnett', 'scheffe', 'lsd', 'snk', 'duncan', 'dunn'].includes(procedure)
}

/** The same pairs once more, for something else. */
function isRepeat(a: Cluster, b: Cluster): boolean {
  if (a.kind !== 'pairs' || b.kind !== 'pairs' || b.comparisons.length < 2) return false
  const pairs = new Set(a.comparisons.map(({ pair }) => pair?.join('|')))
  return b.comparisons.every(({ pair }) => pairs.has(pair?.join('|')))
}

function append(a: Cluster, b: Cluster): Cluster {
  const name = ({ blocks }: Cluster) => blocks[0]?.replace(/^\w+\s+(?:results|other)?\s*/, '') ?? ''
  const renamed = b.comparisons.map((comparison) => ({
    ...comparison,
    key: `${name(b)}: ${comparison.key}`,
    label: `${comparison.label} (${name(b)})`,
  }))
  return { kind: 'pairs', comparisons: [...a.comparisons, ...renamed], blocks: [...a.blocks, ...b.blocks] }
}
