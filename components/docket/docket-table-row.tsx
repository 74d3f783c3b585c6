'use client'

import type { DocketRow } from '@/db/queries/docket'
import { OUTCOMES } from '@/lib/checks/vocabulary'
import { OutcomeShape, outcomeWords } from '../shell/outcome-mark'
import { StateTag } from '../shell/state-tag'
import { Button } from '../ui/button'
import { Checkbox } from '../ui/choice'
import { RowLink } from '../ui/row-link'
import { Td, Tr } from '../ui/table'
import { DueTime } from './due-time'
import { Time } from '../ui/time'

type DocketTableRowProps = {
  row: DocketRow
  judged: boolean
  selectable: boolean
  selected: boolean
  /** Null where the row cannot be assigned. */
  onToggle: (() => void) | null
  onAnswer: (accept: boolean) => void
}

export function DocketTableRow({
  row,
  judged,
  selectable,
  selected,
  onToggle,
  onAnswer,
}: DocketTableRowProps) {
  const title = row.title || 'Without a title'
  const offered = row.state === 'assigned' && row.sight === 'reviewer'
  return (
    <Tr opens selected={selected}>
      {selectable ? (
        <Td className="max-md:absolute max-md:right-0">
          {onToggle ? (
            <Checkbox
              label={`Select ${row.reference ?? title}`}
              hideLabel
              checked={selected}
              onChange={onToggle}
              className="relative z-1"
            />
          ) : null}
        </Td>
      ) : null}
      <Td className="whitespace-nowrap text-ink-soft">
        {row.reference ?? 'draft'}
        {row.round > 1 ? <span title={`Round ${row.round}`}> · r{row.round}</span> : null}
      </Td>
      <Td className="md:w-[34%] md:min-w-56">
        <RowLink
          href={row.state === 'draft' ? `/hand-in/${row.id}` : `/manuscripts/${row.id}`}
          className="font-medium"
        >
          {title}
        </RowLink>
      </Td>
      <Td label="State" className="whitespace-nowrap">
        {offered ? (
          <span className="relative z-1 inline-flex gap-1.5">
            <Button size="small" variant="primary" onClick={() => onAnswer(true)}>
              Accept
            </Button>
            <Button size="small" onClick={() => onAnswer(false)}>
              Decline
            </Button>
          </span>
        ) : (
          <StateTag state={row.state} />
        )}
      </Td>
      {judged ? (
        <Td label="Families">
          <Outcomes counts={row.outcomes} />
        </Td>
      ) : null}
      <Td label="Reviewer">{row.reviewer?.name ?? <Nothing />}</Td>
      <Td label="Due" className="whitespace-nowrap">
        {row.dueAt === null ? <Nothing /> : <DueTime at={row.dueAt} />}
      </Td>
      <Td label="Received" className="whitespace-nowrap text-ink-soft">
        {row.receivedAt === null ? <Nothing /> : <Time at={row.receivedAt} show="short" />}
      </Td>
    </Tr>
  )
}

function Outcomes({ counts }: { counts: DocketRow['outcomes'] }) {
  const present = counts === null ? [] : OUTCOMES.filter((outcome) => counts[outcome] > 0)
  if (counts === null || present.length === 0) return <Nothing />
  return (
    <ul className="flex gap-3">
      {present.map((outcome) => (
        <li
          key={outcome}
          title={`${counts[outcome]} ${outcomeWords[outcome]}`}
          className="inline-flex items-center gap-1"
        >
          <OutcomeShape outcome={outcome} />
          {counts[outcome]}
          <span className="sr-only"> {outcomeWords[outcome]}</span>
        </li>
      ))}
    </ul>
  )
}

function Nothing() {
  return (
    <span data-nothing className="text-ink-soft">
      <span aria-hidden="true">–</span>
      <span className="sr-only">none</span>
    </span>
  )
}
