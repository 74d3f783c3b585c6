'use client'

import { procedureNames } from '../charts/thresholds'
import { EmptyState } from '../ui/empty-state'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { isSame } from './audit-index'
import { useBench } from './bench-state'
import { PlaceLink } from './place-link'

/** What the authors say they corrected, and how; the level they state. */
export function ClaimsSection() {
  const { index, chosen, show } = useBench()
  const { claims, alpha } = index.audit
  return (
    <div className="flex flex-col gap-4">
      <p>
        Level: <span className="tabular">α = {alpha.value}</span>
        {alpha.quote === null ? (
          ' by the house rules; the manuscript states none.'
        ) : (
          <>
            , stated on page {alpha.page}: <q className="font-mono text-xs font-normal">{alpha.quote}</q>
          </>
        )}
      </p>
      {claims.length === 0 ? (
        <EmptyState>
          The manuscript does not say that anything was corrected, nor that nothing was.
        </EmptyState>
      ) : (
        <div className="overflow-x-auto">
          <Table caption="Claims of correction">
            <Thead>
              <tr role="row">
                <Th>Place</Th>
                <Th>As printed</Th>
                <Th>Procedure</Th>
                <Th number>
                  <i>m</i>
                </Th>
                <Th number>Threshold</Th>
                <Th number>Groups</Th>
              </tr>
            </Thead>
            <Tbody>
              {claims.map((claim) => {
                const target = { kind: 'claim' as const, id: claim.id }
                return (
                  <Tr
                    key={claim.id}
                    opens
                    selected={isSame(chosen, target)}
                    data-target={`claim-${claim.id}`}
                  >
                    <Td>
                      <PlaceLink row place={claim.place} what="the claim" onShow={() => show(target)} />
                    </Td>
                    <RowTh className="min-w-56 font-mono text-xs font-normal">{claim.place.quote}</RowTh>
                    <Td>{procedureNames[claim.procedure]}</Td>
                    <Td number>{claim.m ?? '–'}</Td>
                    <Td number>{claim.threshold ?? '–'}</Td>
                    <Td number>{claim.groups ?? '–'}</Td>
                  </Tr>
                )
              })}
            </Tbody>
          </Table>
        </div>
      )}
    </div>
  )
}
