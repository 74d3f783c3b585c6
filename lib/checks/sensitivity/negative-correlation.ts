import { HALF_LOG_TWO_PI } from '../distributions/special'

const POINTS = 24

/** Nodes and weights of Gauss–Legendre on [0, 1]. Source: Newton's method on the recurrence, Abramowitz and Stegun 25.4.30. */
const legendre = Array.from({ length: POINTS }, (_, i) => {
  let x = Math.cos((Math.PI * (i + 0.75)) / (POINTS + 0.5))
  let slope = 1
  for (let round = 0; round < 8; round++) {
    let before = 1
    let value = x
    for (let k = 2; k <= POINTS; k++)
      [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k]
    slope = (POINTS * (x * value - before)) / (x * x - 1)
    x -= value / slope
  }
  return { x: 0.5 * (1 + x), weight: 1 / ((1 - x * x) * slope * slope) }
})

/** log |∫ from −a to a of φ(x + ib) dx| and its sign: the integral is real, exp(b²/2) 2 ∫ from 0 to a of φ(x) cos(bx) dx. */
function shiftedMass(a: number, b: number): { log: number; sign: number } {
  const panels = 1 + Math.ceil((a * (b + 1)) / 8)
  let sum = 0
  for (let panel = 0; panel < panels; panel++) {
    for (const { x, weight } of legendre) {
      const at = (a * (panel + x)) / panels
      sum += ((2 * a * weight) / panels) * Math.exp(-0.5 * at * at - HALF_LOG_TWO_PI) * Math.cos(b * at)
    }
  }
  return { log: Math.log(Math.abs(sum)) + 0.5 * b * b, sign: Math.sign(sum) }
}

/**
 * P(max |Z_i| > c) for m >= 3 standard normals with the common correlation −`size`, 0 < size < 1 / (m − 1). The
 * common factor of the positive case becomes imaginary; the integral over it stays real.
 * Source: Steck and Owen (1962), Biometrika 49, 443–445. Absolute accuracy 1e-8, less as size nears 1 / (m − 1).
 */
export function negativelyCorrelatedUpper(c: number, m: number, size: number): number {
  const own = Math.sqrt(1 + size)
  const loading = Math.sqrt(size)
  const decay = (1 - (m - 1) * size) / (1 + size)
  const reach = Math.min(200, Math.sqrt(80 / decay))
  const step = 0.02 * Math.min(5, Math.sqrt(1 / (m * size)))
  let inside = 0
  for (let j = -Math.ceil(reach / step); j <= reach / step; j++) {
    const z = j * step
    const { log, sign } = shiftedMass(c / own, (loading * Math.abs(z)) / own)
    inside += sign ** m * Math.exp(m * log - 0.5 * z * z - HALF_LOG_TWO_PI)
  }
  return Math.min(1, Math.max(0, 1 - inside * step))
}
