import { READINGS, type Reading } from '@/lib/checks/calculate/calculate'
import { SIDES, type Sides } from '@/lib/checks/calculate/entry'
import { SPREADS, type Spread } from '@/lib/checks/calculate/read-groups'
import { CATALOGUE, type CatalogueProcedure } from '@/lib/checks/vocabulary'

export const MODES = ['values', 'groups'] as const
export type Mode = (typeof MODES)[number]

/** Everything that was typed, as it was typed: what a link carries and what the results follow from. */
export type CalculatorInput = {
  mode: Mode
  values: string
  alpha: string
  /** '' for the number of values. */
  m: string
  procedure: CatalogueProcedure
  beside: readonly CatalogueProcedure[]
  reading: Reading
  sides: Sides
  /** Columns of a pasted table, 0-based numbers; '' as found, '-' for none. */
  nameColumn: string
  valueColumn: string
  adjustedColumn: string
  weightColumn: string
  weights: string
  transitions: string
  /** Number of groups, for Shaffer and for the error rate of all pairs. */
  groupCount: string
  /** Printed adjusted values, in the order of the raw ones. */
  printed: string
  rho: string
  design: PowerChoice
  size: string
  effect: string
  /** The rows of groups. */
  groups: string
  spread: Spread
  control: string
}

export const POWER_CHOICES = ['independent', 'pairs', 'many-to-one', 'paired'] as const
export type PowerChoice = (typeof POWER_CHOICES)[number]

export const emptyInput: CalculatorInput = {
  mode: 'values',
  values: '',
  alpha: '0.05',
  m: '',
  procedure: 'holm',
  beside: ['bonferroni', 'bh'],
  reading: 'printed',
  sides: 'two-sided',
  nameColumn: '',
  valueColumn: '',
  adjustedColumn: '',
  weightColumn: '',
  weights: '',
  transitions: '',
  groupCount: '',
  printed: '',
  rho: '0.5',
  design: 'independent',
  size: '20',
  effect: '0.8',
  groups: '',
  spread: 'sd',
  control: '',
}

/** The name of each part in a link; what stands as in `emptyInput` is left out. */
const KEYS: Record<keyof CalculatorInput, string> = {
  mode: 'mode',
  values: 'p',
  alpha: 'alpha',
  m: 'm',
  procedure: 'by',
  beside: 'beside',
  reading: 'as',
  sides: 'sides',
  nameColumn: 'names',
  valueColumn: 'column',
  adjustedColumn: 'adjusted-column',
  weightColumn: 'weight-column',
  weights: 'weights',
  transitions: 'graph',
  groupCount: 'k',
  printed: 'adjusted',
  rho: 'rho',
  design: 'design',
  size: 'n',
  effect: 'effect',
  groups: 'groups',
  spread: 'spread',
  control: 'control',
}

/** A link longer than this may be cut by mail programs and browsers. */
export const LONGEST_LINK = 8000

/** The input as the part of an address after '#', without the '#'; '' for the empty input. */
export function encodeInput(input: CalculatorInput): string {
  const parts = new URLSearchParams()
  for (const key of Object.keys(KEYS) as (keyof CalculatorInput)[]) {
    const [value, usual] = [String(input[key]), String(emptyInput[key])]
    if (value !== usual) parts.set(KEYS[key], value)
  }
  return parts.toString()
}

/** Reads what `encodeInput` wrote; whatever is unknown or makes no sense is left as in `emptyInput`. Never throws. */
export function decodeInput(fragment: string): CalculatorInput {
  const parts = new URLSearchParams(fragment.replace(/^#/, ''))
  const text = (key: keyof CalculatorInput) => parts.get(KEYS[key]) ?? String(emptyInput[key])
  const one = <V extends string>(key: keyof CalculatorInput, list: readonly V[], usual: V): V =>
    list.find((item) => item === parts.get(KEYS[key])) ?? usual
  const beside = parts.get(KEYS.beside)?.split(',')
  return {
    mode: one('mode', MODES, emptyInput.mode),
    values: text('values'),
    alpha: text('alpha'),
    m: text('m'),
    procedure: one('procedure', CATALOGUE, emptyInput.procedure),
    beside: beside ? CATALOGUE.filter((procedure) => beside.includes(procedure)) : emptyInput.beside,
    reading: one('reading', READINGS, emptyInput.reading),
    sides: one('sides', SIDES, emptyInput.sides),
    nameColumn: text('nameColumn'),
    valueColumn: text('valueColumn'),
    adjustedColumn: text('adjustedColumn'),
    weightColumn: text('weightColumn'),
    weights: text('weights'),
    transitions: text('transitions'),
    groupCount: text('groupCount'),
    printed: text('printed'),
    rho: text('rho'),
    design: one('design', POWER_CHOICES, emptyInput.design),
    size: text('size'),
    effect: text('effect'),
    groups: text('groups'),
    spread: one('spread', SPREADS, emptyInput.spread),
    control: text('control'),
  }
}
