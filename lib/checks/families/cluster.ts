import { agreement, isIdentified, isSamePrint } from './agreement'
import type { Cluster, Comparison, Item, Shown } from './comparison'
import { isSameName } from './names'

/**
 * Which reports belong together: clusters of comparisons, each comparison with its duplicates. Items of one place
 * (a heading, a table) are taken together first; then places that tell of the same comparisons with the same
 * numbers are joined. Items without pair and outcome are kept where their numbers identify them, or where they stand.
 */
export function clusterItems(items: readonly Item[]): Cluster[] {
  const blocks = [...new Set(items.map((item) => item.block))]
  let clusters: Cluster[] = []
  const loose: Item[] = []
  for (const block of blocks) {
    const inside = items.filter((item) => item.block === block)
    loose.push(...inside.filter((item) => !item.pair && !item.outcome))
    clusters.push(...splitBlock(inside.filter((item) => item.pair || item.outcome)))
  }
  clusters = mergeAll(clusters)
  placeLoose(clusters, loose)
  return absorbIdentified(mergeAll(clusters))
}

/** Rows whose labels were not understood, and whose numbers are those of another cluster, are that cluster. */
function absorbIdentified(clusters: readonly Cluster[]): Cluster[] {
  const kept = [...clusters]
  const candidates = clusters.filter(({ kind }) => kind === 'outcomes')
  for (const cluster of candidates.sort((a, b) => a.comparisons.length - b.comparisons.length)) {
    for (const other of kept) {
      if (other === cluster || other.comparisons.length < cluster.comparisons.length) continue
      const twins = cluster.comparisons.map((comparison) => findTwin(comparison, other))
      const known = twins.filter((twin) => twin !== null)
      if (known.length < 2 || known.length < 0.7 * twins.length || new Set(known).size < known.length)
        continue
      cluster.comparisons.forEach(({ items }, i) => twins[i]?.items.push(...items))
      other.blocks.push(...cluster.blocks)
      kept.splice(kept.indexOf(cluster), 1)
      break
    }
  }
  return kept
}

function findTwin(comparison: Comparison, { comparisons }: Cluster): Comparison | null {
  const alike = comparisons.filter((other) =>
    comparison.items.some((a) =>
      other.items.some((b) => a.block !== b.block && (isIdentified(a, b) || isSamePrint(a, b))),
    ),
  )
  return alike.length === 1 ? (alike[0] ?? null) : null
}

/** The clusters of one place. The outcome tells pairs apart only where one pair comes with two values. */
function splitBlock(items: readonly Item[]): Cluster[] {
  const paired = items.filter((item) => item.pair)
  const pairs = new Set(paired.map((item) => item.pair?.join('|')))
  const single = items.filter((item) => !item.pair)
  if (pairs.size === 1 && isRepeated(paired)) return [toCluster('outcomes', items)]
  if (pairs.size <= 1 && single.length >= 2) return [toCluster('outcomes', items)]
  const clusters = splitByOutcome(paired)
    .flatMap(splitByGroups)
    .map((part) => toCluster('pairs', part))
  if (single.length > 0) clusters.push(toCluster('outcomes', single))
  return clusters
}

/** Whether one pair stands for several tests: two outcomes, or two values that contradict. */
function isRepeated(items: readonly Item[]): boolean {
  return items.some((a, i) =>
    items.some(
      (b, j) => j > i && a.pair?.join('|') === b.pair?.join('|') && isOther(a, b) && agreement(a, b) !== true,
    ),
  )
}

function isOther(a: Item, b: Item): boolean {
  return a.outcome !== null && b.outcome !== null && !isSameName(a.outcome, b.outcome)
}

function splitByOutcome(items: readonly Item[]): Item[][] {
  if (!isRepeated(items)) return items.length > 0 ? [[...items]] : []
  const parts: { outcome: string | null; items: Item[] }[] = []
  for (const item of items) {
    const part = parts.find(
      ({ outcome }) =>
        outcome === item.outcome || (outcome && item.outcome && isSameName(outcome, item.outcome)),
    )
    if (part) part.items.push(item)
    else parts.push({ outcome: item.outcome, items: [item] })
  }
  return parts.map((part) => part.items)
}

/** Pairs that are connected through shared groups. */
function splitByGroups(items: readonly Item[]): Item[][] {
  const parts: { groups: Set<string>; items: Item[] }[] = []
  for (const item of items) {
    const pair: readonly string[] = item.pair ?? []
    const touched = parts.filter((part) => pair.some((group) => part.groups.has(group)))
    const joined = {
      groups: new Set([...pair, ...touched.flatMap((part) => [...part.groups])]),
      items: [...touched.flatMap((part) => part.items), item],
    }
    for (const part of touched) parts.splice(parts.indexOf(part), 1)
    parts.push(joined)
  }
  return parts.map((part) => part.items)
}

