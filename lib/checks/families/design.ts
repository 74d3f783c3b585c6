import type { ClaimView } from './claims'
import type { Cluster, Remarks } from './comparison'
import { isAllCompared } from './remarks'

/**
 * What the tests of a family are, and how many there are to be counted. `due`: null where the text allows more than
 * one number, which `alternatives` then lists in ascending order. `why`: one sentence.
 */
export type Design = {
  kind: 'all-pairs' | 'many-to-one' | 'contrasts' | 'outcomes'
  groups: string[]
  due: number | null
  alternatives: number[]
  why: string
}

const numberWords = 'zero one two three four five six seven eight nine ten eleven twelve'.split(' ')

/** The number as a word up to twelve, else in figures. */
export function inWords(n: number): string {
  return numberWords[n] ?? String(n)
}

/** "one test is", "six tests are" */
export function count(n: number, one: string, several: string): string {
  return `${inWords(n)} ${n === 1 ? one : several}`
}

/**
 * The design of a family. `alternatives`: numbers of tests between which the text leaves the choice, from joining the
 * same pairs for several outcomes; empty where it does not.
 */
export function designOf(
  cluster: Cluster,
  view: ClaimView | null,
  remarks: Remarks,
  alternatives: readonly number[] = [],
): Design {
  if (cluster.kind === 'outcomes') return ofOutcomes(cluster, view)
  const shown = cluster.comparisons.length
  const pairs = new Set(cluster.comparisons.map(({ pair }) => pair?.join('|'))).size
  if (pairs === shown) return ofPairs(cluster, view, remarks)
  const groups = [...new Set(cluster.comparisons.flatMap(({ pair }) => pair ?? []))]
  const each = `${inWords(pairs)} pairs for each of ${inWords(Math.round(shown / pairs))} outcomes`
  if (alternatives.length === 0) return settled('all-pairs', groups, shown, `${each}, corrected together`)
  const why = `${each}; the text does not say whether the correction is within an outcome or across them`
  return { kind: 'all-pairs', groups, due: null, alternatives: [...alternatives], why }
}

function settled(kind: Design['kind'], groups: string[], due: number, why: string): Design {
  return { kind, groups, due, alternatives: [], why }
}

function ofPairs(cluster: Cluster, view: ClaimView | null, remarks: Remarks): Design {
  const pairs = cluster.comparisons.flatMap(({ pair }) => (pair ? [pair] : []))
  const groups = [...new Set(pairs.flat())]
  const k = groups.length
  const full = (k * (k - 1)) / 2
  const all = saysAllCompared(view, remarks)
  const stated = all === null ? k : Math.max(k, countIn(all))
  if (stated > k) return everyPair(groups, stated, ', and the manuscript says that all were compared')
  if (pairs.length === full && k >= 3) return everyPair(groups, k)
  if (pairs.length === 1)
    return settled('contrasts', groups, Math.max(1, view?.m ?? 0), 'one comparison is reported')

  const center = groups.find((group) => pairs.every((pair) => pair.includes(group)))
  const star = center !== undefined && pairs.length === k - 1
  const saysAll =
    view?.procedure === 'tukey' || all !== null || (view?.design === 'all-pairs' && view.m !== pairs.length)
  const manyToOne = view?.design === 'many-to-one' || view?.procedure === 'dunnett'
  if (star && (manyToOne || !saysAll)) {
    const due = Math.max(k - 1, view?.m ?? 0)
    const more = due > k - 1 ? `, and the manuscript counts ${due}` : ''
    return settled(
      'many-to-one',
      groups,
      due,
      `${count(k - 1, 'group', 'groups')} compared with ${printedName(cluster, center)}${more}`,
    )
  }
  if (saysAll && isNumberOfGroups(k, view, remarks)) {
    return everyPair(groups, k, ', and the manuscript says that all were compared')
  }
  const due = Math.max(pairs.length, view?.m ?? 0)
  const counted = due > pairs.length ? `; the manuscript counts ${due}` : ''
  return settled(
    'contrasts',
    groups,
    due,
    `${count(pairs.length, 'comparison is', 'comparisons are')} reported${counted}`,
  )
}

function printedName({ comparisons }: Cluster, group: string): string {
  const found = comparisons.find(({ pair }) => pair?.includes(group))
  return found?.shown.pair?.[found.pair?.indexOf(group) ?? 0] ?? group
}

function everyPair(groups: string[], k: number, more = ''): Design {
  const due = (k * (k - 1)) / 2
  const why = `${inWords(k)} groups give ${k} × ${k - 1} / 2 = ${due} pairwise comparisons${more}`
  return settled('all-pairs', groups, due, why)
}

/** The sentence that says that all groups were compared with each other; of the claim, or of a manuscript with one set of pairs. */
function saysAllCompared(view: ClaimView | null, { allCompared }: Remarks): string | null {
  return view?.all.map(({ sentence }) => sentence).find(isAllCompared) ?? allCompared
}

/** "all four substrates", "the 5 media": the number of groups in the sentence, 0 where it has none. */
function countIn(sentence: string): number {
  const found =
    /\b(?:all|the|of)\s+(\d{1,2}|\p{L}+)\s+(?!pair|compar|test|contrast|outcome|endpoint|measure|variable)\p{L}{3,}/giu
  for (const [, word = ''] of sentence.matchAll(found)) {
    const n = /^\d/.test(word) ? Number(word) : numberWords.indexOf(word.toLowerCase())
    if (n >= 3 && n <= 12) return n
  }
  return 0
}

/** Names are read from prose and may be misread: the number of groups must be stated or shown somewhere else too. */
function isNumberOfGroups(k: number, view: ClaimView | null, { text, tables }: Remarks): boolean {
  if (view?.groups === k) return true
  const stated = new RegExp(`\\b(?:${inWords(k)}|${k})\\s+\\p{L}{3,}`, 'iu')
  return stated.test(text) || tables.some((table) => table.rows.length === k)
}

function ofOutcomes(cluster: Cluster, view: ClaimView | null): Design {
  const shown = cluster.comparisons.length
  const m = view?.m ?? null
  const counted = `${count(shown, 'test is', 'tests are')} reported`
  if (m === null || m === shown) return settled('outcomes', [], shown, counted)
  if (m > shown)
    return settled(
      'outcomes',
      [],
      m,
      `the manuscript counts ${m} tests, of which ${shown} ${shown === 1 ? 'is' : 'are'} shown`,
    )
  return {
    kind: 'outcomes',
    groups: [],
    due: null,
    alternatives: [m, shown],
    why: `the manuscript counts ${m} ${m === 1 ? 'test' : 'tests'}; ${shown} are reported together`,
  }
}
