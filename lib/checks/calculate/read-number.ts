import { fold } from '../extract/grammar/fold'
import { toRelation } from '../extract/grammar/p-value'
import { printedInterval, type Interval } from '../numbers/printed-interval'
import type { Relation } from '../vocabulary'

export type ReadP = Interval & { relation: Relation; value: number; decimals: number }

/** '.030', '0,03', '<0.001', '≥ .5', '3.2e-5', '2.7E−04', '-0.3', '0.032*', 'p=.03', '1 %' is none. */
const NUMBER =
  /^(?:[pq]\s*(?=[=<>≤≥]))?([<>=≤≥]=?|=[<>])?\s*([-–+]?)(\d*)(?:[.,](\d+)|[.,](?=$|e))?(?:e\s?([-–+]?\d{1,4}))?[*†‡]{0,4}$/i

/** Below this the floating-point numbers end; a smaller p-value lies between 0 and it. */
const SMALLEST = 1e-300

/**
 * The p-value of a token of a list: its relation, value, printed decimals and interval; null where the token is no
 * number, a word for the fault where it is one that cannot be a p-value. 'ns' and 'n.s.' stand for [alpha, 1].
 */
export function readPToken(token: string, alpha: number): ReadP | 'outside' | null {
  const text = foldToken(token)
  if (/^n\.?s\.?$/i.test(text)) return { relation: '>', value: alpha, decimals: 2, low: alpha, high: 1 }
  const match = NUMBER.exec(text)
  if (!match) return null
  const [, sign, minus = '', whole = '', fraction = '', power = '0'] = match
  if (whole === '' && fraction === '') return null
  const exponent = Number(power.replace('–', '-'))
  const value = Number(`${whole || '0'}.${fraction || '0'}e${exponent}`)
  if ((minus !== '' && minus !== '+' && value !== 0) || !(value <= 1)) return 'outside'
  const relation = sign === undefined ? '=' : toRelation(sign)
  const decimals = Math.max(0, fraction.length - exponent)
  if (decimals > 300 && relation === '=') return { relation, value, decimals, low: 0, high: SMALLEST }
  const { low, high } = printedInterval(value, decimals, relation)
  return { relation, value, decimals, low, high }
}

/** Folding is slow beside reading: plain ASCII needs none. */
function foldToken(token: string): string {
  return /^[ -~]*$/.test(token) ? token.trim() : fold(token).trim()
}

/** A plain number such as a weight, a mean or a count; null where the text is none. */
export function readPlainNumber(token: string): { value: number; decimals: number } | null {
  const match = NUMBER.exec(foldToken(token))
  if (!match || match[1] !== undefined) return null
  const [, , minus = '', whole = '', fraction = '', power = '0'] = match
  if (whole === '' && fraction === '') return null
  const exponent = Number(power.replace('–', '-'))
  const size = Number(`${whole || '0'}.${fraction || '0'}e${exponent}`)
  if (!Number.isFinite(size)) return null
  return {
    value: minus === '-' || minus === '–' ? -size : size,
    decimals: Math.max(0, fraction.length - exponent),
  }
}
