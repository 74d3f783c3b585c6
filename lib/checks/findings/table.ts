import type { RuleRow } from './finding'
import { adjustedAboveOne } from './rules/adjusted-above-one'
import { adjustedBelowRaw } from './rules/adjusted-below-raw'
import { adjustmentAbsent } from './rules/adjustment-absent'
import { callNotUpheld } from './rules/call-not-upheld'
import { callUnderstated } from './rules/call-understated'
import { comparisonsMissing } from './rules/comparisons-missing'
import { correctedTwice } from './rules/corrected-twice'
import { errorRateMixed } from './rules/error-rate-mixed'
import { familyUnclear } from './rules/family-unclear'
import { familyUndercounted } from './rules/family-undercounted'
import { noCorrection } from './rules/no-correction'
import { oneSidedUnstated } from './rules/one-sided-unstated'
import { orderBroken } from './rules/order-broken'
import { pDiffersFromStatistic } from './rules/p-differs-from-statistic'
import { pOutOfRange } from './rules/p-out-of-range'
import { procedureDiffers } from './rules/procedure-differs'
import { procedureDoesNotControl } from './rules/procedure-does-not-control'
import { procedureUnnamed } from './rules/procedure-unnamed'
import { textTableDiffer } from './rules/text-table-differ'
import { thresholdRoundedUp } from './rules/threshold-rounded-up'
import { undecidedByRounding } from './rules/undecided-by-rounding'
import { unreadRegion } from './rules/unread-region'

/** Every rule, in the order in which findings of one severity on one page are listed. */
export const ruleTable: readonly RuleRow[] = [
  callNotUpheld,
  callUnderstated,
  orderBroken,
  familyUndercounted,
  thresholdRoundedUp,
  adjustmentAbsent,
  errorRateMixed,
  noCorrection,
  oneSidedUnstated,
  pDiffersFromStatistic,
  adjustedBelowRaw,
  procedureDiffers,
  correctedTwice,
  textTableDiffer,
  adjustedAboveOne,
  pOutOfRange,
  procedureDoesNotControl,
  familyUnclear,
  procedureUnnamed,
  comparisonsMissing,
  undecidedByRounding,
  unreadRegion,
]
