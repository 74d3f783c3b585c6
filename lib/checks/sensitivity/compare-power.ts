import type { Interval } from '../numbers/printed-interval'
import { noncentralTBeyond } from '../distributions/noncentral-t'
import { tail } from '../distributions/tail'
import { dunnettQuantile, studentizedRangeQuantile, upperQuantile } from '../distributions/upper-quantile'
import type { Procedure } from '../vocabulary'
import { averagePowerStepDown, averagePowerStepUp } from './independent-power'
import { findSmallest } from './power-of-design'

/**
 * 'pairs': all pairs of `groups` groups of `n`; 'many-to-one': groups − 1 treatments against one control, all of `n`;
 * both with the variance pooled over all groups. 'independent': `m` two-sample tests on data of their own, two groups
 * of `n` each. `effect`: difference over the standard deviation, of every comparison that has one. `trueEffects`: how
 * many have one; by default 1 of the pairs, all treatments, all independent tests. `alpha`: default 0.05.
 */
export type ComparedDesign = { n: number; effect: number; alpha?: number; trueEffects?: number } & (
  { design: 'pairs' | 'many-to-one'; groups: number } | { design: 'independent'; m: number }
)

/**
 * `criticalValue`: of |t|, `perTestLevel`: its two-sided p-value; both null for procedures that go by steps. `power`:
 * of one comparison that has the effect, on average where steps make them differ; null where only its `bounds` are
 * known. `nFor80`: the smallest size of a group with power of at least 0.8; null with `power`, Infinity beyond 1e7.
 */
export type ProcedurePower = {
  procedure: Procedure | 'none'
  criticalValue: number | null
  perTestLevel: number | null
  power: number | null
  bounds: Interval
  nFor80: number | null
}

const WANTED = 0.8
const MOST_TESTS = 100

type Setting = { m: number; alpha: number; trueEffects: number; effect: number; dfOf: (n: number) => number }
/** A procedure with one critical value of |t| for all comparisons, by the degrees of freedom. */
type SingleStep = { procedure: ProcedurePower['procedure']; getCritical: (df: number) => number }

/**
 * The power of one comparison under each procedure that suits the design, without correction first. Exact for
 * single-step procedures (noncentral t at their critical value, absolute accuracy 1e-9) and, for independent tests, for
 * the step-wise ones too; Holm for dependent comparisons lies between the two bounds given: at least Bonferroni's
 * power, and at most that at alpha / (m − trueEffects + 1) plus alpha, as Holm holds the family-wise error, or that at
 * alpha. Above 100 independent tests the step-wise procedures have such bounds too, Benjamini–Hochberg from
 * Bonferroni's power to that at alpha. Nothing is simulated.
 * Throws RangeError for n that is no integer or below 2, an effect that is 0 or not finite, alpha outside (0, 1),
 * groups or m that are no integers or too few, and trueEffects outside 1 … m.
 */
export function compareProcedurePower(design: ComparedDesign): ProcedurePower[] {
  const setting = getSetting(design)
  const { n, effect } = design
  if (!(Number.isSafeInteger(n) && n >= 2)) throw new RangeError(`n is an integer of at least 2, not ${n}`)
  if (!(Number.isFinite(effect) && effect !== 0))
    throw new RangeError(`the effect is a number other than 0, not ${effect}`)

  const rows: ProcedurePower[] = []
  for (const each of listSingleSteps(design, setting)) rows.push(describeSingleStep(each, n, setting, rows))
  const sizes: SizeRange = { low: rows[0]?.nFor80 ?? 2, high: rows[1]?.nFor80 ?? 2 }
  const stepWise =
    design.design === 'independent' && setting.m <= MOST_TESTS
      ? listStepWise(setting).map((each) => describeStepWise(each, n, setting, sizes))
      : listBounded(design, setting).map((procedure) => boundStepWise(procedure, n, setting))
  return [...rows, ...stepWise]
}

function getSetting(design: ComparedDesign): Setting {
  const { alpha = 0.05, effect } = design
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  const m = countTests(design)
  const trueEffects = design.trueEffects ?? (design.design === 'pairs' ? 1 : m)
  if (!(Number.isSafeInteger(trueEffects) && trueEffects >= 1 && trueEffects <= m)) {
    throw new RangeError(`of ${m} comparisons 1 to ${m} can have an effect, not ${trueEffects}`)
  }
  const groups = design.design === 'independent' ? 2 : design.groups
  return { m, alpha, trueEffects, effect, dfOf: (n) => groups * (n - 1) }
}

function countTests(design: ComparedDesign): number {
  const count = design.design === 'independent' ? design.m : design.groups
  const least = design.design === 'independent' ? 1 : 2
  if (!(Number.isSafeInteger(count) && count >= least)) {
    throw new RangeError(`${design.design} takes an integer of at least ${least}, not ${count}`)
  }
  if (design.design === 'pairs') return (count * (count - 1)) / 2
  return design.design === 'many-to-one' ? count - 1 : count
}

