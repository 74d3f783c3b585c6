import type { LaidOut, PdfTable, Prose, SectionKind } from '@/lib/checks/types'

/** Sections of a made-up manuscript in their order; text of one section may hold several paragraphs. */
export type Part = { kind?: SectionKind; heading?: string; text: string }

/** A manuscript's prose from plain strings: one page, one box for every stretch of text. */
export function makeProse(parts: string | Part[]): Prose {
  const list = typeof parts === 'string' ? [{ kind: 'results' as const, text: parts }] : parts
  let text = ''
  const sections: Prose['sections'] = []
  for (const { kind = 'results', heading = kind, text: body } of list) {
    const start = text.length
    text += (text === '' ? '' : '\n\n') + body
    sections.push({ kind, heading, start: start === 0 ? 0 : start + 2, end: text.length })
  }
  return {
    text,
    sections,
    pageOf: () => 1,
    boxesOf: (start, end) => [[start, 700, end, 712]],
  }
}

/** A laid-out manuscript from prose and tables. */
export function makeLaidOut(parts: string | Part[], tables: PdfTable[] = []): LaidOut {
  return { prose: makeProse(parts), tables, unread: [] }
}

/** A table of a page from plain rows; the first row is the header. */
export function makePdfTable(
  rows: string[][],
  extra: Partial<Pick<PdfTable, 'caption' | 'notes' | 'number' | 'page'>> = {},
): PdfTable {
  const columns = Math.max(...rows.map((row) => row.length))
  const cells = rows.map((row) =>
    Array.from({ length: columns }, (_, c) => ({ text: row[c] ?? '', boxes: [] })),
  )
  return {
    page: extra.page ?? 1,
    number: extra.number ?? '1',
    caption: extra.caption ?? '',
    notes: extra.notes ?? '',
    columns,
    header: cells.slice(0, 1),
    rows: cells.slice(1),
    offset: 0,
  }
}
