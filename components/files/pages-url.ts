import type { FileView } from '@/db/queries/manuscript'
import { WORD_DOCUMENT } from '@/lib/rules/words'

/** A Word document is read from a copy in pages; everything else from the file itself. */
export function hasReadingCopy({ mediaType }: Pick<FileView, 'mediaType'>): boolean {
  return mediaType === WORD_DOCUMENT
}

/** Where the pages are that an audit speaks of. */
export function pagesUrlOf(file: Pick<FileView, 'id' | 'mediaType'>): string {
  return hasReadingCopy(file) ? `/api/files/${file.id}/reading-copy` : `/api/files/${file.id}`
}
