import { readFileSync } from 'node:fs'
import { expect } from 'vitest'

/** A number as the reference files write it: null for missing, strings for what JSON has no number for. */
export type Printed = number | 'NaN' | 'Infinity' | '-Infinity' | null

/** Reads one of the reference files; each carries its source, versions and tolerance in its header. */
export function readReference<T>(name: string): T {
  return JSON.parse(readFileSync(new URL(`../fixtures/reference/${name}`, import.meta.url), 'utf8'))
}

export const toNumber = (printed: Printed): number => (printed === null ? NaN : Number(printed))

/** Largest relative difference between two vectors; absolute where both are below `floor`. NaN must meet NaN. */
export function differ(actual: readonly number[], expected: readonly Printed[], floor = 1e-300): number {
  expect(actual.length).toBe(expected.length)
  let worst = 0
  expected.forEach((printed, i) => {
    const wanted = toNumber(printed)
    const found = actual[i] ?? Infinity
    if (Number.isNaN(wanted) || Number.isNaN(found)) {
      if (Number.isNaN(wanted) !== Number.isNaN(found)) worst = Infinity
    } else if (wanted !== found) {
      worst = Math.max(worst, Math.abs(found - wanted) / Math.max(Math.abs(wanted), floor))
    }
  })
  return worst
}
