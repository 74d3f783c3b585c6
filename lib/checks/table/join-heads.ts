import type { Merge } from '../types'

/**
 * One header text a column out of one or more lines of heads, joined by ' | '. The text of an upper line counts for
 * the columns it is merged over, or, where the file tells of no merging, up to the next text of its line. `left`: the
 * sheet's column of the first cell.
 */
export function joinHeads(
  lines: readonly { at: number; cells: readonly string[] }[],
  merges: readonly Merge[],
  left: number,
): string[] {
  const [only, second] = lines
  if (!only || !second) return [...(only?.cells ?? [])]
  const width = Math.max(...lines.map(({ cells }) => cells.length))
  const lowest = lines[lines.length - 1]?.cells ?? []
  const spread = lines.map((line, i) =>
    i === lines.length - 1 ? line.cells : spreadSpans(line, lowest, merges, left),
  )
  return Array.from({ length: width }, (_, c) =>
    spread
      .map((cells) => cells[c] ?? '')
      .filter((text, i, all) => text !== '' && text !== all[i - 1])
      .join(' | '),
  )
}

function spreadSpans(
  { at, cells }: { at: number; cells: readonly string[] },
  lowest: readonly string[],
  merges: readonly Merge[],
  left: number,
): string[] {
  const own = merges.filter(([row, column]) => row === at && column >= left)
  if (own.length > 0) {
    const spread = [...cells]
    for (const [, column, , columns] of own)
      for (let c = column - left + 1; c < column - left + columns; c += 1)
        spread[c] = cells[column - left] ?? ''
    return spread
  }
  let span = ''
  return lowest.map((below, c) => {
    const text = cells[c] ?? ''
    if (text !== '') span = text
    // a column without a head of its own below is named by this line or by none
    return text !== '' || below === '' ? text : span
  })
}
