import { procedureTable } from '../procedures/table'
import type { Outcome, Procedure } from '../vocabulary'
import type { Exemption, Judged } from './case'
import { inWords, type Design } from './design'

/** Calls that are certainly other than the judgement, and calls that it cannot decide. */
export function countCalls(comparisons: readonly Judged[]): { stated: number; wrong: number; open: number } {
  const stated = comparisons.filter(({ called }) => called !== null)
  return {
    stated: stated.length,
    wrong: stated.filter(({ called, significant }) => significant !== null && significant !== called).length,
    open: stated.filter(({ significant }) => significant === null).length,
  }
}

/** `corrected`: a correction was made or claimed, or none is called for. */
export function outcomeOf(comparisons: readonly Judged[], corrected: boolean): Outcome {
  if (!corrected) return 'uncorrected'
  const { wrong, open } = countCalls(comparisons)
  if (wrong > 0) return 'fails'
  return open > 0 ? 'undecidable' : 'holds'
}

type Grounds = {
  procedure: Procedure | 'raw' | 'any'
  design: Design
  alpha: number
  exemption: Exemption | null
  /** The procedure that the manuscript names where the calls are judged by another, as it claims another error rate. */
  instead: Procedure | null
  under: readonly { m: number; outcome: Outcome }[]
}

/** The procedure in words that follow "by". */
export function nameOf(procedure: Procedure | 'raw' | 'any'): string {
  if (procedure === 'raw') return 'the unadjusted values'
  return procedure === 'any' ? 'any of the common procedures' : procedureTable[procedure].label
}

/** What an outcome means for the stated calls. */
export const standing: Record<Outcome, string> = {
  holds: 'all stated calls stand',
  fails: 'at least one stated call does not stand',
  undecidable: 'at least one stated call cannot be decided',
  uncorrected: 'nothing was corrected',
}

const exempt: Record<Exemption, string> = {
  exploratory: 'the tests are declared exploratory',
  planned: 'a few planned contrasts are claimed one by one',
  'co-primary': 'all tests must succeed together',
  ordered: 'the tests follow a stated order',
  protected: 'with three groups the overall test protects the pairs',
  single: 'there is one test',
}

/** One sentence on the outcome. */
export function whyOf(comparisons: readonly Judged[], outcome: Outcome, grounds: Grounds): string {
  const { stated, wrong, open } = countCalls(comparisons)
  const { procedure, design, alpha, exemption, instead, under } = grounds
  const name = nameOf(procedure)
  const by = design.due === null || procedure === 'raw' ? name : `${name} with m = ${design.due}`
  const calls = stated === 1 ? 'the one stated call' : `the ${stated} stated calls`
  const every = stated === 1 ? calls : stated === 2 ? 'both stated calls' : `all ${stated} stated calls`
  const some = (n: number) => (n === stated ? every : `${inWords(n)} of ${calls}`)
  if (under.length > 0) {
    const each = under.map(({ m, outcome: found }) => `with m = ${m} ${standing[found]}`).join(', ')
    return `The text allows more than one family: ${each}.`
  }
  if (outcome === 'uncorrected') {
    const start = `${comparisons.length} tests, and no correction was found`
    if (stated === 0) return `${start}; no call of significance is stated.`
    if (wrong > 0) return `${start}; by ${by}, ${some(wrong)} at ${alpha} would not stand.`
    if (open > 0)
      return `${start}; by ${by}, ${some(open)} could not be decided, and none would certainly fall.`
    return `${start}; by ${by}, ${every} would stand all the same.`
  }
  const reason =
    instead !== null
      ? ` (${nameOf(instead)} is named, but control of the family-wise error rate is claimed)`
      : exemption
        ? ` (${exempt[exemption]})`
        : ''
  if (outcome === 'fails')
    return `By ${by}${reason}, ${some(wrong)} at ${alpha} ${wrong === 1 ? 'does' : 'do'} not agree.`
  if (outcome === 'undecidable')
    return `By ${by}${reason}, ${some(open)} at ${alpha} cannot be decided from what is printed.`
  if (stated === 0) return `No call of significance is stated that could be held against ${by}${reason}.`
  return `By ${by}${reason}, ${every} at ${alpha} ${stated === 1 ? 'agrees' : 'agree'}.`
}
