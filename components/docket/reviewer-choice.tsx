import type { ReviewerRow } from '@/db/queries/reviewers'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { DueTime } from './due-time'

type ReviewerChoiceProps = {
  reviewers: readonly ReviewerRow[]
  value: string | null
  onChange: (reviewerId: string) => void
}

/** Who could review, the least loaded first; who is barred stays in sight with the reason. */
export function ReviewerChoice({ reviewers, value, onChange }: ReviewerChoiceProps) {
  return (
    <Table caption="Reviewers">
      <Thead>
        <Tr className="bg-sheet">
          <Th>Reviewer</Th>
          <Th number>Open</Th>
          <Th>Next due</Th>
        </Tr>
      </Thead>
      <Tbody>
        {reviewers.map((reviewer) => (
          <Tr key={reviewer.id} selected={value === reviewer.id}>
            <RowTh>
              <label className="flex items-start gap-2">
                <input
                  type="radio"
                  name="reviewer"
                  className="mt-0.5 size-4 shrink-0"
                  checked={value === reviewer.id}
                  disabled={reviewer.barred.length > 0}
                  onChange={() => onChange(reviewer.id)}
                />
                <span>
                  <span className="font-medium">{reviewer.name}</span>
                  <span className="block text-xs text-ink-soft">
                    {reviewer.barred.length > 0 ? sayBarred(reviewer) : reviewer.expertise}
                  </span>
                </span>
              </label>
            </RowTh>
            <Td number>
              {reviewer.open}
              {reviewer.overdue > 0 ? (
                <span className="block text-xs text-fails">{reviewer.overdue} overdue</span>
              ) : null}
            </Td>
            <Td>
              {reviewer.nextDueAt === null ? (
                <span className="text-ink-soft">nothing</span>
              ) : (
                <DueTime at={reviewer.nextDueAt} />
              )}
            </Td>
          </Tr>
        ))}
      </Tbody>
    </Table>
  )
}

function sayBarred({ barred }: ReviewerRow): string {
  const handedIn = barred.some((bar) => bar.why === 'submitter')
  return handedIn
    ? 'Handed in a manuscript of this selection'
    : 'Has declared a conflict of interest with a manuscript of this selection'
}
