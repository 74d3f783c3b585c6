/** Text of a delimited file, or null where the bytes are not text. */
export function decodeText(bytes: Buffer): string | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes)
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes)
  if (bytes.includes(0)) return decodeUnmarked(bytes)
  try {
    // `stream` forgives a character that the end of a sample cuts in two.
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: true })
  } catch {
    // Not UTF-8: the Western code page of older spreadsheets, unless it holds control characters.
    const text = new TextDecoder('windows-1252').decode(bytes)
    return hasControls(text) ? null : text
  }
}

/** UTF-16 without its mark: of mostly Latin text every second byte is zero. */
function decodeUnmarked(bytes: Buffer): string | null {
  const sample = bytes.subarray(0, 2000)
  const zeros = [0, 0]
  sample.forEach((byte, i) => {
    if (byte === 0) zeros[i % 2] = (zeros[i % 2] ?? 0) + 1
  })
  const [even = 0, odd = 0] = zeros
  const half = sample.length / 2
  const name =
    odd > 0.6 * half && even === 0 ? 'utf-16le' : even > 0.6 * half && odd === 0 ? 'utf-16be' : null
  if (name === null) return null
  const text = new TextDecoder(name).decode(bytes)
  return hasControls(text) ? null : text
}

function hasControls(text: string): boolean {
  // Control characters that no text file holds, and the mark of a byte that could not be decoded.
  return /[\u0000-\u0008\u000e-\u001f\ufffd]/.test(text)
}

/**
 * The delimiter that stands equally often on most lines, the first among them; where several do, the tab and
 * the semicolon go before the comma, which also marks decimals. Null where there is none.
 */
export function guessDelimiter(text: string): string | null {
  const lines = text
    .split(/\r\n?|\n/, 60)
    .filter((line) => line.trim() !== '')
    .map(withoutQuoted)
  const scored = ['\t', ';', '|', ','].map((delimiter) => ({ delimiter, score: score(lines, delimiter) }))
  const best = scored.reduce((a, b) => (b.score > a.score ? b : a))
  if (best.score > 0) return best.delimiter
  // blanks part values only where names stand in quotes, and every line has as many
  const counts = lines.map((line) => line.trim().split(' ').length)
  const quoted = lines.length > 1 && text.includes('"') && Math.min(...counts) > 1
  return quoted && Math.max(...counts) - Math.min(...counts) <= 1 ? ' ' : null
}

/** 'sep=;' in the first line, by which a spreadsheet is told the delimiter; `length`: of that line with its end. */
export function getDeclaredDelimiter(text: string): { delimiter: string; length: number } | null {
  const line = /^\ufeff?"?sep=(.)"?\r?\n/i.exec(text)
  return line?.[1] === undefined ? null : { delimiter: line[1], length: line[0].length }
}

/**
 * A line of heads that is one short of every other line lacks the head of the row names, its first: so are tables
 * written whose rows have names of their own, all different.
 */
export function placeHeads(rows: string[][]): string[][] {
  const [heads, ...body] = rows.filter((row) => row.some((cell) => cell !== ''))
  const width = (heads?.length ?? 0) + 1
  if (!heads || heads.length < 2 || body.length < 2) return rows
  const names = new Set(body.map(([name]) => name))
  const fits = body.every((row) => row.length === width) && body.some((row) => row[width - 1] !== '')
  if (!fits || names.size < body.length || names.has('')) return rows
  return rows.map((row) => (row === heads ? ['', ...row] : row))
}

function score(lines: readonly string[], delimiter: string): number {
  const counts = lines.map((line) => line.split(delimiter).length - 1)
  const tally = new Map<number, number>()
  for (const count of counts) if (count > 0) tally.set(count, (tally.get(count) ?? 0) + 1)
  const most = Math.max(0, ...tally.values())
  return (most + ((counts[0] ?? 0) > 0 ? 0.5 : 0)) / Math.max(1, lines.length)
}

/** A line without what stands in quotes, where a delimiter is only text: a,"b, c",d. */
function withoutQuoted(line: string): string {
  return line.replace(/"[^"]*"/g, 'x')
}
