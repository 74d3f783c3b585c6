import type { ReactNode } from 'react'
import { notFound } from 'next/navigation'
import { DueFigures } from '@/components/figures/due-figures'
import { LoadFigures } from '@/components/figures/load-figures'
import { PointFigures } from '@/components/figures/point-figures'
import { StateFigures } from '@/components/figures/state-figures'
import { TurnaroundFigures } from '@/components/figures/turnaround-figures'
import { EmptyState } from '@/components/ui/empty-state'
import { Page } from '@/components/ui/page'
import { PageHead } from '@/components/ui/page-head'
import { getDb } from '@/db/current'
import { getFigures } from '@/db/queries/figures'
import { listReviewers } from '@/db/queries/reviewers'
import { may } from '@/lib/rules/permissions'
import { requireActor } from '@/lib/web/actor'
import { getNow } from '@/lib/web/now'

export const metadata = { title: 'Figures' }

export default async function FiguresPage() {
  const actor = await requireActor()
  if (!may(actor, 'figures.read')) notFound()
  const db = getDb()
  const now = getNow()
  const figures = getFigures(db, actor, now)
  return (
    <Page>
      <PageHead title="Figures" lead="Counted from the desk as it stands now." />
      <div className="grid gap-x-14 gap-y-10 lg:grid-cols-2">
        <Figure title="The queue">
          <StateFigures states={figures.states} />
        </Figure>
        <div className="flex flex-col gap-10">
          <Figure title="Turnaround">
            <TurnaroundFigures turnaround={figures.turnaround} />
          </Figure>
          <Figure title="Due">
            <DueFigures overdue={figures.overdue} dueByWeek={figures.dueByWeek} />
          </Figure>
        </div>
        <Figure
          title="The audit's points"
          note="In rounds whose verdict is released: how often reviewers kept what the audit raised, and how often they dropped it."
        >
          {figures.points.length === 0 ? (
            <EmptyState>No verdict has been released yet, so nothing is known of the points.</EmptyState>
          ) : (
            <PointFigures points={figures.points} />
          )}
        </Figure>
        <Figure title="Load">
          <LoadFigures reviewers={listReviewers(db, actor, [], now)} />
        </Figure>
      </div>
    </Page>
  )
}

function Figure({ title, note, children }: { title: string; note?: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="mb-2 text-lg font-semibold">{title}</h2>
      {note ? <p className="mb-2 max-w-prose text-ink-soft">{note}</p> : null}
      {children}
    </section>
  )
}
