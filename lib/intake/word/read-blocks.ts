import mammoth from 'mammoth'
import { textOf, type Span, type WordBlock, type WordCell, type WordTable, type WordText } from './blocks'

/** The converter's own model of a document, as far as it is used here. */
type Node = {
  type: string
  children?: Node[]
  value?: string
  styleId?: string | null
  styleName?: string | null
  numbering?: { level: string; isOrdered: boolean } | null
  isBold?: boolean
  isItalic?: boolean
  isAllCaps?: boolean
  verticalAlignment?: string
  isHeader?: boolean
  colSpan?: number
  rowSpan?: number
  noteType?: string
  noteId?: string
  body?: Node[]
  notes?: { resolve: (reference: Node) => Node | null }
}

type Look = Pick<Span, 'bold' | 'italic' | 'level'> & { capitals: boolean }

const plain: Look = { bold: false, italic: false, level: 0, capitals: false }

/** The longest text of a cell in a table of results; a table with longer ones only places text on the page. */
const longestCell = 600

/** Reads the text of a prepared Word document. */
export async function readBlocks(docx: Buffer): Promise<WordText> {
  let root: Node = { type: 'document', children: [] }
  await mammoth.convertToHtml(
    { buffer: docx },
    {
      externalFileAccess: false,
      transformDocument: (document: Node) => {
        root = document
        return { ...document, children: [] }
      },
    },
  )
  return makeReader(root).read()
}

function makeReader(root: Node) {
  const footnotes = new Map<number, Span[]>()
  const endnotes: Span[][] = []
  const counts: number[] = []

  /** The number of a note: the same wherever it is referred to. */
  const numbers = new Map<string, number>()
  const numberNote = (reference: Node): number => {
    const key = `${reference.noteType ?? ''}-${reference.noteId ?? ''}`
    const known = numbers.get(key)
    if (known !== undefined) return known
    const number = numbers.size + 1
    numbers.set(key, number)
    const body = root.notes?.resolve(reference)?.body ?? []
    const spans = [
      span(`${number} `, plain),
      ...body.flatMap((node, i) => [...(i > 0 ? [span(' ', plain)] : []), ...readSpans(node, plain)]),
    ]
    if (reference.noteType === 'endnote') endnotes.push(spans)
    else footnotes.set(number, spans)
    return number
  }

  const readSpans = (node: Node, look: Look): Span[] => {
    if (node.type === 'text') {
      const text = node.value ?? ''
      return text === '' ? [] : [span(look.capitals ? text.toUpperCase() : text, look)]
    }
    if (node.type === 'tab') return [span('\t', look)]
    if (node.type === 'break') return [span('\n', look)]
    if (node.type === 'noteReference') {
      const number = numberNote(node)
      const note = node.noteType === 'endnote' ? null : number
      return [{ text: String(number), bold: false, italic: false, level: 1, note }]
    }
    const inner = node.type === 'run' ? lookOf(node, look) : look
    const spans = (node.children ?? []).flatMap((child) => readSpans(child, inner))
    return node.type === 'paragraph' || node.type === 'tableCell' ? [...spans, span(' ', plain)] : spans
  }

  const readParagraph = (node: Node): WordBlock[] => {
    const spans = (node.children ?? []).flatMap((child) => readSpans(child, plain))
    if (textOf(spans).trim() === '') return []
    const depth = headingDepth(node)
    if (depth !== null) return [{ kind: 'heading', depth, spans }]
    const { numbering } = node
    if (!numbering) return [{ kind: 'paragraph', spans, marker: null, depth: 0 }]
    const level = Math.min(8, Math.max(0, Number(numbering.level) || 0))
    counts.length = Math.min(counts.length, level + 1)
    counts[level] = (counts[level] ?? 0) + 1
    const marker = numbering.isOrdered ? `${counts[level]}.` : '•'
    return [{ kind: 'paragraph', spans, marker, depth: level + 1 }]
  }

  const readCell = (node: Node): WordCell => ({
    paragraphs: listParagraphs(node).map((one) =>
      (one.children ?? []).flatMap((child) => readSpans(child, plain)),
    ),
    colSpan: Math.min(60, Math.max(1, node.colSpan ?? 1)),
    rowSpan: Math.max(1, node.rowSpan ?? 1),
  })

  const readTable = (node: Node): WordBlock[] => {
    const rowNodes = (node.children ?? []).filter((row) => row.type === 'tableRow')
    const rows = rowNodes.map((row) => (row.children ?? []).map(readCell))
    const longest = Math.max(
      0,
      ...rows.flat().map((cell) => cell.paragraphs.reduce((sum, spans) => sum + textOf(spans).length, 0)),
    )
    const widest = Math.max(0, ...rows.map((row) => row.length))
    if (longest > longestCell || widest < 2)
      return rowNodes.flatMap((row) => (row.children ?? []).flatMap((cell) => readBody(cell)))
    const heading = rowNodes.findIndex((row) => row.isHeader !== true)
    const headRows = heading > 0 ? heading : 1
    return [{ kind: 'table', headRows, rows } satisfies WordTable]
  }

  const readBody = (node: Node): WordBlock[] => {
    if (node.type === 'paragraph') return readParagraph(node)
    if (node.type === 'table') return readTable(node)
    return (node.children ?? []).flatMap(readBody)
  }

  return {
    read(): WordText {
      const blocks = (root.children ?? []).flatMap((node) => {
        if (node.type !== 'paragraph' || !node.numbering) counts.length = 0
        return readBody(node)
      })
      const titled = (root.children ?? []).find((node) => /^title$/i.test(node.styleName ?? ''))
      const title = titled ? textOf(readSpans(titled, plain)).trim() : ''
      return { title: title === '' ? null : title.slice(0, 300), blocks, footnotes, endnotes }
    },
  }
}

function span(text: string, { bold, italic, level }: Pick<Look, 'bold' | 'italic' | 'level'>): Span {
  return { text, bold, italic, level, note: null }
}

function lookOf(run: Node, outer: Look): Look {
  const { verticalAlignment } = run
  return {
    bold: outer.bold || run.isBold === true,
    italic: outer.italic || run.isItalic === true,
    capitals: outer.capitals || run.isAllCaps === true,
    level: verticalAlignment === 'superscript' ? 1 : verticalAlignment === 'subscript' ? -1 : outer.level,
  }
}

/** "Title" is 0, "heading 1" is 1; null for text. */
function headingDepth(node: Node): number | null {
  const name = node.styleName ?? node.styleId ?? ''
  if (/^title$/i.test(name)) return 0
  // "heading 1", "Heading1"
  const depth = /^heading ?(\d)/i.exec(name)?.[1]
  return depth === undefined ? null : Number(depth)
}

/** Paragraphs of a cell, those of tables within it too. */
function listParagraphs(node: Node): Node[] {
  if (node.type === 'paragraph') return [node]
  return (node.children ?? []).flatMap(listParagraphs)
}
