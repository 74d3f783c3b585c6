import { captionNumber, isFigureCaption, textOf } from './captions'
import { median, type Lane, type Row } from './rows'

// "Note.", "Notes:", "* p < .05", "a Different from …", "Values are means …", "Signif. codes"
const noteStart =
  /^(?:notes?\b|[*†‡§#]|\^?[a-e]\b[ ,]|abbreviations?\b|values (?:are|with|in)\b|data are\b|means? (?:with|followed)\b|signif|\(?continued)/i

/** Index after the last line of notes that follow a table: near it, smaller than the text, or begun as notes are. */
export function findNotes(
  rows: readonly Row[],
  from: number,
  bodySize: number,
  lane: Lane,
  table: readonly Row[],
): number {
  let end = from
  const size = median(table.map((row) => row.size))
  while (end < rows.length && end < from + 14) {
    const row = rows[end]
    const before = rows[end - 1] ?? table.at(-1)
    if (!row || !before) break
    const text = textOf(row)
    const distance = before.v - row.v
    const reach = noteStart.test(text) ? 3.6 : 2.2
    if (distance > reach * Math.max(row.size, size) || captionNumber(text) !== null || isFigureCaption(text))
      break
    const small = row.size < 0.95 * bodySize
    const continues = end > from && distance < 1.45 * row.size && Math.abs(row.size - before.size) < 0.4
    if (!(noteStart.test(text) || small || continues) || row.size > 1.12 * bodySize) break
    end++
  }
  return end
}
