'use client'

import { Tabs } from 'radix-ui'
import type { ReactNode } from 'react'
import type { CommentRow } from '@/db/queries/comments'
import { CommentsSection } from '../comments/comments-section'
import { useComments, type CommentSubject } from '../comments/use-comments'
import { FamiliesSection } from '../families/families-section'
import { FindingsSection } from '../findings/findings-section'
import { Cautions } from './cautions'
import { useBench } from './bench-state'
import { ClaimsSection } from './claims-section'
import { NumbersSection } from './numbers-section'
import { subjectOf } from './subject-of'

export const AUDIT_TABS = ['families', 'findings', 'numbers', 'claims', 'comments'] as const
export type AuditTab = (typeof AUDIT_TABS)[number]

type AuditPaneProps = {
  tab: AuditTab
  onTab: (tab: AuditTab) => void
  mayComment: boolean
  seesComments: boolean
  subject: CommentSubject | null
  onSubject: (subject: CommentSubject | null) => void
  onShowComment: (comment: CommentRow) => void
}

/** The audit in five lists. All but the comments stay drawn, so that they keep their place and can be printed. */
export function AuditPane(props: AuditPaneProps) {
  const { index, manuscriptId, chosen } = useBench()
  const { audit } = index
  return (
    <Tabs.Root
      value={props.tab}
      onValueChange={(value) => {
        const tab = AUDIT_TABS.find((one) => one === value)
        if (tab) props.onTab(tab)
      }}
      className="flex h-full min-h-0 flex-col print:block"
    >
      <Tabs.List
        aria-label="Parts of the audit"
        className="flex min-h-11 shrink-0 flex-wrap gap-x-4 border-b border-rule px-4 print:hidden"
      >
        <Tab value="families" count={audit.families.length} />
        <Tab value="findings" count={audit.findings.length} />
        <Tab value="numbers" count={audit.reports.length + audit.statistics.length} />
        <Tab value="claims" count={audit.claims.length} />
        {props.seesComments && <CommentsTab manuscriptId={manuscriptId} />}
      </Tabs.List>
      <Pane value="families" title="Families">
        <FamiliesSection />
        <Cautions />
      </Pane>
      <Pane value="findings" title="Findings">
        <FindingsSection />
        <Cautions />
      </Pane>
      <Pane value="numbers" title="Numbers">
        <NumbersSection />
      </Pane>
      <Pane value="claims" title="Claims">
        <ClaimsSection />
      </Pane>
      {props.seesComments && (
        <Pane value="comments" title="Comments">
          <CommentsSection
            manuscriptId={manuscriptId}
            mayWrite={props.mayComment}
            subject={props.subject}
            onSubject={props.onSubject}
            offered={chosen && subjectOf(index, chosen)}
            onShow={props.onShowComment}
          />
        </Pane>
      )}
    </Tabs.Root>
  )
}

function Tab({ value, count }: { value: AuditTab; count: number | null }) {
  return (
    <Tabs.Trigger
      value={value}
      className="-mb-px inline-flex min-h-9 items-center gap-1.5 border-b-2 border-transparent px-0.5 whitespace-nowrap text-ink-soft hover:text-ink data-[state=active]:border-tide data-[state=active]:font-medium data-[state=active]:text-ink"
    >
      {value.charAt(0).toUpperCase() + value.slice(1)}
      {count !== null && <span className="tabular text-xs">{count}</span>}
    </Tabs.Trigger>
  )
}

function CommentsTab({ manuscriptId }: { manuscriptId: string }) {
  const { data } = useComments(manuscriptId)
  return <Tab value="comments" count={data ? data.filter((one) => one.resolvedAt === null).length : null} />
}

function Pane({ value, title, children }: { value: AuditTab; title: string; children: ReactNode }) {
  return (
    <Tabs.Content
      value={value}
      forceMount
      className="min-h-0 flex-1 overflow-y-auto px-3 py-4 data-[state=inactive]:hidden sm:px-5 print:block! print:overflow-visible"
    >
      <h2 className="sr-only mb-3 text-lg font-semibold print:not-sr-only">{title}</h2>
      {children}
    </Tabs.Content>
  )
}
