/** What is wrong with a PDF and what to do, in one sentence each. */
export const troubles = {
  encrypted: 'The PDF is protected by a password; please save it without protection and hand it in again.',
  damaged:
    'The PDF is damaged and cannot be opened; please export it again from its source and hand that in.',
  pages:
    'The PDF has more pages than can be read here; please hand in the manuscript without its supplements.',
  memory: 'The PDF needs more memory than one file may take; please export it again with smaller pictures.',
  scanned:
    'The PDF holds pictures of its pages and no text, as a scan does; please export it from its source as text and hand that in.',
  slow: (ms: number) =>
    `The PDF could not be read within ${Math.round(ms / 1000)} seconds; please export it again from its source, as text and not as pictures.`,
}

/** By the name of pdfjs's error. */
export function describeTrouble(name: string): string {
  if (name === 'PasswordException') return troubles.encrypted
  if (name === 'RangeError') return troubles.pages
  if (name === 'NoTextException') return troubles.scanned
  return troubles.damaged
}
