import { readPlainNumber } from '@/lib/checks/calculate/read-number'

/** A typed setting: its value, or what is wrong with it in a few words. Empty where it is left out. */
export type Setting = { value: number | null; fault: string | null }

const fine = (value: number | null): Setting => ({ value, fault: null })
const wrong = (fault: string): Setting => ({ value: null, fault })

/** A level between 0 and 1, such as '0.05' or '0,05'. */
export function readLevel(text: string): Setting {
  const read = readPlainNumber(text)
  return read && read.value > 0 && read.value < 1 ? fine(read.value) : wrong('A number between 0 and 1.')
}

/** A whole number of at least `least`; '' is left out. */
export function readWhole(text: string, least: number): Setting {
  if (text.trim() === '') return fine(null)
  const read = readPlainNumber(text)
  if (!read || !Number.isSafeInteger(read.value) || read.value < least) {
    return wrong(`A whole number of at least ${least}.`)
  }
  return fine(read.value)
}

/** A number between two ends, both allowed. */
export function readBetween(text: string, least: number, most: number): Setting {
  const read = readPlainNumber(text)
  if (!read || read.value < least || read.value > most) return wrong(`A number from ${least} to ${most}.`)
  return fine(read.value)
}

/** Numbers separated by spaces, commas or semicolons; null where one is none. */
export function readNumbers(text: string): number[] | null {
  const tokens = text.split(/[\s;,]+/).filter((token) => token !== '')
  const read = tokens.map((token) => readPlainNumber(token)?.value ?? null)
  return read.includes(null) ? null : read.filter((value) => value !== null)
}

/** Rows of numbers, one a line. */
export function readMatrix(text: string): number[][] | null {
  const rows = text
    .split('\n')
    .filter((line) => line.trim() !== '')
    .map(readNumbers)
  return rows.includes(null) ? null : rows.filter((row) => row !== null)
}
