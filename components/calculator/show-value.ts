import type { Survives } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import type { Interval } from '@/lib/checks/numbers/printed-interval'
import { recomputedInterval } from '../charts/printed-p'

/** Names for what was given none. */
export const nameOf = (entry: Entry, index: number): string => entry.name || `test ${index + 1}`

/** An adjusted interval to one digit more than the entry is printed with. */
export function showAdjusted({ low, high }: Interval, entry: Entry): string {
  return recomputedInterval([low, high], Math.min(Math.max(entry.decimals, 2), 5))
}

/** Ends of the interval that a print stands for, with one digit more than the print. */
export function showInterval({ low, high }: Interval, decimals: number): string {
  const show = (value: number) =>
    value === 0 || value === 1 || value >= 1e-4
      ? String(Number(value.toFixed(Math.min(12, decimals + 1))))
      : value.toExponential(2).replace('e-', 'e−')
  return low === high ? show(low) : `${show(low)} to ${show(high)}`
}

/** '5'; '5 – 6' where the rounding leaves the sixth open; '–' for none, '∞' for any. */
export function showSurvives({ certain, possible }: Survives): string {
  const show = (m: number) => (m === 0 ? '–' : Number.isFinite(m) ? m.toLocaleString('en') : '∞')
  if (certain === possible) return show(certain)
  return certain === 0 ? `0 – ${show(possible)}` : `${show(certain)} – ${show(possible)}`
}
