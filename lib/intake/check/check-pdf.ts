import { refuse } from '@/lib/rules/refusal'
import { readHead, readTail, sayWhatItIs } from './what-it-is'

export const cutOff =
  'The file is cut off: its end is missing. Please open it to see whether it is whole, and hand it in again.'

/** Refuses what is not a PDF by its content, and a PDF whose end is missing. */
export async function checkPdf(path: string): Promise<'application/pdf'> {
  const head = await readHead(path, 1024)
  if (!head.includes('%PDF-')) throw refuse('unreadable', await sayWhatItIs(path, 'manuscript'))
  const tail = await readTail(path, 4096)
  if (!tail.includes('%%EOF') || !tail.includes('startxref')) throw refuse('unreadable', cutOff)
  return 'application/pdf'
}
