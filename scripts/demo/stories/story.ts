import type { Block, Manuscript, TableBlock } from '../write-manuscript'

export type Sheet = { name: string; rows: (string | number)[][] }

/** One manuscript of the demonstration: what is handed in and what its submitter says about it. */
export type Story = {
  key: string
  manuscript: Manuscript
  results: { file: string; sheets: Sheet[] } | null
  form: { alpha: number | null; correction: string; primaryOutcome: string; note: string }
}

type Paper = {
  title: string
  authors: string
  runningHead: string
  layout: Manuscript['layout']
  lineNumbers?: boolean
  password?: string
  abstract: string
  introduction: string[]
  methods: string[]
  results: (string | TableBlock)[]
  discussion: string[]
}

/** The usual order of a paper, from its parts. */
export function writePaper(paper: Paper): Manuscript {
  const section = (name: string, parts: readonly (string | TableBlock)[]): Block[] => [
    { kind: 'heading', text: name },
    ...parts.map((part): Block =>
      typeof part === 'string' ? { kind: 'paragraph', text: part } : { kind: 'table', ...part },
    ),
  ]
  return {
    title: paper.title,
    authors: paper.authors,
    affiliation: 'Tern Harbour Marine Institute, Tern Harbour',
    runningHead: paper.runningHead,
    layout: paper.layout,
    lineNumbers: paper.lineNumbers ?? false,
    ...(paper.password ? { password: paper.password } : {}),
    blocks: [
      ...section('Abstract', [paper.abstract]),
      ...section('1. Introduction', paper.introduction),
      ...section('2. Methods', paper.methods),
      ...section('3. Results', paper.results),
      ...section('4. Discussion', paper.discussion),
      ...section('Data availability', [
        'The measurements are kept in the institute’s archive and are available from the corresponding author.',
      ]),
    ],
  }
}
