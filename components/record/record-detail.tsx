import { Fragment } from 'react'
import { Time } from '../ui/time'

/** Names in the record's detail as people read them; what is not here is named as it is kept. */
const names: Record<string, string> = {
  dueAt: 'due',
  sha256: 'content',
  mediaType: 'type',
  effortMinutes: 'minutes',
}

/** The facts of one line of the record: days as days, hashes by their first digits. */
export function RecordDetail({ detail }: { detail: Readonly<Record<string, unknown>> }) {
  const entries = Object.entries(detail).filter(([, value]) => value !== null && value !== '')
  return (
    <span className="[overflow-wrap:anywhere]">
      {entries.map(([name, value], index) => (
        <Fragment key={name}>
          {index > 0 ? ' · ' : ''}
          {names[name] ?? name}: <DetailValue name={name} value={value} />
        </Fragment>
      ))}
    </span>
  )
}

function DetailValue({ name, value }: { name: string; value: unknown }) {
  if (name.endsWith('At') && typeof value === 'number') return <Time at={value} show="short" />
  if (name === 'sha256') return <span title={String(value)}>{String(value).slice(0, 12)}…</span>
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  return String(value)
}
