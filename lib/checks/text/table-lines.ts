import { median } from './rows'
import { isNumeric, type Line } from './table-cells'
import type { Word } from './words'
import { writeLine } from './write-line'

/** Joins the lines of a row whose label or cells run over more than one line. */
export function mergeWrapped(lines: readonly Line[]): Line[] {
  const pitches = lines.slice(1).map((line, i) => (lines[i]?.row.v ?? 0) - line.row.v)
  const usual = findUsualPitch(lines, pitches)
  const merged: Line[] = []
  lines.forEach((line, index) => {
    const last = merged.at(-1)
    const pitch = pitches[index - 1] ?? Infinity
    const after = pitches[index] ?? Infinity
    const tight = pitch < 0.92 * Math.min(usual, after) || (pitch < 0.92 * usual && !isLabelOnly(line))
    const joins = last && pitch < 1.6 * line.row.size && (runsOn(last, line, tight) || runsInto(last, line))
    if (last && joins) {
      line.cells.forEach((words, i) => last.cells[i]?.push(...words))
      last.spans.push(...line.spans)
    } else merged.push({ cells: line.cells.map((c) => [...c]), row: line.row, spans: [...line.spans] })
  })
  return merged
}

/** Distance between rows that are surely rows of their own: both with a label and a number. */
function findUsualPitch(lines: readonly Line[], pitches: readonly number[]): number {
  const isFull = (line: Line | undefined) =>
    line !== undefined &&
    textOf(line.cells[0]) !== '' &&
    line.cells.slice(1).some((words) => isNumeric(textOf(words)))
  const sure = pitches.filter((_, i) => isFull(lines[i]) && isFull(lines[i + 1]))
  return sure.length > 0 ? median(sure) : Math.max(0, ...pitches)
}

export function isLabelOnly(line: Line): boolean {
  return (
    line.spans.length === 0 &&
    line.cells.every((words, i) => (i === 0 ? words.length > 0 : words.length === 0))
  )
}

/** The line has nothing but ends of cells that the row above left open. */
function runsOn(last: Line, line: Line, tight: boolean): boolean {
  if (isLabelOnly(last) || line.spans.length > 0) return false
  const label = textOf(line.cells[0])
  if (label !== '' && !continuesLabel(textOf(last.cells[0]), label, tight)) return false
  return line.cells.slice(1).every((words, i) => {
    const text = textOf(words)
    return text === '' || continuesCell(textOf(last.cells[i + 1]), text, tight)
  })
}

// a label that is not at its end: "Control vs", "Age and"
const openLabel = /(?:\bvs\.?|\band|\bwith|\bin|\bthe|[-–,+&]|\bof|\bor)$/

function continuesLabel(before: string, text: string, tight: boolean): boolean {
  return before !== '' && (tight || openLabel.test(before) || /^[\p{Ll}(+&]/u.test(text))
}

function continuesCell(before: string, text: string, tight: boolean): boolean {
  if (before === '') return false
  const open = (before.match(/[([]/g)?.length ?? 0) > (before.match(/[)\]]/g)?.length ?? 0)
  // "<", "-3.6 (-5.6 to", "12.1 ±", "0.3,"
  if (open || /(?:[<>=≤≥±–,/]|\bto|\band)$/.test(before)) return true
  if (!isNumeric(before) && /^\p{Ll}{2}/u.test(text)) return true
  return tight && !(isNumeric(before) && isNumeric(text))
}

/** A label whose row of numbers stands beside its last line. */
function runsInto(last: Line, line: Line): boolean {
  if (!isLabelOnly(last) || isLabelOnly(line)) return false
  const label = textOf(line.cells[0])
  return label !== '' && (openLabel.test(textOf(last.cells[0])) || /^(?:\p{Ll}{2}|vs\b|\+)/u.test(label))
}

function textOf(words: readonly Word[] | undefined): string {
  return writeLine(words ?? []).text
}