function listSingleSteps(design: ComparedDesign, { m, alpha }: Setting): SingleStep[] {
  const byT = (procedure: SingleStep['procedure'], level: number): SingleStep => ({
    procedure,
    getCritical: (df) => upperQuantile('t', level, [df]),
  })
  const common = [
    byT('none', alpha),
    byT('bonferroni', alpha / m),
    byT('sidak', -Math.expm1(Math.log1p(-alpha) / m)),
  ]
  if (design.design === 'independent') return common
  const { groups } = design
  const scheffe: SingleStep = {
    procedure: 'scheffe',
    getCritical: (df) => Math.sqrt((groups - 1) * upperQuantile('F', alpha, [groups - 1, df])),
  }
  const own: SingleStep =
    design.design === 'pairs'
      ? {
          procedure: 'tukey',
          getCritical: (df) => studentizedRangeQuantile(alpha, groups, df) / Math.SQRT2,
        }
      : {
          procedure: 'dunnett',
          getCritical: (df) => dunnettQuantile(alpha, new Array<number>(m).fill(Math.SQRT1_2), df),
        }
  return [...common, own, scheffe]
}

const getPower = (critical: number, n: number, { dfOf, effect }: Setting) =>
  noncentralTBeyond(critical, dfOf(n), Math.abs(effect) * Math.sqrt(n / 2))

function describeSingleStep(
  { procedure, getCritical }: SingleStep,
  n: number,
  setting: Setting,
  [none, bonferroni]: readonly ProcedurePower[],
): ProcedurePower {
  const df = setting.dfOf(n)
  const criticalValue = getCritical(df)
  const power = getPower(criticalValue, n, setting)
  const reaches = (size: number) => getPower(getCritical(setting.dfOf(size)), size, setting) >= WANTED
  return {
    procedure,
    criticalValue,
    perTestLevel: tail('t', criticalValue, [df]),
    power,
    bounds: { low: power, high: power },
    nFor80: findSmallest(reaches, none?.nFor80 ?? 2, bonferroni?.nFor80 ?? none?.nFor80 ?? 2),
  }
}

type SizeRange = { low: number; high: number }
type StepWise = { procedure: Procedure; way: 'down' | 'up'; thresholds: number[] }

function listStepWise({ m, alpha }: Setting): StepWise[] {
  const ranks = Array.from({ length: m }, (_, i) => i + 1)
  const bonferroni = ranks.map((rank) => alpha / (m - rank + 1))
  const sidak = ranks.map((rank) => -Math.expm1(Math.log1p(-alpha) / (m - rank + 1)))
  return [
    { procedure: 'holm', way: 'down', thresholds: bonferroni },
    { procedure: 'holm-sidak', way: 'down', thresholds: sidak },
    { procedure: 'hochberg', way: 'up', thresholds: bonferroni },
    { procedure: 'bh', way: 'up', thresholds: ranks.map((rank) => (alpha * rank) / m) },
  ]
}

function describeStepWise(
  { procedure, way, thresholds }: StepWise,
  n: number,
  setting: Setting,
  sizes: SizeRange,
) {
  const at = (size: number) => {
    const df = setting.dfOf(size)
    const compute = way === 'down' ? averagePowerStepDown : averagePowerStepUp
    return compute({
      nulls: setting.m - setting.trueEffects,
      effects: setting.trueEffects,
      power: (level) => getPower(upperQuantile('t', level, [df]), size, setting),
      thresholds,
    })
  }
  const power = at(n)
  return {
    procedure,
    criticalValue: null,
    perTestLevel: null,
    power,
    bounds: { low: power, high: power },
    // More powerful than Bonferroni, less than no correction.
    nFor80:
      sizes.high === Infinity ? null : findSmallest((size) => at(size) >= WANTED, sizes.low, sizes.high),
  }
}

const listBounded = (design: ComparedDesign, setting: Setting): Procedure[] =>
  design.design === 'independent' ? listStepWise(setting).map(({ procedure }) => procedure) : ['holm']

function boundStepWise(procedure: Procedure, n: number, setting: Setting): ProcedurePower {
  const { m, alpha, trueEffects, dfOf } = setting
  const at = (level: number) => getPower(upperQuantile('t', level, [dfOf(n)]), n, setting)
  const most = at(alpha)
  const high = procedure === 'bh' ? most : Math.min(most, at(alpha / (m - trueEffects + 1)) + alpha)
  return {
    procedure,
    criticalValue: null,
    perTestLevel: null,
    power: null,
    bounds: { low: at(alpha / m), high },
    nFor80: null,
  }
}
