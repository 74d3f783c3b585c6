import type { Statistic } from '@/lib/checks/types'
import type { Test } from '@/lib/checks/vocabulary'
import { ValueText } from '../ui/value-text'

const letters: Record<Test, string> = { t: 't', F: 'F', chi2: 'χ²', z: 'z', r: 'r', other: '' }

/** A test statistic as the trade prints it; one of another kind as it stands in the manuscript. */
export function StatisticText({ statistic }: { statistic: Statistic }) {
  const { test, df, value, decimals, place } = statistic
  if (test === 'other') return <q className="font-mono text-xs">{place.quote}</q>
  return (
    <ValueText
      name={letters[test]}
      {...(df.length > 0 && test !== 'z' ? { df: df.map((one) => Number(one.toFixed(2))).join(', ') } : {})}
      value={value.toFixed(Math.min(decimals, 12)).replace('-', '−')}
    />
  )
}
