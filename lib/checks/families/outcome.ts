import { procedureTable } from '../procedures/table'
import type { Outcome, Procedure } from '../vocabulary'
import type { Exemption, Judged } from './case'
import type { Design } from './design'

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
  under: readonly { m: number; outcome: Outcome }[]
}

/** The procedure in words that follow "by". */
export function nameOf(procedure: Procedure | 'raw' | 'any'): string {
  if (procedure === 'raw') return 'the unadjusted values'
  return procedure === 'any' ? 'any of the common procedures' : procedureTable[procedure].label
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
  const { procedure, design, alpha, exemption, under } = grounds
  const name = nameOf(procedure)
  const by = design.due === null ? name : `${name} with m = ${design.due}`
  const calls = `${stated} stated ${stated === 1 ? 'call' : 'calls'}`
  if (under.length > 0) {
    const each = under.map(({ m, outcome: found }) => `${found} with m = ${m}`).join(', ')
    return `The text allows more than one family: ${each}.`
  }
  if (outcome === 'uncorrected') {
    return `${comparisons.length} tests and no correction; by ${by} ${wrong} of ${calls} would not stand.`
  }
  const reason = exemption ? ` (${exempt[exemption]})` : ''
  if (outcome === 'fails')
    return `By ${by}${reason} ${wrong} of ${calls} at ${alpha} ${wrong === 1 ? 'does' : 'do'} not agree.`
  if (outcome === 'undecidable')
    return `By ${by}${reason} ${open} of ${calls} cannot be decided from what is printed.`
  if (stated === 0) return `No call of significance is stated that could be held against ${by}${reason}.`
  return `By ${by}${reason} all ${calls} at ${alpha} agree.`
}
