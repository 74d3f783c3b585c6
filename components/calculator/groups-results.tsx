'use client'

import { isSignificant } from '@/lib/checks/families/decide'
import type { Interval } from '@/lib/checks/numbers/printed-interval'
import { procedureTable } from '@/lib/checks/procedures/table'
import { writeSummaryScript } from '@/lib/checks/r-script/summary-script'
import type { SummaryGroup } from '@/lib/checks/summary/groups'
import type { Summary, SummaryComparison } from '@/lib/checks/summary/summarize'
import { writeSummaryCsv } from '@/lib/checks/calculate/write-summary-csv'
import { recomputedInterval } from '../charts/printed-p'
import { OutcomeShape } from '../shell/outcome-mark'
import { formatComputed } from '../ui/format-value'
import { RowTh, Table, Tbody, Td, Th, Thead, Tr } from '../ui/table'
import { ValueText } from '../ui/value-text'
import type { CalculatorInput } from './calculator-input'
import { outcomeOf, standOf, wordsOf } from './judge-entry'
import { shortNameOf } from './short-names'
import { MOST_FOR_OWN_RANGES } from './summarize-input'
import { Toolbar } from './toolbar'
import { count } from './work-out'

const LISTED = 300

type GroupsResultsProps = { groups: readonly SummaryGroup[]; summary: Summary; input: CalculatorInput }

/** The analysis of variance, Welch's, and every comparison by every procedure that suits. */
export function GroupsResults({ groups: given, summary, input }: GroupsResultsProps) {
  const { anova, welch, bounds, comparisons, alpha, control, groups } = summary
  const leading = control === null ? 'tukey' : 'dunnett'
  const computed = comparisons[0]?.adjusted.map((one) => one.procedure) ?? []
  const others = computed.filter((one) => one !== 'lsd' && one !== leading)
  const procedures = [leading, ...others] as const
  const kept = comparisons.filter((one) => decide(one, leading, alpha) === true).length
  const open = comparisons.filter((one) => decide(one, leading, alpha) === null).length
  // One digit more than the means are printed with.
  const digits = Math.min(6, 1 + Math.max(0, ...given.map((one) => one.meanDecimals ?? 2)))
  const percent = Number((100 * summary.confidence).toPrecision(4))
  return (
    <div className="flex min-w-0 flex-col gap-6">
      <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
        <p className="max-w-[62ch] font-serif text-lg">
          {procedureTable[leading].label} at α = {alpha} keeps{' '}
          <strong className="font-semibold">
            {kept} of {count(comparisons.length, 'comparison')}
          </strong>{' '}
          {control === null ? `between ${groups.length} groups` : `with ${control}`} as significant
          {open > 0 && <>; {open} cannot be decided at the printed precision</>}.
        </p>
        <Toolbar
          input={input}
          writeCsv={() => writeSummaryCsv(summary)}
          writeR={() => writeSummaryScript(given, summary)}
        />
      </div>
      <dl className="tabular grid grid-cols-[max-content_minmax(0,1fr)] gap-x-4 gap-y-1.5">
        <dt className="text-ink-soft">Equal variances</dt>
        <dd>
          <ValueText
            name="F"
            df={`${anova.between.df}, ${anova.within.df}`}
            value={formatComputed(anova.f, 3)}
          />
          {bounds && <Range of={bounds.f} />}, <P value={anova.p} bounds={bounds?.p ?? null} />; η² ={' '}
          {formatComputed(anova.etaSquared, 3)}
        </dd>
        <dt className="text-ink-soft">Welch</dt>
        <dd>
          {welch ? (
            <>
              <ValueText
                name="F"
                df={`${welch.df1}, ${welch.df2.toFixed(2)}`}
                value={formatComputed(welch.f, 3)}
              />
              {bounds?.welch && <Range of={bounds.welch.f} />},{' '}
              <P value={welch.p} bounds={bounds?.welch?.p ?? null} />
            </>
          ) : (
            'not defined where a spread is 0'
          )}
        </dd>
      </dl>
      {groups.length > MOST_FOR_OWN_RANGES && (
        <p className="text-sm text-ink-soft">
          Games–Howell takes a range of its own for every pair and is computed here for up to{' '}
          {MOST_FOR_OWN_RANGES} groups.
        </p>
      )}
      <div className="overflow-x-auto" role="region" aria-label="Comparisons" tabIndex={0}>
        <Table stacks caption="Comparisons between the groups">
          <Thead>
            <tr role="row">
              <Th>Comparison</Th>
              <Th number>Difference</Th>
              <Th number>{percent} % limits</Th>
              <Th number>
                <span className="normal-case italic">t</span>
              </Th>
              <Th number>
                Raw <i>p</i>
              </Th>
              {procedures.map((procedure) => (
                <Th key={procedure} number className={procedure === leading ? 'text-ink' : undefined}>
                  {shortNameOf(procedure)}
                </Th>
              ))}
              <Th number>
                Welch <i>p</i>
              </Th>
            </tr>
          </Thead>
          <Tbody>
            {comparisons.slice(0, LISTED).map((one) => {
              const limits = one.adjusted.find((each) => each.procedure === leading)?.interval
              return (
                <Tr key={`${one.first} ${one.second}`}>
                  <RowTh className="font-normal whitespace-nowrap">
                    {one.second} – {one.first}
                  </RowTh>
                  <Td number label="Difference">
                    {formatComputed(one.difference, digits)}
                  </Td>
                  <Td number label={`${percent} % limits`}>
                    {limits
                      ? `${formatComputed(limits.low, digits)} to ${formatComputed(limits.high, digits)}`
                      : '–'}
                  </Td>
                  <Td number label="t">
                    {formatComputed(one.pooled.t, 3)}
                  </Td>
                  <Td number label="Raw p">
                    {showP(one.pooled.p, one.bounds?.pooled.p ?? null)}
                  </Td>
                  {procedures.map((procedure) => (
                    <Td key={procedure} number label={shortNameOf(procedure)}>
                      <Cell comparison={one} procedure={procedure} alpha={alpha} />
                    </Td>
                  ))}
                  <Td number label="Welch p">
                    {one.welch ? showP(one.welch.p, one.bounds?.welch?.p ?? null) : '–'}
                  </Td>
                </Tr>
              )
            })}
          </Tbody>
        </Table>
      </div>
      <p className="text-xs text-ink-soft">
        Limits of the difference hold jointly, by {procedureTable[leading].label}. Where two numbers stand,
        the printed precision leaves all between them possible. Independent groups, normal observations;{' '}
        {comparisons.length > LISTED && `the first ${LISTED} comparisons, the CSV holds all; `}
        Welch and Games–Howell let the variances differ.
      </p>
    </div>
  )
}