function toCluster(kind: Cluster['kind'], items: readonly Item[]): Cluster {
  const comparisons: Comparison[] = []
  for (const item of items) addTo(comparisons, kind, item)
  return { kind, comparisons, blocks: [...new Set(items.map((item) => item.block))] }
}

function addTo(comparisons: Comparison[], kind: Cluster['kind'], item: Item) {
  const found = comparisons.find(
    (comparison) => isSameTest(kind, comparison, item) && !isOtherCell(kind, comparison, item),
  )
  if (found) {
    found.items.push(item)
    return
  }
  const { pair, outcome, shown, report } = item
  const name = nameTest(kind, item) ?? report.place.quote
  const label = nameTest(kind, shown) ?? report.place.quote
  const key = comparisons.some((comparison) => comparison.key === name) ? `${name} ${report.id}` : name
  comparisons.push({ key, label, shown, pair, outcome, items: [item] })
}

function nameTest(kind: Cluster['kind'], { pair, outcome }: Shown): string | null {
  return kind === 'pairs' || outcome === null ? (pair?.join(' – ') ?? null) : outcome
}

function isSameTest(kind: Cluster['kind'], comparison: Comparison, item: Item): boolean {
  if (kind === 'pairs') return comparison.pair?.join('|') === item.pair?.join('|')
  if (comparison.outcome === null || item.outcome === null) return false
  const votes = comparison.items.map((other) => agreement(other, item))
  // one name in two sentences with two values is two tests; with a table the name decides
  const inProse = [item, ...comparison.items].every(({ report }) => report.place.source === 'text')
  if (comparison.outcome === item.outcome) return !inProse || !votes.includes(false)
  const apart = comparison.items.some((other) => other.block === item.block)
  return !apart && votes.includes(true) && isSameName(comparison.outcome, item.outcome)
}

/** Another column of one scale is another test; so is another row, where no pair says that it is the same. */
function isOtherCell(kind: Cluster['kind'], comparison: Comparison, item: Item): boolean {
  if (item.report.place.source === 'text') return false
  return comparison.items.some(({ report, block }) => {
    if (block !== item.block || report.place.source !== item.report.place.source) return false
    if (rowOf(report) !== rowOf(item.report)) return kind === 'outcomes'
    return report.scale === item.report.scale && report.cell?.column !== item.report.cell?.column
  })
}

function rowOf({ place, cell }: Item['report']): number | null {
  return place.row ?? cell?.row ?? null
}

function mergeAll(clusters: readonly Cluster[]): Cluster[] {
  const merged: Cluster[] = []
  for (const cluster of clusters) {
    const into = merged.find((other) => belongTogether(other, cluster))
    if (into) absorb(into, cluster)
    else
      merged.push({
        ...cluster,
        comparisons: cluster.comparisons.map((c) => ({ ...c, items: [...c.items] })),
      })
  }
  return merged.length < clusters.length ? mergeAll(merged) : merged
}

function absorb(into: Cluster, cluster: Cluster) {
  for (const { items } of cluster.comparisons)
    for (const item of items) addTo(into.comparisons, into.kind, item)
  into.blocks.push(...cluster.blocks.filter((block) => !into.blocks.includes(block)))
}

/** Two clusters tell of the same tests where they share comparisons and more of these agree than contradict. */
function belongTogether(a: Cluster, b: Cluster): boolean {
  if (a.kind !== b.kind) return false
  let agree = 0
  let contradict = 0
  for (const one of a.comparisons) {
    for (const other of b.comparisons) {
      const shared = other.items[0] && isSameTest(a.kind, one, other.items[0])
      if (!shared) continue
      const votes = one.items.flatMap((x) => other.items.map((y) => agreement(x, y)))
      if (votes.includes(true)) agree += 1
      else if (votes.includes(false)) contradict += 1
      else agree += 0.5
    }
  }
  return agree > contradict
}

/** Items that name neither pair nor outcome: by their numbers where these identify them, else with their neighbours. */
function placeLoose(clusters: Cluster[], loose: readonly Item[]) {
  const rest: Item[] = []
  for (const item of loose) {
    const known = clusters
      .flatMap((cluster) => cluster.comparisons)
      .filter((comparison) => comparison.items.some((other) => isIdentified(item, other)))
    if (known.length === 1) known[0]?.items.push(item)
    else rest.push(item)
  }
  for (const block of new Set(rest.map((item) => item.block))) {
    clusters.push(
      toCluster(
        'outcomes',
        rest.filter((item) => item.block === block),
      ),
    )
  }
}
