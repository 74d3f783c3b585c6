import { WORD_DOCUMENT, type FileKind } from '@/lib/rules/words'

type KindOfFile = {
  label: string
  hint: string
  /** Types and endings, as the browser's file list wants them. */
  accept: Record<string, string[]>
  /** Said where a file of another kind is chosen. */
  wrong: string
}

export const fileKinds: Record<FileKind, KindOfFile> = {
  manuscript: {
    label: 'Manuscript',
    hint: 'One PDF or Word document (.docx). Best is a PDF with text that can be selected, not a scan.',
    accept: { 'application/pdf': ['.pdf'], [WORD_DOCUMENT]: ['.docx'] },
    wrong: 'This is neither a PDF nor a Word document (.docx); please save the manuscript as one of these.',
  },
  table: {
    label: 'Results table',
    hint: 'CSV, TSV or XLSX with one test a row: comparison, statistic, degrees of freedom, p-values.',
    accept: {
      'text/csv': ['.csv'],
      'text/tab-separated-values': ['.tsv', '.tab'],
      'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet': ['.xlsx'],
    },
    wrong: 'This is not a table that can be read; please save it as CSV, TSV or XLSX.',
  },
}
