/**
 * A recomputed value to `decimals` digits; below 0.0001 (or below what the digits can show) as `< 0.0001`.
 * A printed value is never passed through this: it is shown as it was printed.
 */
export function formatComputed(value: number, decimals: number): string {
  if (Number.isNaN(value)) return '–'
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞'
  if (value > 0 && value < 0.0001) return '< 0.0001'
  const shown = value.toFixed(Math.min(Math.max(decimals, 0), 6))
  if (value > 0 && Number(shown) === 0) return `< ${(10 ** -decimals).toFixed(decimals)}`
  return shown.replace('-', '−')
}

/** An interval of recomputed values: one value where both ends print alike, else `0.021–0.034`. */
export function formatInterval(low: number, high: number, decimals: number): string {
  const a = formatComputed(low, decimals)
  const b = formatComputed(high, decimals)
  return a === b ? a : `${a}–${b}`
}
