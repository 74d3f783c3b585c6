import type { Family, HouseRules, LaidOut, Reading } from '../types'
import type { Outcome, Procedure } from '../vocabulary'
import type { Assigned } from './assign'
import type { ClaimView } from './claims'
import type { Comparison, Remarks } from './comparison'
import type { Design } from './design'
import type { Series } from './evidence'
import type { Interval } from './interval'

/**
 * A comparison with its evidence and its judgement. `raw`: the two-sided unadjusted p; `conflict`: printed evidence
 * contradicts itself; `printed`: adjusted p as the manuscript prints it; `due`: adjusted p by the procedure judged
 * by, at the m that is due; `implied`: the call follows from the stated level, it is not put in words.
 */
export type Judged = Comparison & {
  raw: Interval | null
  conflict: boolean
  printed: Interval | null
  due: Interval
  called: boolean | null
  implied: boolean
  significant: boolean | null
  survivesUpTo: number | null
}

/** Why several tests need no correction here, or why the claim leaves nothing to correct. */
export type Exemption = 'exploratory' | 'planned' | 'co-primary' | 'ordered' | 'protected' | 'single'

/**
 * A family on the bench of the engine: what was read of it, how it was judged and what came out. `procedure`: the
 * one that the calls are judged by; 'raw' where no correction is called for, 'any' where
 * none is named. `asPrinted`: the printed adjusted
 * values had to be taken as they are. `under`: the outcome at each admissible m.
 */
export type Case = {
  family: Family
  kind: 'pairs' | 'outcomes'
  comparisons: Judged[]
  assigned: Assigned
  design: Design
  procedure: Procedure | 'raw' | 'any'
  asPrinted: boolean
  alpha: number
  series: Series[]
  exemption: Exemption | null
  under: { m: number; outcome: Outcome }[]
}

/** All that a rule may look at. */
export type Bench = {
  reading: Reading
  laidOut: LaidOut
  rules: HouseRules
  remarks: Remarks
  cases: Case[]
  views: ClaimView[]
}
