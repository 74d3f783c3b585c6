export type Format = 'pdf' | 'word'

export type Troubles = {
  encrypted: string
  damaged: string
  pages: string
  memory: string
  empty: string
  slow: (milliseconds: number) => string
}

const seconds = (milliseconds: number) => {
  const whole = Math.max(1, Math.round(milliseconds / 1000))
  return whole === 1 ? '1 second' : `${whole} seconds`
}

/** What is wrong with a manuscript's file and what to do, in one sentence each. */
export const troubles: Record<Format, Troubles> = {
  pdf: {
    encrypted: 'The PDF is protected by a password; please save it without protection and hand it in again.',
    damaged:
      'The PDF is damaged and cannot be opened; please export it again from its source and hand that in.',
    pages:
      'The PDF has more pages than can be read here; please hand in the manuscript without its supplements.',
    memory: 'The PDF needs more memory than one file may take; please export it again with smaller pictures.',
    empty:
      'The PDF holds pictures of its pages and no text, as a scan does, and no text could be recognised in them; please export it from its source as text and hand that in.',
    slow: (ms) =>
      `The PDF could not be read within ${seconds(ms)}; please export it again from its source, as text and not as pictures.`,
  },
  word: {
    encrypted:
      'The Word document is protected by a password; please save it without one and hand it in again.',
    damaged:
      'The Word document is damaged and cannot be opened; please save it again as .docx, or export it as PDF, and hand that in.',
    pages:
      'The Word document has more pages than can be read here; please hand in the manuscript without its supplements.',
    memory:
      'The Word document needs more memory than one file may take; please export it as PDF and hand that in.',
    empty: 'The Word document holds no text; please export it as PDF and hand that in.',
    slow: (ms) =>
      `The Word document could not be read within ${seconds(ms)}; please export it as PDF and hand that in.`,
  },
}

/** By the name of the error that the reader of PDFs throws. */
export function describeTrouble(format: Format, name: string): string {
  const says = troubles[format]
  if (name === 'PasswordException') return says.encrypted
  if (name === 'TooManyPagesException') return says.pages
  if (name === 'NoTextException') return says.empty
  return says.damaged
}
