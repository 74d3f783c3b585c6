import { utils, write } from '@e965/xlsx'
import { makeWord, wordParagraph, wordTable } from '@/tests/support/word'
import { writeManuscript } from '../demo/write-manuscript'

export const FORMATS = ['pdf', 'docx', 'xlsx', 'csv'] as const
export type Format = (typeof FORMATS)[number]

const rows = ['slate,rope', 'slate,shell', 'rope,shell'].map((pair, i) => [
  pair.replace(',', ' vs '),
  `${i + 1}.4${i}`,
  `.0${i}3`,
  `.0${3 * i}9`,
])
const head = ['Comparison', 't(28)', 'p', 'Adjusted p']
const claim = 'All three pairs were compared by t tests with a Bonferroni correction (m = 3). '
const result =
  'Slate and rope differed significantly (t(28) = 3.12, p = .004), slate and shell did not (p = .31). '

/** Whole files of each format, written by the project's own writers. */
export async function makeFixtures(): Promise<Record<Format, Buffer>> {
  const book = utils.book_new()
  utils.book_append_sheet(book, utils.aoa_to_sheet([head, ...rows]), 'results')
  return {
    pdf: await writeManuscript({
      title: 'Attachment of kelp to three surfaces',
      authors: 'Maren Holt',
      affiliation: 'Tern Harbour Marine Institute',
      runningHead: 'Attachment of kelp',
      layout: 'two columns',
      lineNumbers: false,
      blocks: [
        { kind: 'heading', text: 'Methods' },
        { kind: 'paragraph', text: claim.repeat(4) },
        { kind: 'heading', text: 'Results' },
        { kind: 'paragraph', text: result.repeat(4) },
        { kind: 'table', caption: 'Table 1. Pairwise comparisons.', header: head, rows },
      ],
    }),
    docx: makeWord({
      body:
        wordParagraph('Methods', 'Heading1') +
        wordParagraph(claim) +
        wordParagraph('Results', 'Heading1') +
        wordParagraph(result) +
        wordParagraph('Table 1. Pairwise comparisons.') +
        wordTable([head, ...rows]),
    }),
    xlsx: write(book, { type: 'buffer', bookType: 'xlsx', compression: true }) as Buffer,
    csv: Buffer.from([head, ...rows].map((row) => row.join(',')).join('\n')),
  }
}
