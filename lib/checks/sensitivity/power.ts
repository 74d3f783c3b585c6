import { normalUpper } from '../distributions/normal'
import { averageOverScale } from '../distributions/scale-mixture'
import { upperQuantile } from '../distributions/upper-quantile'

/** 'two-sample': two equal groups of `n`; 'paired': `n` pairs, or one sample of `n`. */
export type PowerDesign = 'two-sample' | 'paired'

const MOST = 1e7

/**
 * The power of a two-sided t test at level `alpha` for a standardised difference `effect` (difference over standard
 * deviation; of the differences where paired) with `n` >= 2 per group or pairs; both tails count. The
 * non-central t as a mixture of normals over the estimated standard deviation; absolute accuracy 1e-10.
 * With alpha / m it is the power that is left after a Bonferroni correction for m tests.
 * Throws RangeError for n below 2 and for alpha outside (0, 1).
 */
export function powerOfTTest(design: PowerDesign, n: number, effect: number, alpha: number): number {
  if (!(n >= 2)) throw new RangeError(`a t test takes at least 2 observations, not ${n}`)
  if (!(alpha > 0 && alpha < 1)) throw new RangeError(`alpha lies between 0 and 1, not at ${alpha}`)
  const df = design === 'two-sample' ? 2 * n - 2 : n - 1
  const shift = Math.abs(effect) * Math.sqrt(design === 'two-sample' ? n / 2 : n)
  const critical = upperQuantile('t', alpha, [df])
  const beyond = (s: number) => normalUpper(critical * s - shift) + normalUpper(critical * s + shift)
  return Math.min(
    1,
    averageOverScale(df, beyond, () => 0, Math.max(1, shift)),
  )
}

/**
 * The smallest `n` per group (or of pairs) at which `powerOfTTest` reaches `power`; Infinity where 1e7 does not.
 * Throws RangeError for power outside (0, 1) and for an effect of 0.
 */
export function sampleSizeOfTTest(design: PowerDesign, power: number, effect: number, alpha: number): number {
  if (!(power > 0 && power < 1)) throw new RangeError(`power lies between 0 and 1, not at ${power}`)
  if (effect === 0 || Number.isNaN(effect)) throw new RangeError('the effect must differ from 0')
  const reaches = (n: number) => powerOfTTest(design, n, effect, alpha) >= power
  let high = 2
  while (!reaches(high)) {
    high *= 2
    if (high > MOST) return Infinity
  }
  let low = Math.max(1, high / 2)
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2)
    if (middle >= 2 && reaches(middle)) high = middle
    else low = middle
  }
  return high
}

/** What a Bonferroni correction for `m` tests costs: the power without and with it. */
export function powerCost(
  design: PowerDesign,
  n: number,
  effect: number,
  alpha: number,
  m: number,
): { without: number; with: number } {
  return { without: powerOfTTest(design, n, effect, alpha), with: powerOfTTest(design, n, effect, alpha / m) }
}
