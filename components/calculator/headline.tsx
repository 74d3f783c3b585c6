import { procedureTable } from '@/lib/checks/procedures/table'
import type { Adjusted, Calculation } from '@/lib/checks/calculate/calculate'
import { isSignificant } from '@/lib/checks/families/decide'
import { capitalise } from './short-names'
import { count } from './work-out'

type HeadlineProps = { calculation: Calculation; main: Adjusted; alpha: number }

/** The answer in one or two sentences. */
export function Headline({ calculation, main, alpha }: HeadlineProps) {
  const { raw, m } = calculation
  const alone = raw.filter((one) => isSignificant(one, alpha) !== false).length
  const kept = main.significant.filter((one) => one === true).length
  const open = main.significant.filter((one) => one === null).length
  const lost = raw.filter(
    (one, i) => isSignificant(one, alpha) !== false && main.significant[i] === false,
  ).length
  const name = capitalise(procedureTable[main.procedure].label)
  return (
    <div role="status" className="max-w-[62ch]">
      <p className="font-serif text-lg">
        {name} at α = {alpha} and <i>m</i> = {m.toLocaleString('en')} keeps{' '}
        <strong className="font-semibold">
          {kept.toLocaleString('en')} of {count(raw.length, 'test')}
        </strong>{' '}
        as significant
        {open > 0 && <>; {open.toLocaleString('en')} cannot be decided at the printed precision</>}.
      </p>
      <p className="mt-1 text-ink-soft">
        {alone.toLocaleString('en')} {alone === 1 ? 'is' : 'are'} at or below α alone
        {lost > 0 ? <>, {lost.toLocaleString('en')} of them no longer after the correction.</> : '.'}
        {main.level !== alpha && (
          <> The adjusted values are held against {Number(main.level.toPrecision(4))}.</>
        )}
      </p>
    </div>
  )
}
