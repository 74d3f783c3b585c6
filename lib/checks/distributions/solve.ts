const MAX_STEPS = 200

/**
 * A root of the decreasing continuous function `f`, starting near `guess`: the bracket is widened until the sign
 * changes, then narrowed by regula falsi with halved ends and bisection to a width of 1e-14 (relative to the root
 * above 1). NaN where no sign change is found within 1e4 of the guess.
 * Source: the Illinois rule, Dowell and Jarratt (1971), BIT 11, 168–174.
 */
export function solveDecreasing(f: (y: number) => number, guess: number): number {
  let low = guess
  let high = guess
  let atLow = f(low)
  let atHigh = atLow
  for (let reach = 1; atLow < 0 && reach < 1e4; reach *= 2) atLow = f((low -= reach))
  for (let reach = 1; atHigh > 0 && reach < 1e4; reach *= 2) atHigh = f((high += reach))
  if (!(atLow >= 0 && atHigh <= 0)) return NaN
  if (atLow === 0) return low
  if (atHigh === 0) return high

  let side = 0
  for (let step = 1; step <= MAX_STEPS && high - low > 1e-14 * Math.max(1, Math.abs(low)); step++) {
    const chord = (low * atHigh - high * atLow) / (atHigh - atLow)
    const usable = Number.isFinite(chord) && chord > low && chord < high && step % 4 !== 0
    const middle = usable ? chord : 0.5 * (low + high)
    const value = f(middle)
    if (value === 0) return middle
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
