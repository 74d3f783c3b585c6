'use client'

import { useMemo } from 'react'
import type { Family } from '@/lib/checks/types'
import { procedureNames } from '../charts/thresholds'
import { rawIntervals } from '../charts/raw-intervals'
import { Staircase } from '../charts/staircase'
import { StaircaseLegend } from '../charts/staircase-legend'
import { StaircaseTable } from '../charts/staircase-table'
import { isSame } from '../bench/audit-index'
import { useBench } from '../bench/bench-state'
import { OpenInCalculator } from '../calculator/open-in-calculator'
import { manuscriptUrl } from '../manuscripts/resources'
import { PlaceLink } from '../bench/place-link'
import { OutcomeMark, OutcomeShape } from '../shell/outcome-mark'
import { Button, buttonLook } from '../ui/button'
import { classes } from '../ui/classes'
import { DecisionsTable } from './decisions-table'

/** One family: what is claimed of it, what is due, the picture, each call. */
export function FamilySheet({ family, number }: { family: Family; number: number }) {
  const { manuscriptId, round, index, chosen, show, comment } = useBench()
  const claim = family.claim ? (index.claims.get(family.claim) ?? null) : null
  const alpha = claim?.alpha ?? index.audit.alpha.value
  const judged = family.decisions.map((decision) => decision.report)
  const reports = [...new Set([...family.members, ...judged])].flatMap((id) => index.reports.get(id) ?? [])
  const raw = useMemo(() => rawIntervals(family, index.reports, index.statistics), [family, index])
  const target = { kind: 'family' as const, id: family.id }
  const page = claim?.place.page ?? reports[0]?.place.page ?? null
  return (
    <article
      aria-labelledby={`family-${family.id}-title`}
      data-target={`family-${family.id}`}
      className="grid grid-cols-[2.5rem_minmax(0,1fr)] scroll-mt-4"
    >
      <div className="flex flex-col items-center gap-1 pt-1 text-xs text-ink-soft">
        <OutcomeShape outcome={family.outcome} className="size-4.5" />
        {page !== null && <span className="tabular">{page}</span>}
      </div>
      <div
        className={classes(
          'margin-rule flex min-w-0 flex-col gap-4 pb-10 pl-4',
          isSame(chosen, target) && 'bg-tide-wash/40',
        )}
      >
        <header>
          <div className="flex items-baseline justify-between gap-x-4">
            <h3 id={`family-${family.id}-title`} className="text-lg font-semibold">
              <span className="sr-only">Family {number}: </span>
              {family.label}
            </h3>
            <OutcomeMark outcome={family.outcome} />
          </div>
          <p className="mt-1 max-w-prose">{family.why}</p>
        </header>
        <dl className="grid grid-cols-[max-content_minmax(0,1fr)] gap-x-4 gap-y-1.5">
          <dt className="text-ink-soft">Claim</dt>
          <dd>
            {claim ? (
              <>
                {procedureNames[claim.procedure]}{' '}
                <PlaceLink
                  place={claim.place}
                  what="the claim"
                  onShow={() => show({ kind: 'claim', id: claim.id })}
                />
                <q className="block font-mono text-xs text-ink-soft">{claim.place.quote}</q>
              </>
            ) : (
              'none found for this family'
            )}
          </dd>
          <dt className="text-ink-soft">Tests</dt>
          <dd>
            <span className="tabular">
              <i>m</i> = {family.m.printed} printed
              {family.m.claimed !== null && `, ${family.m.claimed} claimed`}
              {family.m.due !== null && (
                <>
                  , <strong>{family.m.due} due</strong>
                </>
              )}
            </span>
            {family.m.why && <span className="block text-ink-soft">{family.m.why}</span>}
          </dd>
          <dt className="text-ink-soft">Level</dt>
          <dd className="tabular">α = {alpha}</dd>
          {family.fits.length > 0 && (
            <>
              <dt className="text-ink-soft">Fits</dt>
              <dd>The printed adjusted values are reproduced by {listFits(family)}.</dd>
            </>
          )}
        </dl>
        {reports.length > 0 && (
          <figure className="break-inside-avoid">
            <Staircase
              id={`staircase-${family.id}`}
              family={family}
              reports={reports}
              claim={claim}
              alpha={alpha}
              raw={raw}
              chosen={chosen?.kind === 'report' ? chosen.id : null}
              onPick={(id) => show({ kind: 'report', id })}
            />
            <figcaption className="mt-1 text-xs text-ink-soft">
              <StaircaseLegend words={marks} />
              <details className="mt-1 print:hidden">
                <summary className="text-tide">The picture as a table</summary>
                <StaircaseTable family={family} reports={reports} claim={claim} alpha={alpha} raw={raw} />
              </details>
            </figcaption>
          </figure>
        )}
        <DecisionsTable family={family} />
        <div className="flex flex-wrap gap-1 print:hidden">
          {comment && (
            <Button size="small" variant="quiet" onClick={() => comment(target)}>
              Comment on this family
            </Button>
          )}
          <OpenInCalculator
            family={family}
            claim={claim}
            alpha={alpha}
            reports={index.reports}
            statistics={index.statistics}
          />
          <a
            download
            href={manuscriptUrl(manuscriptId, `/audit/export?format=r&family=${family.id}&round=${round}`)}
            className={buttonLook({ size: 'small', variant: 'quiet' })}
          >
            R script<span className="sr-only"> of family {number}</span>
          </a>
        </div>
      </div>
    </article>
  )
}

const marks = {
  dot: 'called significant',
  open: 'called not significant',
  cross: 'not called',
  fails: 'call fails',
  undecidable: 'cannot be decided',
}

function listFits(family: Family): string {
  const names = family.fits.map(({ procedure, m }) =>
    procedure === 'raw' ? 'the raw values themselves' : `${procedureNames[procedure]} at m = ${m}`,
  )
  if (names.length < 2) return names.join('')
  return `${names.slice(0, -1).join(', ')} or ${names[names.length - 1]}`
}
