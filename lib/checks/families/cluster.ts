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
  const byPair = new Map<string, Item[]>()
  for (const item of items) {
    const pair = item.pair?.join('|') ?? ''
    const alike = byPair.get(pair) ?? []
    byPair.set(pair, alike)
    if (alike.some((other) => isOther(other, item) && agreement(other, item) !== true)) return true
    alike.push(item)
  }
  return false
}

function isOther(a: Item, b: Item): boolean {
  return a.outcome !== null && b.outcome !== null && !isSameName(a.outcome, b.outcome)
}

function splitByOutcome(items: readonly Item[]): Item[][] {
  if (!isRepeated(items)) return items.length > 0 ? [[...items]] : []
  const parts: { outcome: string | null; items: Item[] }[] = []
  // Parts are only added behind: the first one that an outcome fits stays the first.
  const partOf = new Map<string | null, { items: Item[] }>()
  for (const item of items) {
    const part =
      partOf.get(item.outcome) ??
      parts.find(({ outcome }) => outcome && item.outcome && isSameName(outcome, item.outcome))
    const into: { items: Item[] } = part ?? { items: [] }
    if (!part) parts.push({ outcome: item.outcome, items: into.items })
    partOf.set(item.outcome, into)
    into.items.push(item)
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
  if (kind === 'pairs') return isSamePair(comparison.pair, item.pair)
  if (comparison.outcome === null || item.outcome === null) return false
  const agrees = (verdict: boolean) => comparison.items.some((other) => agreement(other, item) === verdict)
  if (comparison.outcome === item.outcome) {
    // one name in two sentences with two values is two tests; with a table the name decides
    const inProse = [item, ...comparison.items].every(({ report }) => report.place.source === 'text')
    return !inProse || !agrees(false)
  }
  const apart = comparison.items.some((other) => other.block === item.block)
  return !apart && agrees(true) && isSameName(comparison.outcome, item.outcome)
}

function isSamePair(a: Comparison['pair'], b: Comparison['pair']): boolean {
  return a === b || (a !== null && b !== null && a[0] === b[0] && a[1] === b[1])
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
  const pairs = a.kind === 'pairs' ? indexPairs(b) : null
  for (const one of a.comparisons) {
    const candidates = pairs ? (pairs.get(one.pair?.join('|')) ?? []) : b.comparisons
    for (const other of candidates) {
      const shared = other.items[0] && isSameTest(a.kind, one, other.items[0])
      if (!shared) continue
      const verdict = agreementOf(one, other)
      if (verdict === true) agree += 1
      else if (verdict === false) contradict += 1
      else agree += 0.5
    }
  }
  return agree > contradict
}

/** True where any of their prints agree, false where some contradict and none agrees, null where none can be compared. */
function agreementOf(one: Comparison, other: Comparison): boolean | null {
  let contradicts = false
  for (const x of one.items)
    for (const y of other.items) {
      const verdict = agreement(x, y)
      if (verdict === true) return true
      contradicts ||= verdict === false
    }
  return contradicts ? false : null
}

const indexed = new WeakMap<Cluster, Map<string | undefined, Comparison[]>>()

/** Comparisons by the pair of their first item. A cluster that is being placed does not change meanwhile. */
function indexPairs(cluster: Cluster): Map<string | undefined, Comparison[]> {
  const known = indexed.get(cluster)
  if (known) return known
  const byPair = new Map<string | undefined, Comparison[]>()
  for (const comparison of cluster.comparisons) {
    const pair = comparison.items[0]?.pair?.join('|')
    const alike = byPair.get(pair) ?? []
    byPair.set(pair, alike)
    alike.push(comparison)
  }
  indexed.set(cluster, byPair)
  return byPair
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
