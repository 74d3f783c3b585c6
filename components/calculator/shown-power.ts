import { compareProcedurePower, type ProcedurePower } from '@/lib/checks/sensitivity/compare-power'
import { computePower, findSampleSize } from '@/lib/checks/sensitivity/power-of-design'
import type { CalculatorInput } from './calculator-input'
import { readBetween, readWhole } from './read-settings'
import { findGroups } from './shown-beside'

export type PowerRow = ProcedurePower

export type PowerQuestion = {
  m: number
  alpha: number
  design: CalculatorInput['design']
  size: string
  effect: string
  groupCount: string
}

/** `groups` is null for designs that have none. `rows` are null where `why` says what is missing. */
export type ShownPower = {
  design: CalculatorInput['design']
  n: number
  effect: number
  groups: number | null
  rows: PowerRow[] | null
  why: string
}

const MOST_GROUPS = 40

/** The power of one comparison by procedure; null while size or effect make no sense. */
export function getPower({
  m,
  alpha,
  design,
  size,
  effect: typed,
  groupCount,
}: PowerQuestion): ShownPower | null {
  const n = readWhole(size, 2).value
  const effect = readBetween(typed, 0.01, 20).value
  if (n === null || effect === null || n > 1e6) return null
  const base = { design, n, effect, groups: null, why: '' }
  if (design === 'independent') {
    return { ...base, rows: compareProcedurePower({ design, m, n, effect, alpha }) }
  }
  if (design === 'paired') {
    return {
      ...base,
      rows: [rowOfPaired('none', n, effect, alpha), rowOfPaired('bonferroni', n, effect, alpha / m)],
    }
  }
  const groups = readWhole(groupCount, 2).value ?? (design === 'pairs' ? findGroups(m) : m + 1)
  if (groups === null || groups > MOST_GROUPS) {
    const why =
      groups === null
        ? `${m} is not the number of all pairs of some groups: give the number of groups under “Without correction”.`
        : `Computed for up to ${MOST_GROUPS} groups.`
    return { ...base, rows: null, why }
  }
  return { ...base, groups, rows: compareProcedurePower({ design, groups, n, effect, alpha }) }
}

function rowOfPaired(procedure: 'none' | 'bonferroni', n: number, effect: number, level: number): PowerRow {
  const design = { design: 'paired', effect, alpha: level } as const
  const power = computePower({ ...design, n })
  return {
    procedure,
    criticalValue: null,
    perTestLevel: level,
    power,
    bounds: { low: power, high: power },
    nFor80: findSampleSize({ ...design, power: 0.8 }).whole,
  }
}
