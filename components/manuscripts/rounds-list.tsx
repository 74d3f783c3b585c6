import { FileText, Table2 } from 'lucide-react'
import Link from 'next/link'
import type { FileView, RoundView } from '@/db/queries/manuscript'
import { formatBytes } from '../files/format-bytes'
import { hasReadingCopy } from '../files/pages-url'
import { Time } from '../ui/time'

type RoundsListProps = {
  rounds: readonly RoundView[]
  readable: boolean
  /** The results table whose columns can be looked at, and where. */
  table?: { fileId: string; href: string }
}

/** The rounds with their files and what was said with them; the newest first. */
export function RoundsList({ rounds, readable, table }: RoundsListProps) {
  return (
    <ol className="flex flex-col gap-5">
      {[...rounds].reverse().map((round) => (
        <li key={round.id}>
          <h3 className="font-semibold">
            Round {round.number}
            <span className="ml-2 font-sans text-xs font-normal text-ink-soft">
              {round.handedInAt === null ? (
                'being prepared'
              ) : (
                <>
                  handed in <Time at={round.handedInAt} />
                </>
              )}
            </span>
          </h3>
          {round.files.length > 0 && (
            <ul className="mt-1 flex flex-col gap-1">
              {round.files.map((file) => (
                <FileLine
                  key={file.id}
                  file={file}
                  readable={readable}
                  readHref={table?.fileId === file.id ? table.href : null}
                />
              ))}
            </ul>
          )}
          <Said round={round} />
        </li>
      ))}
    </ol>
  )
}

type FileLineProps = { file: FileView; readable: boolean; readHref: string | null }

function FileLine({ file, readable, readHref }: FileLineProps) {
  const Icon = file.kind === 'manuscript' ? FileText : Table2
  return (
    <li className="flex flex-wrap items-baseline gap-x-2">
      <Icon className="size-4 shrink-0 translate-y-0.5 text-ink-soft" aria-hidden="true" />
      {readable ? (
        <a href={`/api/files/${file.id}`} className="min-w-0 break-words text-tide hover:underline">
          {file.name}
        </a>
      ) : (
        <span className="min-w-0 break-words">{file.name}</span>
      )}
      <span className="tabular text-xs whitespace-nowrap text-ink-soft">
        {file.kind === 'manuscript' ? 'manuscript' : 'results table'}, {formatBytes(file.bytes)}
        {file.replacedAt !== null && ', replaced'}
      </span>
      {readHref === null ? null : (
        <Link href={readHref} className="text-xs text-tide underline underline-offset-2">
          How it is read
        </Link>
      )}
      {hasReadingCopy(file) && file.replacedAt === null ? (
        <span className="w-full pl-6 text-xs text-ink-soft">
          Read from a copy in pages; the page numbers of the audit are those of the copy.
        </span>
      ) : null}
    </li>
  )
}

function Said({ round }: { round: RoundView }) {
  const said = [
    ['Level', round.alpha === null ? '' : `α = ${round.alpha}`],
    ['Correction, as they say', round.correction],
    ['Primary outcome', round.primaryOutcome],
    ['Note', round.note],
  ].filter(([, words]) => words !== '')
  if (said.length === 0) return null
  return (
    <dl className="mt-2 grid grid-cols-[max-content_minmax(0,1fr)] gap-x-5 gap-y-1">
      {said.map(([name, words]) => (
        <div key={name} className="contents">
          <dt className="text-ink-soft">{name}</dt>
          <dd className="whitespace-pre-wrap">{words}</dd>
        </div>
      ))}
    </dl>
  )
}
