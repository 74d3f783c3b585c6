import type { Relation } from '../vocabulary'
import { printedInterval } from './printed-interval'

/** `decimals`: digits after the point in positional notation (3.2e-5 has 6; 1.5e3 has −2). */
export type PrintedNumber = { relation: Relation; value: number; decimals: number }
export type PrintedP = PrintedNumber & { low: number; high: number }

/** '.030', '0.03', '<0.001', '≥ .5', '-2.10', '3.2e-5', '< 1E-10' */
const PRINTED = /^\s*(<=|>=|[<>=≤≥⩽⩾])?\s*([-+−]?)(\d+(?:\.(\d*))?|\.(\d+))(?:[eE]([-+−]?\d+))?\s*$/u

const RELATION_OF: Record<string, Relation> = { '≤': '<=', '⩽': '<=', '≥': '>=', '⩾': '>=' }
const isRelation = (sign: string): sign is Relation => ['=', '<', '<=', '>', '>='].includes(sign)

/** Reads a printed decimal number, with or without a relation before it; null where the text is none. */
export function parsePrinted(text: string): PrintedNumber | null {
  const match = PRINTED.exec(text)
  if (match === null) return null
  const [, sign = '=', minus = '', digits = '', after, afterBare, power = '0'] = match
  const exponent = Number(power.replace('−', '-'))
  const value = Number(`${digits}e${exponent}`) * (minus === '-' || minus === '−' ? -1 : 1)
  if (!Number.isFinite(value)) return null
  const relation = RELATION_OF[sign] ?? (isRelation(sign) ? sign : '=')
  return { relation, value, decimals: (after ?? afterBare ?? '').length - exponent }
}

/** Reads a printed p-value and the interval it stands for (`printedInterval`); null where the text is no number. */
export function parsePrintedP(text: string): PrintedP | null {
  const printed = parsePrinted(text)
  if (printed === null) return null
  return { ...printed, ...printedInterval(printed.value, printed.decimals, printed.relation) }
}
