import type { Cluster } from './comparison'
import type { Design } from './design'

/** A short name for people: what was measured, and which comparisons. */
export function labelOf(cluster: Cluster, design: Design): string {
  const items = cluster.comparisons.flatMap((comparison) => comparison.items)
  const heading = items
    .map(({ report }) => report.heading.replace(/^[\d.\s]+/, '').trim())
    .find((text) => text !== '' && !/^results?$/i.test(text))
  const outcomes = [...new Set(items.flatMap(({ report }) => report.outcome ?? []))]
  const outcome = cluster.kind === 'pairs' ? outcomes[0] : undefined
  const subject = outcome ?? heading ?? 'Results'
  const names = {
    'all-pairs': 'all pairs of',
    'many-to-one': 'comparisons with a control among',
    contrasts: 'comparisons among',
  }
  if (design.kind === 'outcomes') return `${subject}: ${cluster.comparisons.length} tests`
  return `${subject}: ${names[design.kind]} ${design.groups.length} groups`
}
