import { writeCalculationScript } from '@/lib/checks/r-script/calculation-script'
import type { CalculatorInput } from './calculator-input'
import { getCorrelated, getFits, getPairs } from './shown-beside'
import { getPower } from './shown-power'
import type { WorkedOut } from './work-out'

/** The R script of all numbers that the page shows for a list. */
export function writeValuesScript(input: CalculatorInput, { entries, alpha, work }: WorkedOut): string {
  if (!work) return ''
  const { calculation, family } = work
  const { m } = calculation
  const { design, size, effect, groupCount } = input
  const power = getPower({ m, alpha, design, size, effect, groupCount })
  const fits = getFits(entries, input.reading)
  return writeCalculationScript(
    entries,
    calculation,
    { alpha, reading: input.reading, family },
    {
      correlated: getCorrelated(m, alpha, input.rho),
      pairs: getPairs(m, alpha, input.groupCount),
      power: power?.rows ? { ...power, rows: power.rows } : null,
      fits: fits && fits.compared > 0 ? { found: fits.found, upTo: fits.upTo } : null,
    },
  )
}
