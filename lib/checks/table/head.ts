import { fold } from '../extract/grammar/fold'
import { isMark, isMissing, readCall, readNumber, readP } from './cell'

/** Words by which a line is told to be one of heads: 'p', 't', 'df', 'SE', 'Comparison', 'Group A', 'n', 'mean', 'P adj'. */
const HEAD =
  /^(?:p|q|t|F|z|r|n|N|df|d\.f\.|DF|FG|SE|SD|sd|se|m|M|χ2|U|W|H)$|^(?:[pqtfz](?![a-z])|p[\s._-]?(?:val|adj|corr|raw|bonf|holm|fdr)|prob|q[\s._-]?val|adj|raw|sig|chi|num|den|std|diff|mean|median|estimate|compar|contrast|pair|group|treatment|outcome|measure|variable|gene|region|behavio|end-?point|statistic|n\b|ci\b|95|lower|upper|holm|bonf|tukey|fdr|significan|result|condition|effect|term|grade|stream|test)/i

/** Whether a cell of a line looks like the head of a column. */
export const roleIsKnown = (cell: string): boolean => HEAD.test(fold(cell).trim())

/** Heads that no body cell would hold: 'Pr(>|z|)', 'p', 'p-value', 't value', 'z value', 'F value', 'Std. Error', 'df', 'SE'. */
const PLAIN_HEAD =
  /^(?:p|P|q|t|F|z|r|df|d\.f\.|SE|SD|CI|95\s?% CI|χ2|pr\s?\(>.*|p[\s.-]?val(?:ue)?s?|p\s?adj.*|adj.*p.*|[tzF][\s-]?(?:value|ratio|statistic|stat)|std\.?\s?err(?:or)?\.?|estimate|sig\.?|diff\w*\.?|sum sq|mean sq|chisq|mean)$/i

/** Whether a line in the body of a table is one of heads: two or more plain heads and no number. */
export function isHeadLine(cells: readonly string[]): boolean {
  const filled = cells.map((cell) => fold(cell).trim()).filter((cell) => cell !== '')
  if (filled.some((cell) => readNumber(cell) !== null || readP(cell) !== null || isMark(cell))) return false
  return filled.filter((cell) => PLAIN_HEAD.test(cell)).length >= 2
}

/** Whether a line of a results table is one of heads: two or more words, no number and no mark, a known head among them. */
export function isHead(cells: readonly string[]): boolean {
  const filled = cells.filter((cell) => cell !== '')
  return (
    filled.length >= 2 &&
    !filled.some((cell) => holdsNumber(cell) || isMissing(cell)) &&
    filled.some(roleIsKnown)
  )
}

/** A head may say 'significant' or 'Sig.', but holds no number and no mark. */
export const holdsNumber = (cell: string): boolean =>
  readNumber(cell) !== null || readP(cell) !== null || isMark(cell)

/** Numbers, p-values, marks, calls and signs for missing values are data. */
export const holdsData = (cell: string): boolean =>
  holdsNumber(cell) || isMissing(cell) || (readCall(cell) !== null && cell.length > 1)

/** Whether a line of heads says what single columns hold: 'p', 't', 'df', 'SE', 'Std. Error'. */
export const namesColumns = (cells: readonly string[]): boolean =>
  cells.some((cell) => PLAIN_HEAD.test(fold(cell).trim()))
