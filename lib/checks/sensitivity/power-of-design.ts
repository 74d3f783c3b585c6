import { noncentralFTails } from '../distributions/noncentral-f'
import { noncentralTBeyond, noncentralTUpper } from '../distributions/noncentral-t'
import { solveDecreasing } from '../distributions/solve'
import { upperQuantile } from '../distributions/upper-quantile'

/**
 * 'two-sample': two groups of n each; 'paired': n pairs, or one sample of n; 'one-way': `groups` of n each, compared
 * by F.
 */
export type TestDesign = 'two-sample' | 'paired' | 'one-way'

/**
 * `alpha`: level of the test, in (0, 1), default 0.05. `groups` >= 2: for 'one-way' only. `farTail`: whether a
 * two-sided t test counts rejections in the wrong direction (default true; false is R's power.t.test by default).
 */
export type DesignOptions = { design: TestDesign; alpha?: number; groups?: number; farTail?: boolean }

/** Sample sizes per group (or of pairs): the smallest real one, and the smallest whole one. */
export type SampleSize = { continuous: number; whole: number }

const MOST = 1e7

/**
 * The power of a test with `n` >= 2 observations per group (fractions allowed). `effect`: for t tests the difference
 * over the standard deviation (of the differences where paired); for 'one-way' the standard deviation of the group
 * means (divisor: number of groups) over that within groups. Assumes normal observations with one variance.
 * Absolute accuracy 1e-12. Throws RangeError for n below 2, alpha outside (0, 1), an effect that is not finite, and
 * 'one-way' without an integer number of groups of at least 2.
 * Source: noncentral t and F; Cohen (1988), Statistical Power Analysis, chapters 2 and 8.
 */
export function computePower(options: DesignOptions & { n: number; effect: number }): number {
  const { design, n, effect, alpha = 0.05, farTail = true } = options
  if (!(n >= 2)) throw new RangeError(`a design takes at least 2 observations per group, not ${n}`)
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  if (!Number.isFinite(effect)) throw new RangeError(`the effect is a finite number, not ${effect}`)
  if (design === 'one-way') return computePowerOfF(getGroups(options), n, effect, alpha)
  const df = design === 'two-sample' ? 2 * n - 2 : n - 1
  const shift = Math.abs(effect) * Math.sqrt(design === 'two-sample' ? n / 2 : n)
  const critical = upperQuantile('t', alpha, [df])
  return farTail ? noncentralTBeyond(critical, df, shift) : noncentralTUpper(critical, df, shift)
}

function getGroups({ groups }: DesignOptions): number {
  if (groups === undefined || !(Number.isSafeInteger(groups) && groups >= 2)) {
    throw new RangeError(`a one-way design takes an integer number of groups, at least 2, not ${groups}`)
  }
  return groups
}

function computePowerOfF(groups: number, n: number, effect: number, alpha: number): number {
  const dfs: [number, number] = [groups - 1, groups * (n - 1)]
  const critical = upperQuantile('F', alpha, dfs)
  return noncentralFTails(critical, ...dfs, groups * n * effect * effect).upper
}

/**
 * The sample size at which a test reaches `power` in (0, 1), at least 2; both Infinity where 1e7 per group do not.
 * Relative accuracy 1e-9. Throws RangeError for power outside (0, 1), an effect of 0, and as `computePower` does.
 */
export function findSampleSize(options: DesignOptions & { power: number; effect: number }): SampleSize {
  const { power, effect } = options
  if (!(power > 0 && power < 1)) throw new RangeError(`power lies between 0 and 1, not at ${power}`)
  if (effect === 0) throw new RangeError('no sample finds an effect of 0')
  const at = (n: number) => computePower({ ...options, n })
  const whole = findSmallest((n) => at(n) >= power, 2, 2)
  if (whole <= 2 || whole === Infinity) return { continuous: whole, whole }
  const log = solveDecreasing((y) => power - at(Math.exp(y)), Math.log(whole), Math.log(whole / (whole - 1)))
  return { continuous: Math.exp(log), whole }
}

/**
 * The smallest integer n >= low at which `reaches` is true, for a question whose answer changes once; `high`: where to
 * look first, doubled as long as needed. Infinity where 1e7 is not enough.
 */
export function findSmallest(reaches: (n: number) => boolean, low: number, high: number): number {
  if (reaches(low)) return low
  let [below, above] = [low, Math.max(high, low + 1)]
  while (!reaches(above)) {
    below = above
    above *= 2
    if (above > MOST) return Infinity
  }
  while (above - below > 1) {
    const middle = Math.floor((below + above) / 2)
    if (reaches(middle)) above = middle
    else below = middle
  }
  return above
}

/**
 * The effect, in the units of `computePower`, that `n` per group find with `power` in (alpha, 1). Relative accuracy
 * 1e-9. Throws RangeError for power outside (alpha, 1) and as `computePower` does.
 */
export function findDetectableEffect(options: DesignOptions & { n: number; power: number }): number {
  const { power, n, alpha = 0.05 } = options
  if (!(power > alpha && power < 1)) throw new RangeError(`power lies between alpha and 1, not at ${power}`)
  const guess = Math.log(3 / Math.sqrt(n))
  return Math.exp(
    solveDecreasing((y) => power - computePower({ ...options, effect: Math.exp(y) }), guess, 0.3),
  )
}

/**
 * `level`: alpha / m. `without` and `with`: power at alpha and at alpha / m; `lost`: their difference. `regain`:
 * the sample size at which the corrected test has the power that the uncorrected one has at n; `ratio`: its
 * continuous value over n. `detectable`: the effects that n find with 80% power (null where alpha is 0.8 or more).
 */
export type CorrectionCost = {
  level: number
  without: number
  with: number
  lost: number
  regain: SampleSize
  ratio: number
  detectable: { without: number; with: number } | null
}

/**
 * What a Bonferroni correction for `m` >= 1 tests costs one test of the design. Throws RangeError for m that is no
 * positive integer, an effect of 0, and as `computePower` does.
 */
export function computeCorrectionCost(
  options: DesignOptions & { n: number; effect: number; m: number },
): CorrectionCost {
  const { n, m, alpha = 0.05 } = options
  if (!(Number.isSafeInteger(m) && m >= 1)) throw new RangeError(`m is a positive integer, not ${m}`)
  const level = alpha / m
  const without = computePower({ ...options, alpha })
  const corrected = computePower({ ...options, alpha: level })
  // A power that a double rounds to 1 is reached at its last step below.
  const regain = findSampleSize({ ...options, alpha: level, power: Math.min(without, 1 - 1e-12) })
  const detect = (at: number) => findDetectableEffect({ ...options, alpha: at, power: 0.8 })
  return {
    level,
    without,
    with: corrected,
    lost: without - corrected,
    regain,
    ratio: regain.continuous / n,
    detectable: alpha < 0.8 ? { without: detect(alpha), with: detect(level) } : null,
  }
}
