import { readGroups, type ReadGroups } from '@/lib/checks/calculate/read-groups'
import type { SummaryGroup } from '@/lib/checks/summary/groups'
import { SUMMARY_PROCEDURES } from '@/lib/checks/summary/simultaneous'
import { summarize, type Summary } from '@/lib/checks/summary/summarize'
import type { CalculatorInput } from './calculator-input'
import { readLevel } from './read-settings'

export const MOST_FOR_OWN_RANGES = 8

export type SummarizedInput = {
  read: ReadGroups
  groups: SummaryGroup[]
  summary: Summary | null
  /** Why there is no summary, in a sentence. */
  refused: string | null
  faults: { alpha?: string }
}

/** The comparisons that follow from the typed groups, or why there are none. */
export function summarizeInput(input: CalculatorInput): SummarizedInput {
  const read = readGroups(input.groups)
  const level = readLevel(input.alpha)
  if (level.value === null) {
    return {
      read,
      groups: [],
      summary: null,
      refused: 'The results wait until the level makes sense.',
      faults: level.fault ? { alpha: level.fault } : {},
    }
  }
  const kind = read.spread ?? input.spread
  const groups = read.groups.map(({ group, n, mean, meanDecimals, spread, spreadDecimals }): SummaryGroup => {
    const decimals = input.reading === 'printed' ? { meanDecimals, spreadDecimals } : {}
    const base = { group, n, mean, ...decimals }
    return kind === 'sd' ? { ...base, sd: spread } : { ...base, se: spread }
  })
  const control = groups.some(({ group }) => group === input.control) ? { control: input.control } : {}
  // Games–Howell takes a range of its own for every pair: with many groups that is no longer done at once.
  const procedures = SUMMARY_PROCEDURES.filter(
    (one) => one !== 'games-howell' || groups.length <= MOST_FOR_OWN_RANGES,
  )
  try {
    const summary = summarize(groups, { alpha: level.value, procedures, ...control })
    return { read, groups, summary, refused: null, faults: {} }
  } catch (error) {
    // What the user typed may make no comparison: that is an answer, not a fault.
    if (!(error instanceof RangeError)) throw error
    return { read, groups, summary: null, refused: `${error.message}.`, faults: {} }
  }
}
