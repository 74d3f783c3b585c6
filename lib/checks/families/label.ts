import type { Cluster } from './comparison'
import type { Design } from './design'

/** A short name for people: what was measured, and which comparisons. */
export function labelOf(cluster: Cluster, design: Design): string {
  const items = cluster.comparisons.flatMap((comparison) => comparison.items)
  const heading = items.map(({ report }) => toSubject(report.heading)).find((text) => text !== '')
  const outcomes = [...new Set(items.flatMap(({ shown }) => shown.outcome ?? []))]
  const outcome = cluster.kind === 'pairs' ? outcomes[0] : undefined
  const subject = withCapital(outcome ?? heading ?? 'Results')
  const names = {
    'all-pairs': 'all pairs of',
    'many-to-one': 'comparisons with a control among',
    contrasts: 'comparisons among',
  }
  if (design.kind === 'outcomes') return `${subject}: ${cluster.comparisons.length} tests`
  return `${subject}: ${names[design.kind]} ${design.groups.length} groups`
}

/** Longer captions are cut at a comma. */
const longest = 80

/** Headings that name no subject. */
const general =
  /^(?:abstract|summary|introduction|background|(?:materials?|patients?|participants?|subjects?) and methods?|methods?|results?(?: and discussion)?|findings|discussion|conclusions?)$/i

/** A heading or caption cut to its subject: no number, no "Table 1.", nothing behind the first stop; '' for none. */
function toSubject(heading: string): string {
  const bare = heading
    // "Table 1.", "TABLE II", "Table S3:", "2.1 "
    .replace(/^\s*(?:table|tab\.)\s*(?:S?\d\w*|[IVX]+\b)\s*[.:|)–-]?\s*/i, '')
    .replace(/^[\d.\s]+/, '')
  // "O. labiatum" goes on behind its stop
  const whole = (bare.split(/(?<!\b\p{Lu})\.(?:\s|$)|[:;](?:\s|$)/u)[0] ?? '').trim()
  const text = whole.length > longest ? (whole.split(', ')[0] ?? whole) : whole
  return general.test(text) ? '' : text
}

function withCapital(name: string): string {
  return /^\p{Ll}{2}/u.test(name) ? `${name.charAt(0).toUpperCase()}${name.slice(1)}` : name
}
