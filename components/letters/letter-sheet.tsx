import { classes } from '../ui/classes'
import './letter-sheet.css'

type LetterSheetProps = {
  subject?: string | null
  /** Made by the server from Markdown, in which raw HTML is shown as text. */
  html: string
  className?: string
}

/** A letter as its reader gets it. */
export function LetterSheet({ subject, html, className }: LetterSheetProps) {
  return (
    <div
      className={classes(
        'border border-rule bg-sheet px-5 py-6 shadow-sheet sm:px-8 print:border-0 print:shadow-none',
        className,
      )}
    >
      {subject && <p className="mb-4 border-b border-rule pb-3 font-sans font-semibold">{subject}</p>}
      <div className="letter" dangerouslySetInnerHTML={{ __html: html }} />
    </div>
  )
}
