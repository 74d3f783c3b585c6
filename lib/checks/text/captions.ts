import type { Row } from './rows'
import { writeLine } from './write-line'

// "Table 2.", "TABLE II", "Tab. 3:", "Table-4:", "Table S4", "Table A.1", "Table 2 Characteristics of …"
const tableCaption =
  /^(?:table|tab\.)[\s-]*(s?\d+(?:\.\d+)?[a-z]?|[a-z]\.?\d+|[ivxl]+)\b\s*([.:|–—-]?)\s*(.*)$/i
// "Figure 1:", "Fig. 2.", "FIGURE 3"
const figureCaption = /^(?:figure|fig\.?)\s*(s?\d+[a-z]?|[a-z]\.?\d+)\b\s*([.:|–—-]?)\s*(.*)$/i

const texts = new WeakMap<Row, string>()

export function textOf(row: Row): string {
  const known = texts.get(row)
  if (known !== undefined) return known
  const text = writeRow(row)
  texts.set(row, text)
  return text
}

function writeRow(row: Row): string {
  return row.segments.map((segment) => writeLine(segment.words).text).join(' ')
}

/** The number of the table whose caption starts with this line, or null. A sentence 'Table 2 shows …' is none. */
export function captionNumber(text: string): string | null {
  return readCaption(tableCaption, text)
}

export function isFigureCaption(text: string): boolean {
  return readCaption(figureCaption, text) !== null
}

function readCaption(pattern: RegExp, text: string): string | null {
  const found = pattern.exec(text.trim())
  if (!found) return null
  const [, number = '', mark = '', rest = ''] = found
  const closed = mark !== '' || rest === '' || /^[\p{Lu}(\d]/u.test(rest)
  return closed ? number : null
}

// the prompt of a statistics program before a command: "R> summary(fit)", "> t.test(x)", ". regress y x"
const prompt = /^(?:R>|>{1,3}|In \[\d+\]:) ?[A-Za-z.(]/

/** A command typed into a statistics program: what stands around it is output. */
export function isCommand(text: string): boolean {
  return prompt.test(text) && /[(=~]|<-/.test(text)
}
