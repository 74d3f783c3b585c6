import type { ClaimView } from './claims'
import { experimentIn } from './claims'
import type { Cluster } from './comparison'

/**
 * The claim that speaks for a cluster. `own`: it was made for these tests; otherwise it is a statement on the
 * manuscript as a whole that reaches them too.
 */
export type Assigned = { view: ClaimView; own: boolean } | null

/** Words that name no subject: of every ten in a sentence on statistics, seven. */
const common = new Set(
  `the and for with were was are from that this which each all p values value level significance significant
  comparison comparisons compared between correction corrected adjusted bonferroni holm method procedure test tests
  multiple pairwise post hoc using used after below error rate than not been their there these those they
  difference differences differed group groups using made less more into table mean means data analysis`.split(
    /\s+/,
  ),
)

function subjectWords(text: string): Set<string> {
  const words = text.toLowerCase().match(/[\p{L}][\p{L}\d-]{2,}/gu) ?? []
  return new Set(
    words.filter((word) => !common.has(word)).map((word) => word.replace(/(?:es|s)$/, '').slice(0, 7)),
  )
}

function wordsOfCluster(cluster: Cluster): Set<string> {
  const items = cluster.comparisons.flatMap((comparison) => comparison.items)
  const parts = items.flatMap(({ report }) => [
    report.heading,
    report.outcome ?? '',
    report.sentence,
    ...(report.comparison ?? []),
  ])
  return subjectWords([...new Set(parts)].join(' '))
}

/** Possible numbers of tests of a cluster: those that it shows, and those that its groups allow. */
export function countsOf(cluster: Cluster): { shown: number; groups: number; pairs: number } {
  const shown = cluster.comparisons.length
  const groups = new Set(cluster.comparisons.flatMap(({ pair }) => pair ?? [])).size
  return { shown, groups, pairs: cluster.kind === 'pairs' ? (groups * (groups - 1)) / 2 : shown }
}

function score(
  view: ClaimView,
  cluster: Cluster,
  words: Set<string>,
  rarity: (word: string) => number,
): number {
  const sentences = view.all.map(({ sentence }) => sentence).join(' ')
  const { shown, groups, pairs } = countsOf(cluster)
  const items = cluster.comparisons.flatMap((comparison) => comparison.items)
  let points = 0
  for (const word of subjectWords(sentences)) if (words.has(word)) points += rarity(word)
  if (view.m !== null) points += view.m === shown || view.m === pairs ? 2 : view.m === groups ? 1 : -1
  const pairwise = view.design === 'all-pairs' || view.design === 'many-to-one'
  if (pairwise) points += cluster.kind === 'pairs' ? 1 : -1
  if (view.design === 'outcomes') points += cluster.kind === 'outcomes' ? 1 : -1
  if (view.experiment !== null) {
    const mine = items.map(({ report }) => experimentIn(`${report.heading} ${report.sentence}`)).find(Boolean)
    if (mine) points += mine === view.experiment ? 5 : -5
  }
  const tables = items.filter(({ report }) => report.place.source === 'pdf-table')
  if (tables.length > 0 && /\bchi|χ/i.test(sentences))
    points += tables.some(({ statistic }) => statistic?.test === 'chi2') ? 1 : 0
  if (/\bchi-?squared?\b|χ/i.test(sentences))
    points += items.some(({ statistic }) => statistic?.test === 'chi2') ? 2 : -1
  if (/\bt[-\s]?tests?\b/i.test(sentences))
    points += items.some(({ statistic }) => statistic?.test === 't') ? 0.5 : 0
  return points + Math.min(2, shown / 10)
}

/** "all p-values in this report", "throughout", "all comparisons": said of the manuscript as a whole. */
const general =
  /\ball\s+(?:reported\s+)?(?:p|post|tests|comparisons|analyses)\b|\bthroughout\b|\bin all (?:tests|cases)\b/i

/** Among several clusters a claim needs more than its mere presence to be about one of them. */
const leastFit = 0.5

/** "p-values are uncorrected", "uncorrected P values": said of the values printed, not of what was done with them. */
const scaleOnly =
  /\bp[\s-]?values?\s(?:are|were)\s(?:\w+\s){0,2}?(?:unadjusted|uncorrected|not (?:adjusted|corrected))|\b(?:unadjusted|uncorrected)\sp[\s-]?values?\b/i

function saysScaleOnly({ procedure, all }: ClaimView): boolean {
  return procedure === 'none' && all.every(({ sentence }) => scaleOnly.test(sentence))
}

/** Whether the claim lowers the level for as many tests as the cluster has. */
function isLoweredFor({ procedure, threshold, m }: ClaimView, cluster: Cluster): boolean {
  const { shown, pairs } = countsOf(cluster)
  return procedure !== 'none' && threshold !== null && m !== null && m >= 2 && (m === shown || m === pairs)
}

/** For each cluster the claim that speaks for it, or null. */
export function assignClaims(clusters: readonly Cluster[], views: readonly ClaimView[]): Assigned[] {
  const words = clusters.map(wordsOfCluster)
  const rarity = (word: string) => 1 / Math.max(1, words.filter((set) => set.has(word)).length) ** 2
  const table = views.map((view) =>
    clusters.map((cluster, i) => score(view, cluster, words[i] ?? new Set(), rarity)),
  )
  const assigned: Assigned[] = clusters.map(() => null)
  // that the printed p-values are the raw ones is no denial where the level was lowered for just these tests
  const describes = (view: ClaimView, cluster: Cluster) =>
    saysScaleOnly(view) && views.some((other) => isLoweredFor(other, cluster))
  const claimsLeft = new Set(views.keys())
  // each claim goes to the cluster it fits best, the clearest fit first; a cluster keeps the claim that fits it best
  const all = table.flatMap((row, v) => row.map((points, c) => ({ v, c, points })))
  for (const { v, c, points } of all.sort((a, b) => b.points - a.points || a.v - b.v || a.c - b.c)) {
    const view = views[v]
    if (!view || assigned[c] || !claimsLeft.has(v)) continue
    if (clusters.length > 1 && points < leastFit) continue
    if (clusters.some((cluster, i) => i === c && describes(view, cluster))) continue
    assigned[c] = { view, own: true }
    claimsLeft.delete(v)
  }
  clusters.forEach((cluster, c) => {
    if (!assigned[c]) assigned[c] = inherit(cluster, views, c, table)
  })
  return assigned
}

/** A claim that is not bound to another family by its number of tests or by its experiment reaches further ones. */
function inherit(
  cluster: Cluster,
  views: readonly ClaimView[],
  c: number,
  table: readonly number[][],
): Assigned {
  const { shown, pairs } = countsOf(cluster)
  const reaching = views
    .map((view, v) => ({ view, points: table[v]?.[c] ?? 0 }))
    .filter(({ view }) => view.procedure !== 'none' && view.experiment === null)
    .map(({ view, points }) => {
      const fits =
        cluster.kind === 'pairs' && (view.m === pairs || (view.m === null && view.design !== 'outcomes'))
      const open = view.m === null && view.design === null
      const wide = view.all.some(({ sentence }) => general.test(sentence))
      return { view, points, own: fits || (open && view.m === shown), reaches: fits || open || wide }
    })
    .filter(({ reaches }) => reaches)
    .sort((a, b) => b.points - a.points)
  const [best] = reaching
  return best ? { view: best.view, own: best.own } : null
}
