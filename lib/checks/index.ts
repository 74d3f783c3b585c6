export { audit, ENGINE, STAGES, type Stage } from './audit'
export {
  calculate,
  listComputable,
  type Adjusted,
  type CalculateOptions,
  type Calculation,
  type Reading,
  type Survives,
} from './calculate/calculate'
export { findDecidingDigit, type NextDigit } from './calculate/deciding-digit'
export type { Entry, EntryStatistic, Sides, Unread } from './calculate/entry'
export { fitPrinted } from './calculate/fit-printed'
export { readGroups, type GroupEntry, type ReadGroups } from './calculate/read-groups'
export { readValues, type Columns, type ReadValues, type ReadValuesOptions } from './calculate/read-values'
export { writeCalculationCsv } from './calculate/write-calculation-csv'
export { writeSummaryCsv } from './calculate/write-summary-csv'
export { dunnettUpper } from './distributions/dunnett'
export { noncentralFTails } from './distributions/noncentral-f'
export { noncentralTBeyond, noncentralTLower, noncentralTUpper } from './distributions/noncentral-t'
export { studentizedRangeUpper } from './distributions/studentized-range'
export { logTail, tail, type TailTest } from './distributions/tail'
export { dunnettQuantile, studentizedRangeQuantile, upperQuantile } from './distributions/upper-quantile'
export { defaultHouseRules } from './house-rules'
export { pBounds, type TailSides } from './numbers/p-bounds'
export { parsePrinted, parsePrintedP, type PrintedNumber, type PrintedP } from './numbers/parse-printed'
export {
  printedInterval,
  roundingInterval,
  truncationInterval,
  type Interval,
} from './numbers/printed-interval'
export { pBoundsOverSphericity } from './numbers/sphericity'
export { adjust, type AdjustOptions } from './procedures/adjust'
export { adjustBounds, type BoundOptions, type Bounds } from './procedures/adjust-bounds'
export { compareByDuncan } from './procedures/duncan'
export { compareByDunn, compareDataByDunn } from './procedures/dunn'
export { dunnettLoadings, pDunnettFromT } from './procedures/dunnett'
export { pFisherHayterFromT } from './procedures/fisher-hayter'
export { pGamesHowellFromWelch } from './procedures/games-howell'
export { pLsd } from './procedures/lsd'
export { type RangeLayout } from './procedures/multiple-range'
export { listPairs, type Pair, type PairResult } from './procedures/pairs'
export { pScheffeFromT } from './procedures/scheffe'
export { listTrueCounts } from './procedures/shaffer'
export { adjustShafferS2 } from './procedures/shaffer-s2'
export { compareBySnk } from './procedures/snk'
export { compareBySteelDwass } from './procedures/steel-dwass'
export { procedureTable, type ProcedureRow } from './procedures/table'
export { pTukeyFromT } from './procedures/tukey'
export { writeAuditScript, writeFamilyScript } from './r-script/audit-script'
export { writeCalculationScript, type ShownBeside } from './r-script/calculation-script'
export { writeSummaryScript } from './r-script/summary-script'
export { fits, fitsAdaptive, type AdaptiveFit, type FitOptions } from './recover/fits'
export {
  fitsFromStatistics,
  type PrintedStatistic,
  type StatisticFit,
  type StatisticFitOptions,
} from './recover/fits-from-statistics'
export { fitsJointly, type JointFit } from './recover/fits-jointly'
export { judgeFits, type FitVerdict } from './recover/judge-fits'
export { thresholdFits, type ThresholdFit } from './recover/threshold-fits'
export { compareProcedurePower, type ComparedDesign, type ProcedurePower } from './sensitivity/compare-power'
export {
  familyWiseError,
  familyWiseErrorAtMost,
  protectedLsdError,
  type DependenceOptions,
} from './sensitivity/family-wise-error'
export {
  computeCorrectionCost,
  computePower,
  findDetectableEffect,
  findSampleSize,
  type CorrectionCost,
  type DesignOptions,
  type SampleSize,
  type TestDesign,
} from './sensitivity/power-of-design'
export { simultaneousConfidence } from './sensitivity/simultaneous-confidence'
export { survivesRange, survivesRanges, type SurvivalRange } from './sensitivity/survives-range'
export { survivesUpTo, survivesUpToByBh, survivesUpToByHolm } from './sensitivity/survives-up-to'
export type { SummaryGroup, GroupMoments } from './summary/groups'
export type { ComparisonBounds } from './summary/bound-comparisons'
export type { OmnibusBounds } from './summary/bound-omnibus'
export type { Anova, WelchAnova } from './summary/omnibus'
export type { TTest } from './summary/pairs'
export { SUMMARY_PROCEDURES, type SummaryProcedure } from './summary/simultaneous'
export {
  summarize,
  type AdjustedComparison,
  type Summary,
  type SummaryComparison,
  type SummaryOptions,
} from './summary/summarize'
export {
  describeTable,
  type ColumnDescription,
  type ReadValue,
  type TableDescription,
} from './table/describe-table'
export * from './types'
export * from './vocabulary'
