/**
 * `nulls` true null hypotheses, whose p-values are uniform, and `effects` false ones, whose p-values are at most x
 * with probability `power(x)`; all independent. `thresholds`: ascending, one for each rank.
 */
export type IndependentTests = {
  nulls: number
  effects: number
  power: (level: number) => number
  thresholds: readonly number[]
}

/** States less likely than this are dropped; what they carry is below 1e-12 in all. */
const NEGLIGIBLE = 1e-19

/**
 * The probability that a false null hypothesis is rejected, by a step-down procedure: the j smallest p-values are
 * rejected as long as the i-th is at most the i-th threshold for every i <= j (Holm, Holm–Šidák). Exact, absolute
 * accuracy 1e-11: the numbers of true and of false null hypotheses with p at most the thresholds make a Markov chain
 * over the thresholds, as a p-value above one threshold falls below the next independently of all others. The
 * procedure stops at the first threshold that fewer p-values lie below than its rank.
 */
export function averagePowerStepDown({ nulls, effects, power, thresholds }: IndependentTests): number {
  const size = effects + 1
  let states = new Float64Array((nulls + 1) * size)
  states[0] = 1
  let [level, reached] = [0, 0]
  let found = 0
  thresholds.forEach((next, i) => {
    const nextReached = power(next)
    states = spread(states, nulls, effects, share(next, level), share(nextReached, reached))
    ;[level, reached] = [next, nextReached]
    found += stop(states, nulls, effects, i)
  })
  states.forEach((probability, index) => (found += probability * (index % size)))
  return found / effects
}

const share = (next: number, before: number) => (before >= 1 ? 0 : (next - before) / (1 - before))

/** Takes out the states with `count` p-values in all, and gives the false null hypotheses that they hold. */
function stop(states: Float64Array, nulls: number, effects: number, count: number): number {
  let found = 0
  for (let b = Math.max(0, count - nulls); b <= Math.min(effects, count); b++) {
    const index = (count - b) * (effects + 1) + b
    found += (states[index] ?? 0) * b
    states[index] = 0
  }
  return found
}

/** Every p-value that is not yet below moves below with its probability, first the true, then the false hypotheses'. */
function spread(
  states: Float64Array,
  nulls: number,
  effects: number,
  moveNull: number,
  moveEffect: number,
): Float64Array<ArrayBuffer> {
  const size = effects + 1
  const half = new Float64Array(states.length)
  forEachState(states, size, (probability, a, b) => {
    binomial(nulls - a, moveNull, (more, chance) => {
      const index = (a + more) * size + b
      half[index] = (half[index] ?? 0) + probability * chance
    })
  })
  const whole = new Float64Array(states.length)
  forEachState(half, size, (probability, a, b) => {
    binomial(effects - b, moveEffect, (more, chance) => {
      const index = a * size + b + more
      whole[index] = (whole[index] ?? 0) + probability * chance
    })
  })
  return whole
}

function forEachState(
  states: Float64Array,
  size: number,
  visit: (probability: number, a: number, b: number) => void,
) {
  states.forEach((probability, index) => {
    if (probability > NEGLIGIBLE) visit(probability, Math.floor(index / size), index % size)
  })
}

/** The chances of 0, 1, … of `count` independent events of probability `p`, from 0 on as long as they matter. */
function binomial(count: number, p: number, visit: (events: number, chance: number) => void) {
  if (p >= 1) return visit(count, 1)
  const odds = p / (1 - p)
  // (1 − p)^count is above 1e-300 for the counts and levels in use, else the far side is where the chances are.
  let chance = Math.exp(count * Math.log1p(-p))
  if (chance < 1e-290) return binomialFromMode(count, p, visit)
  for (let events = 0; events <= count; events++) {
    visit(events, chance)
    if (events > count * p && chance < NEGLIGIBLE) return
    chance *= ((count - events) / (events + 1)) * odds
  }
}

function binomialFromMode(count: number, p: number, visit: (events: number, chance: number) => void) {
  const chances = new Float64Array(count + 1)
  const mode = Math.floor((count + 1) * p)
  const odds = p / (1 - p)
  chances[mode] = 1
  for (let j = mode; j < count; j++) chances[j + 1] = (chances[j] ?? 0) * ((count - j) / (j + 1)) * odds
  for (let j = mode; j > 0; j--) chances[j - 1] = ((chances[j] ?? 0) * j) / (count - j + 1) / odds
  const total = chances.reduce((sum, chance) => sum + chance, 0)
  chances.forEach((chance, events) => visit(events, chance / total))
}

/**
 * The same for a step-up procedure: the j smallest p-values are rejected for the largest j whose p-value is at most
 * its threshold (Hochberg, Benjamini–Hochberg). From the largest threshold down: a p-value below one threshold lies
 * below the next smaller one independently of all others, and the procedure stops at the first threshold that as many
 * p-values lie below as its rank says.
 */
export function averagePowerStepUp({ nulls, effects, power, thresholds }: IndependentTests): number {
  const size = effects + 1
  let states = new Float64Array((nulls + 1) * size)
  states[nulls * size + effects] = 1
  let [level, reached] = [1, 1]
  let found = 0
  for (let rank = thresholds.length; rank >= 1; rank--) {
    const next = thresholds[rank - 1] ?? 0
    const nextReached = power(next)
    states = thin(states, nulls, effects, next / level, reached === 0 ? 0 : nextReached / reached)
    ;[level, reached] = [next, nextReached]
    found += stop(states, nulls, effects, rank)
  }
  return found / effects
}

/** Every p-value that lies below stays there with its probability. */
function thin(
  states: Float64Array,
  nulls: number,
  effects: number,
  keepNull: number,
  keepEffect: number,
): Float64Array<ArrayBuffer> {
  // Counting those above instead of those below, staying becomes moving.
  const mirror = (from: Float64Array) => from.slice().reverse()
  return mirror(spread(mirror(states), nulls, effects, 1 - keepNull, 1 - keepEffect))
}
