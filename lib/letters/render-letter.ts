/** Markdown → what is mailed and shown. Raw HTML in the Markdown is shown as text, never interpreted. */
export function renderLetter(_markdown: string): { html: string; text: string } {
  throw new Error('not yet')
}
