import type { Frame, Word } from './words'

// line numbers: "7", "214"
const lineNumber = /^\d{1,5}$/

/**
 * Line numbers: numbers at one abscissa in a strip of their own, rising by a constant step down the page, on
 * most pages of the document and beside most of their lines.
 */
export function findLineNumbers(frames: readonly Frame[]): Set<Word> {
  const found = frames.map(findNumberColumns)
  const pages = found.filter((columns) => columns.length > 0).length
  const full = frames.filter((frame) => frame.words.length > 80).length
  if (pages === 0 || pages < 0.6 * full) return new Set()
  const usual = found
    .flat()
    .map(({ words }) => words[0])
    .filter((word) => word !== undefined)
  const short = frames
    .filter((_, i) => found[i]?.length === 0)
    .flatMap((frame) => findStragglers(frame, usual))
  return new Set([...found.flatMap((columns) => columns.flatMap(({ words }) => words)), ...short])
}

type NumberColumn = { words: Word[] }

function findNumberColumns(frame: Frame): NumberColumn[] {
  const groups = new Map<number, Word[]>()
  for (const word of frame.words) {
    if (word.level !== 0 || !lineNumber.test(word.chars)) continue
    for (const edge of [Math.round(word.u1 / 3), Math.round(word.u0 / 3) + 100_000]) {
      const group = groups.get(edge) ?? []
      groups.set(edge, group)
      group.push(word)
    }
  }
  const lines = new Set(frame.words.map((word) => Math.round(word.v))).size
  const columns: NumberColumn[] = []
  for (const group of [...groups.values()].sort((a, b) => b.length - a.length)) {
    if (group.length < 4 || columns.some(({ words }) => group.some((word) => words.includes(word)))) continue
    const sorted = group.sort((a, b) => b.v - a.v)
    const steps = sorted.slice(1).map((word, i) => Number(word.chars) - Number(sorted[i]?.chars))
    const step = steps[0] ?? 0
    const regular = steps.filter((s) => s === step || s === 1).length
    if (step < 1 || regular < 0.85 * steps.length || sorted.length * step < 0.4 * lines) continue
    if (isOutside(frame, sorted)) columns.push({ words: extend(frame, sorted) })
  }
  return columns
}

/** Nothing stands to one side of the strip, or, for a long column, nothing in the strip itself. */
function isOutside(frame: Frame, column: readonly Word[]): boolean {
  const left = Math.min(...column.map((w) => w.u0))
  const right = Math.max(...column.map((w) => w.u1))
  let [before, after, within] = [0, 0, 0]
  for (const word of frame.words) {
    if (word.u1 < left - 1) before++
    else if (word.u0 > right + 1) after++
    else within++
  }
  const few = 0.02 * frame.words.length
  if (before < few || after < few) return true
  return column.length >= 20 && within < 1.15 * column.length && standApart(frame, column)
}

/** Text does not touch a line number: "Trait 7" is a name. */
function standApart(frame: Frame, column: readonly Word[]): boolean {
  const rows = new Map<number, Word[]>()
  for (const word of frame.words) {
    const row = rows.get(Math.round(word.v)) ?? []
    rows.set(Math.round(word.v), row)
    row.push(word)
  }
  const touched = column.filter((number) => {
    const near = 0.5 * number.size
    return (rows.get(Math.round(number.v)) ?? []).some(
      (word) => word !== number && Math.max(number.u0 - word.u1, word.u0 - number.u1) < near,
    )
  })
  return touched.length < 0.3 * column.length
}

/** Numbers of another width in the same column (9, 10, 100). */
function extend(frame: Frame, column: readonly Word[]): Word[] {
  const left = Math.min(...column.map((w) => w.u0))
  const right = Math.max(...column.map((w) => w.u1))
  const size = column[0]?.size ?? 0
  return frame.words.filter(
    (w) =>
      lineNumber.test(w.chars) &&
      Math.abs(w.size - size) < 0.6 &&
      (Math.abs(w.u1 - right) < 3 || Math.abs(w.u0 - left) < 3),
  )
}

/** Numbers at the usual abscissa on a page with too few lines to tell by itself. */
function findStragglers(frame: Frame, usual: readonly Word[]): Word[] {
  return frame.words.filter(
    (word) =>
      lineNumber.test(word.chars) &&
      usual.some((u) => Math.abs(u.u1 - word.u1) < 1 && Math.abs(u.size - word.size) < 0.3) &&
      isOutside(frame, [word]),
  )
}
