import type { ReadDocument } from '@/lib/checks/types'
import { readManuscript } from '../read-manuscript'
import type { ReadingLimits } from '../thread/run-thread'

/** The positioned text of a manuscript alone; rejects as `readManuscript` does. */
export async function readPdf(
  path: string,
  limits?: ReadingLimits,
  onPage?: (page: number, of: number) => void,
): Promise<ReadDocument> {
  return (await readManuscript(path, limits, onPage)).document
}
