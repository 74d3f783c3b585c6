import MarkdownIt from 'markdown-it'
import { renderText } from './render-text'

// Raw HTML is shown as text; no pictures, which would tell a sender when and where a mail is read.
const markdown = new MarkdownIt({ html: false, linkify: false, typographer: false }).disable('image')

/** Markdown → what is mailed and shown. Raw HTML in the Markdown is shown as text, never interpreted. */
export function renderLetter(source: string): { html: string; text: string } {
  return { html: markdown.render(source), text: renderText(markdown.parse(source, {})) }
}
