import { writeCalculationScript } from '@/lib/checks/r-script/calculation-script'
import type { CalculatorInput } from './calculator-input'
import { getCorrelated, getFits, getPairs, getPower } from './shown-beside'
import type { WorkedOut } from './work-out'

/** The R script of all numbers that the page shows for a list. */
export function writeValuesScript(input: CalculatorInput, { entries, alpha, work }: WorkedOut): string {
  if (!work) return ''
  const { calculation, family } = work
  const { m } = calculation
  const fits = getFits(entries, input.reading)
  return writeCalculationScript(
    entries,
    calculation,
    { alpha, reading: input.reading, family },
    {
      correlated: getCorrelated(m, alpha, input.rho),
      pairs: getPairs(m, alpha, input.groupCount),
      power: getPower(m, alpha, input.design, input.size, input.effect),
      fits: fits && fits.compared > 0 ? { found: fits.found, upTo: fits.upTo } : null,
    },
  )
}
