const MAX_STEPS = 200

/**
 * A root of the decreasing continuous function `f`, starting near `guess`: the bracket is widened by `reach`, then
 * twice that and so on, until the sign changes, and narrowed by regula falsi with halved ends and bisection to a width
 * of 1e-14 (relative to the root above 1), or until |f| is `enough`. NaN where no sign change is found within 1e4 of the guess.
 * Source: the Illinois rule, Dowell and Jarratt (1971), BIT 11, 168–174.
 */
export function solveDecreasing(f: (y: number) => number, guess: number, reach = 1, enough = 0): number {
  let low = guess
  let high = guess
  let atLow = f(low)
  let atHigh = atLow
  for (let step = reach; atLow < 0 && step < 1e4; step *= 2) atLow = f((low -= step))
  for (let step = reach; atHigh > 0 && step < 1e4; step *= 2) atHigh = f((high += step))
  if (!(atLow >= 0 && atHigh <= 0)) return NaN
  if (atLow === 0) return low
  if (atHigh === 0) return high

  let side = 0
  for (let step = 1; step <= MAX_STEPS && high - low > 1e-14 * Math.max(1, Math.abs(low)); step++) {
    const chord = (low * atHigh - high * atLow) / (atHigh - atLow)
    const usable = Number.isFinite(chord) && chord > low && chord < high && step % 4 !== 0
    const middle = usable ? chord : 0.5 * (low + high)
    const value = f(middle)
    if (Math.abs(value) <= enough) return middle
    if (value > 0) {
      low = middle
      atLow = value
      if (side === 1) atHigh *= 0.5
      side = 1
    } else {
      high = middle
      atHigh = value
      if (side === -1) atLow *= 0.5
      side = -1
    }
  }
  return 0.5 * (low + high)
}