type ProcedureOf = SummaryComparison['adjusted'][number]['procedure']

/** The interval of an adjusted p-value: over the rounding where it is known, else the value itself. */
function intervalOf(comparison: SummaryComparison, procedure: ProcedureOf): Interval | null {
  const p = comparison.adjusted.find((one) => one.procedure === procedure)?.p ?? null
  const bounds = comparison.bounds?.adjusted.find((one) => one.procedure === procedure)?.p ?? null
  return bounds ?? (p === null ? null : { low: p, high: p })
}

function decide(comparison: SummaryComparison, procedure: ProcedureOf, alpha: number): boolean | null {
  const interval = intervalOf(comparison, procedure)
  return interval && isSignificant(interval, alpha)
}

function Cell(props: { comparison: SummaryComparison; procedure: ProcedureOf; alpha: number }) {
  const { comparison, procedure, alpha } = props
  const interval = intervalOf(comparison, procedure)
  if (!interval) return <>–</>
  const raw = comparison.bounds?.pooled.p ?? { low: comparison.pooled.p, high: comparison.pooled.p }
  const standing = standOf(raw, isSignificant(interval, alpha), alpha)
  const outcome = outcomeOf(standing)
  return (
    <span className="inline-flex items-center justify-end gap-1.5">
      {recomputedInterval([interval.low, interval.high], 3)}
      {outcome ? <OutcomeShape outcome={outcome} /> : <span className="size-3.5" />}
      <span className="sr-only">{wordsOf(standing)}</span>
    </span>
  )
}

const showP = (value: number, bounds: Interval | null) =>
  recomputedInterval(bounds ? [bounds.low, bounds.high] : [value, value], 3)

function P({ value, bounds }: { value: number; bounds: Interval | null }) {
  return <ValueText name="p" value={showP(value, bounds)} />
}

function Range({ of }: { of: Interval }) {
  return (
    <span className="text-ink-soft">
      {' '}
      ({formatComputed(of.low, 3)} to {formatComputed(of.high, 3)})
    </span>
  )
}
