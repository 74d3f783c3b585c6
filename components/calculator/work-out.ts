import { calculate, type Adjusted, type Calculation } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import { readValues, type ReadValues } from '@/lib/checks/calculate/read-values'
import type { AdjustOptions } from '@/lib/checks/procedures/adjust'
import { procedureTable } from '@/lib/checks/procedures/table'
import type { CatalogueProcedure } from '@/lib/checks/vocabulary'
import type { CalculatorInput } from './calculator-input'
import { readLevel, readMatrix, readNumbers, readWhole } from './read-settings'

/** The graphical procedure takes a step for each pair of tests and test. */
const MOST_IN_GRAPH = 150

/** What follows from the input: `work` is null while a setting makes no sense, which `faults` names by field. */
export type WorkedOut = {
  entries: Entry[]
  alpha: number
  faults: Partial<Record<keyof CalculatorInput, string>>
  work: { calculation: Calculation; main: Adjusted; beside: Adjusted[]; family: AdjustOptions } | null
}

/** A setting of a column: '' as found, '-' for none, else its number. */
function toColumn(text: string): number | null | undefined {
  if (text === '') return undefined
  return /^\d{1,4}$/.test(text) ? Number(text) : null
}

/** Reads the pasted text as the input's settings say. */
export function readInput(input: CalculatorInput): ReadValues {
  const value = toColumn(input.valueColumn)
  const [name, adjusted, weight] = [input.nameColumn, input.adjustedColumn, input.weightColumn].map(toColumn)
  return readValues(input.values, {
    alpha: readLevel(input.alpha).value ?? 0.05,
    sides: input.sides,
    columns: {
      ...(value === undefined || value === null ? {} : { value }),
      ...(name === undefined ? {} : { name }),
      ...(adjusted === undefined ? {} : { adjusted }),
      ...(weight === undefined ? {} : { weight }),
    },
  })
}

/** Everything that the results show, from what was read and the other settings. */
export function workOut(read: ReadValues, input: CalculatorInput): WorkedOut {
  const faults: WorkedOut['faults'] = {}
  const note = (key: keyof CalculatorInput, fault: string | null) => {
    if (fault) faults[key] = fault
  }
  const level = readLevel(input.alpha)
  const m = readWhole(input.m, Math.max(1, read.entries.length))
  const groups = readWhole(input.groupCount, 2)
  note('alpha', level.fault)
  note('m', m.fault)
  note('groupCount', groups.fault)
  const weights = weightsOf(read.entries, input.weights)
  if (weights === null) note('weights', 'Numbers only, separated by spaces.')
  const transitions = input.transitions.trim() === '' ? undefined : readMatrix(input.transitions)
  if (transitions === null) note('transitions', 'Rows of numbers, one row a line.')
  const entries = pairPrinted(read.entries, input.printed, note)
  const alpha = level.value ?? 0.05
  if (Object.keys(faults).some((key) => key !== 'printed') || entries.length === 0) {
    return { entries, alpha, faults, work: null }
  }
  const family: AdjustOptions = {
    ...(m.value === null ? {} : { m: m.value }),
    ...(groups.value === null ? {} : { groups: groups.value }),
    ...(weights ? { weights } : {}),
    ...(transitions ? { transitions } : {}),
  }
  const wanted = [input.procedure, ...input.beside.filter((one) => one !== input.procedure)]
  const calculation = calculate(entries, {
    alpha,
    reading: input.reading,
    procedures: wanted.filter((one) => one !== 'graphical' || entries.length <= MOST_IN_GRAPH),
    family,
  })
  const find = (procedure: CatalogueProcedure): Adjusted =>
    calculation.results.find((one) => one.procedure === procedure) ?? {
      procedure,
      level: alpha,
      adjusted: [],
      significant: [],
      refused: `${procedureTable[procedure].label} is computed for up to ${MOST_IN_GRAPH} tests here`,
    }
  const [main, ...beside] = wanted.map(find)
  return { entries, alpha, faults, work: main ? { calculation, main, beside, family } : null }
}

/** Typed weights, else those of the table's column; undefined for equal ones, null where they make no sense. */
function weightsOf(entries: readonly Entry[], typed: string): number[] | undefined | null {
  if (typed.trim() !== '') return readNumbers(typed)
  if (!entries.some((entry) => entry.weight !== null)) return undefined
  return entries.map((entry) => entry.weight ?? 0)
}

/** Printed adjusted values that were typed apart, put beside the raw ones in their order. */
function pairPrinted(
  entries: Entry[],
  text: string,
  note: (key: keyof CalculatorInput, fault: string | null) => void,
): Entry[] {
  if (text.trim() === '') return entries
  const printed = readValues(text).entries
  if (printed.length !== entries.length) {
    note('printed', `${count(printed.length, 'adjusted value')} for ${count(entries.length, 'raw one')}.`)
    return entries
  }
  return entries.map((entry, i) => {
    const one = printed[i]
    if (!one) return entry
    const { low, high, decimals } = one
    return { ...entry, adjusted: { low, high, decimals, printed: one.printed } }
  })
}

/** '1 value', '6 values'. */
export function count(number: number, noun: string): string {
  return `${number.toLocaleString('en')} ${noun}${number === 1 ? '' : 's'}`
}
