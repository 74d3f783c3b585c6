'use client'

import { useMemo, useState } from 'react'
import type { Adjusted, Calculation } from '@/lib/checks/calculate/calculate'
import type { Entry } from '@/lib/checks/calculate/entry'
import { OutcomeShape } from '../shell/outcome-mark'
import { Button } from '../ui/button'
import { classes } from '../ui/classes'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr, type SortDirection } from '../ui/table'
import { outcomeOf, standOf, wordsOf, type Standing } from './judge-entry'
import { shortNameOf } from './short-names'
import { nameOf, showAdjusted } from './show-value'

const FIRST = 50
const MORE = 250

type ValuesTableProps = {
  entries: readonly Entry[]
  calculation: Calculation
  results: readonly Adjusted[]
  alpha: number
  chosen: number | null
  onChoose: (index: number) => void
}

type Sort = { by: 'order' | 'name' | 'p'; direction: SortDirection }

/** Every test with its adjusted values side by side; the first procedure leads. */
export function ValuesTable({ entries, calculation, results, alpha, chosen, onChoose }: ValuesTableProps) {
  const [sort, setSort] = useState<Sort>({ by: 'order', direction: 'ascending' })
  const [shown, setShown] = useState(FIRST)
  const order = useMemo(() => sortEntries(entries, calculation, sort), [entries, calculation, sort])
  const computed = results.filter((one) => one.refused === null)
  const drawn = order.slice(0, shown)
  const sortBy = (by: Sort['by']) =>
    setSort((before) => ({
      by,
      direction: before.by === by && before.direction === 'ascending' ? 'descending' : 'ascending',
    }))
  const directionOf = (by: Sort['by']) => (sort.by === by ? sort.direction : null)
  return (
    <div>
      <div className="overflow-x-auto" role="region" aria-label="Adjusted values" tabIndex={0}>
        <Table stacks caption="The tests with their adjusted values">
          <Thead>
            <tr role="row">
              <Th number sort={directionOf('order')} onSort={() => sortBy('order')}>
                No.
              </Th>
              <Th sort={directionOf('name')} onSort={() => sortBy('name')}>
                Test
              </Th>
              <Th number sort={directionOf('p')} onSort={() => sortBy('p')}>
                <span>
                  Raw <i>p</i>
                </span>
              </Th>
              {computed.map(({ procedure }, i) => (
                <Th key={procedure} number className={i === 0 ? 'text-ink' : undefined}>
                  {shortNameOf(procedure)}
                </Th>
              ))}
            </tr>
          </Thead>
          <Tbody>
            {drawn.map((index) => {
              const entry = entries[index]
              const raw = calculation.raw[index]
              if (!entry || !raw) return null
              return (
                <Tr key={index} opens selected={chosen === index}>
                  <Td number className="text-ink-soft">
                    <span data-nothing>{index + 1}</span>
                  </Td>
                  <RowTh className="max-w-64 truncate font-normal">
                    <button
                      type="button"
                      className="row-link text-left"
                      title={nameOf(entry, index)}
                      aria-pressed={chosen === index}
                      onClick={() => onChoose(index)}
                    >
                      {nameOf(entry, index)}
                    </button>
                  </RowTh>
                  <Td number label="Raw p">
                    {entry.printed}
                  </Td>
                  {computed.map(({ procedure, adjusted, significant }, i) => {
                    const one = adjusted[index]
                    const standing = standOf(raw, significant[index] ?? null, alpha)
                    return (
                      <Td key={procedure} number label={shortNameOf(procedure)}>
                        <AdjustedCell
                          text={one ? showAdjusted(one, entry) : '–'}
                          standing={standing}
                          leads={i === 0}
                        />
                      </Td>
                    )
                  })}
                </Tr>
              )
            })}
          </Tbody>
        </Table>
      </div>
      {order.length > shown && (
        <p className="mt-2 flex flex-wrap items-center gap-3 text-ink-soft">
          {shown.toLocaleString('en')} of {order.length.toLocaleString('en')} shown; the CSV holds all.
          <Button size="small" variant="quiet" onClick={() => setShown(shown + MORE)}>
            Show {Math.min(MORE, order.length - shown)} more
          </Button>
        </p>
      )}
    </div>
  )
}

function AdjustedCell({ text, standing, leads }: { text: string; standing: Standing; leads: boolean }) {
  const outcome = outcomeOf(standing)
  return (
    <span
      className={classes(
        'inline-flex items-center justify-end gap-1.5',
        outcome === null && 'text-ink-soft',
        leads && outcome === 'holds' && 'font-semibold',
      )}
    >
      {text}
      {outcome ? <OutcomeShape outcome={outcome} /> : <span className="size-3.5" />}
      <span className="sr-only">{wordsOf(standing)}</span>
    </span>
  )
}

function sortEntries(entries: readonly Entry[], { raw }: Calculation, { by, direction }: Sort): number[] {
  const order = entries.map((_, i) => i)
  const middle = (i: number) => (raw[i]?.low ?? 0) + (raw[i]?.high ?? 0)
  if (by === 'name') {
    const collator = new Intl.Collator('en', { numeric: true })
    const names = entries.map(nameOf)
    order.sort((a, b) => collator.compare(names[a] ?? '', names[b] ?? ''))
  }
  if (by === 'p') order.sort((a, b) => middle(a) - middle(b))
  return direction === 'descending' ? order.reverse() : order
}
