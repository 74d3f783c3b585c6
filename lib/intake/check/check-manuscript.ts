import { checkPdf } from './check-pdf'
import { checkWord } from './check-word'
import { readHead } from './what-it-is'

/** Refuses what is neither a PDF nor a Word document by its content; returns the media type. */
export async function checkManuscript(path: string): Promise<string> {
  return (await isZip(path)) ? checkWord(path) : checkPdf(path)
}

/** Word documents are zipped; whether one is a Word document is for `checkWord` to say. */
export async function isZip(path: string): Promise<boolean> {
  return (await readHead(path, 4)).toString('latin1') === 'PK\u0003\u0004'
}
