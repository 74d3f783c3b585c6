'use client'

import { Download } from 'lucide-react'
import Link from 'next/link'
import type { KeptAudit } from '@/db/queries/audit'
import type { ManuscriptView } from '@/db/queries/manuscript'
import { OUTCOMES } from '@/lib/checks/vocabulary'
import { findTable } from '../columns/find-table'
import { manuscriptUrl } from '../manuscripts/resources'
import { OutcomeShape, outcomeWords } from '../shell/outcome-mark'
import { StateTag } from '../shell/state-tag'
import { Button, ButtonLink } from '../ui/button'
import { KeyHelp } from '../ui/key-help'
import { Menu } from '../ui/menu'

const keys = [
  { keys: ['j', 'k'], does: 'Next and previous finding' },
  { keys: ['Enter'], does: 'Show the place on the page' },
  { keys: ['a'], does: 'Keep the finding for the letter, or take that back' },
  { keys: ['x'], does: 'Drop the finding, or take that back' },
  { keys: ['c'], does: 'Comment on what is chosen' },
  { keys: ['←', '→'], does: 'On the border: make a pane wider; on a page’s marks: walk them' },
]

/** The head of the bench: which manuscript, how its families stand, where to go from here. */
export function BenchBar({ manuscript, kept }: { manuscript: ManuscriptView; kept: KeptAudit }) {
  const { audit } = kept
  const toVerdict = manuscript.actions.includes('readVerdict')
  const home = `/manuscripts/${manuscript.id}`
  const exportUrl = (format: string) =>
    manuscriptUrl(manuscript.id, `/audit/export?format=${format}&round=${kept.round}`)
  return (
    <header className="flex shrink-0 flex-wrap items-center gap-x-5 gap-y-1 border-b border-rule px-4 py-2">
      <div className="min-w-0 flex-1 basis-72">
        <p className="flex items-center gap-2 text-xs text-ink-soft">
          <Link href={home} className="text-tide hover:underline">
            {manuscript.reference ?? 'Manuscript'}
          </Link>
          <StateTag state={manuscript.state} />
          {kept.round > 1 && <span>round {kept.round}</span>}
        </p>
        <h1 className="truncate text-base font-semibold" title={manuscript.title}>
          {manuscript.title || audit.document.title || 'Untitled manuscript'}
        </h1>
      </div>
      <ul className="flex flex-wrap gap-x-3 text-xs max-sm:hidden" aria-label="Families by outcome">
        {OUTCOMES.map((outcome) => {
          const count = audit.families.filter((family) => family.outcome === outcome).length
          if (count === 0) return null
          return (
            <li key={outcome} className="inline-flex items-center gap-1">
              <OutcomeShape outcome={outcome} />
              <span>
                {count} {outcomeWords[outcome]}
              </span>
            </li>
          )
        })}
      </ul>
      <div className="flex items-center gap-1.5 print:hidden">
        <span className="max-lg:hidden">
          <KeyHelp keys={keys} />
        </span>
        {findTable(manuscript) !== null && kept.round === manuscript.round ? (
          <ButtonLink size="small" href={`${home}/table`}>
            Results table
          </ButtonLink>
        ) : null}
        <Menu
          trigger={
            <Button size="small">
              <Download className="size-3.5" aria-hidden="true" /> Download
            </Button>
          }
          items={[
            { label: 'JSON, the whole audit', onSelect: () => window.location.assign(exportUrl('json')) },
            { label: 'CSV, one row a number', onSelect: () => window.location.assign(exportUrl('csv')) },
            {
              label: 'R script, computes every number again',
              onSelect: () => window.location.assign(exportUrl('r')),
            },
            { label: 'Print', onSelect: () => window.print() },
          ]}
        />
        {toVerdict && (
          <ButtonLink size="small" variant="primary" href={`${home}/verdict`}>
            Verdict
          </ButtonLink>
        )}
      </div>
    </header>
  )
}
