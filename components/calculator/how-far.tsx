'use client'

import type { Calculation } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { nameOf, showSurvives } from './show-value'

const LISTED = 12

/** The largest family at which each significance survives, for the tests that are or may be significant alone. */
export function HowFar({ entries, calculation }: { entries: readonly Entry[]; calculation: Calculation }) {
  const { bonferroni, holm, bh } = calculation.survives
  const order = entries
    .flatMap((entry, index) => ((bonferroni[index]?.possible ?? 0) >= 1 ? [{ entry, index }] : []))
    .sort((a, b) => (bonferroni[b.index]?.certain ?? 0) - (bonferroni[a.index]?.certain ?? 0))
  if (order.length === 0) return <p>No test is significant alone, so there is nothing to hold.</p>
  return (
    <>
      <div
        className="overflow-x-auto"
        role="region"
        aria-label="How far each significance holds"
        tabIndex={0}
      >
        <Table caption="The largest family at which each significance survives">
          <Thead>
            <tr role="row">
              <Th>Test</Th>
              <Th number>Bonferroni</Th>
              <Th number>Holm</Th>
              <Th number>BH</Th>
            </tr>
          </Thead>
          <Tbody>
            {order.slice(0, LISTED).map(({ entry, index }) => (
              <Tr key={index}>
                <RowTh className="max-w-56 truncate font-normal">{nameOf(entry, index)}</RowTh>
                {[bonferroni, holm, bh].map((list, column) => {
                  const survives = list[index]
                  return (
                    <Td key={column} number>
                      {survives ? showSurvives(survives) : '–'}
                    </Td>
                  )
                })}
              </Tr>
            ))}
          </Tbody>
        </Table>
      </div>
      <p className="mt-1.5 text-xs text-ink-soft">
        The largest <i>m</i> at which each stays significant. Of two numbers it is certain up to the first and
        lost above the second; between them the rounding leaves it open. Members that join the family are
        taken as larger than those listed.
        {order.length > LISTED && ` The ${LISTED} that hold farthest; the CSV holds all.`}
      </p>
    </>
  )
}
