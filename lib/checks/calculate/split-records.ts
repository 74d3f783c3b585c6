/** A record of delimited text: its cells, trimmed, and the 1-based line on which it begins. */
export type TextRecord = { line: number; cells: string[] }

/**
 * Splits text into records at line ends and into cells at `delimiter`; cells in double quotes may hold delimiters,
 * line ends and doubled quotes (RFC 4180). Blank lines are left out. Never throws: an open quote ends with the text.
 */
export function splitRecords(text: string, delimiter: string): TextRecord[] {
  const records: TextRecord[] = []
  let line = 1
  let begun = 1
  let cells: string[] = []
  let at = 0
  const close = () => {
    if (cells.some((cell) => cell !== '')) records.push({ line: begun, cells })
    cells = []
    begun = line
  }
  while (at < text.length) {
    const { cell, next } = takeCell(text, at, delimiter)
    cells.push(cell.trim())
    for (let i = at; i < next; i++) if (text[i] === '\n') line++
    at = next
    if (text[at] === delimiter) {
      at++
      if (at >= text.length) cells.push('')
    } else {
      if (text[at] === '\r') at++
      if (text[at] === '\n') {
        at++
        line++
      }
      close()
    }
  }
  close()
  return records
}

function takeCell(text: string, from: number, delimiter: string): { cell: string; next: number } {
  let start = from
  while (text[start] === ' ') start++
  if (text[start] !== '"') {
    let end = from
    while (end < text.length && text[end] !== delimiter && text[end] !== '\n' && text[end] !== '\r') end++
    return { cell: text.slice(from, end), next: end }
  }
  let cell = ''
  let at = start + 1
  while (at < text.length) {
    const quote = text.indexOf('"', at)
    if (quote < 0) return { cell: cell + text.slice(at), next: text.length }
    cell += text.slice(at, quote)
    if (text[quote + 1] !== '"') {
      at = quote + 1
      break
    }
    cell += '"'
    at = quote + 2
  }
  while (at < text.length && text[at] !== delimiter && text[at] !== '\n' && text[at] !== '\r')
    cell += text[at++]
  return { cell, next: at }
}
