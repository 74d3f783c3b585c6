/** A stretch of text of one look; `level` 1 is raised, -1 lowered; `note` marks the place of a footnote. */
export type Span = {
  text: string
  bold: boolean
  italic: boolean
  level: -1 | 0 | 1
  note: number | null
}

export type WordCell = { paragraphs: Span[][]; colSpan: number; rowSpan: number }
export type WordTable = {
  kind: 'table'
  /** Rows that head the table, repeated where it goes on over a page. */
  headRows: number
  rows: WordCell[][]
}
export type WordBlock =
  | { kind: 'heading'; depth: number; spans: Span[] }
  | { kind: 'paragraph'; spans: Span[]; marker: string | null; depth: number }
  | WordTable

/** A Word document as blocks in their order. `footnotes` by the numbers that spans carry; `endnotes` follow the text. */
export type WordText = {
  title: string | null
  blocks: WordBlock[]
  footnotes: Map<number, Span[]>
  endnotes: Span[][]
}

export function textOf(spans: readonly Span[]): string {
  return spans.map(({ text }) => text).join('')
}
