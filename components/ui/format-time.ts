/**
 * How much of a moment is told. `date`: 1 December 2026; `due`: Tuesday 1 December 2026; `moment`: 1 December
 * 2026, 14:05; `short` and `due-short`: 1 Dec 2026 and Tue 1 Dec 2026, for narrow columns.
 */
export type TimeShow = 'date' | 'due' | 'moment' | 'short' | 'due-short'

const shapes: Record<TimeShow, Intl.DateTimeFormatOptions> = {
  date: { day: 'numeric', month: 'long', year: 'numeric' },
  due: { weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' },
  moment: { day: 'numeric', month: 'long', year: 'numeric', hour: '2-digit', minute: '2-digit' },
  short: { day: 'numeric', month: 'short', year: 'numeric' },
  'due-short': { weekday: 'short', day: 'numeric', month: 'short', year: 'numeric' },
}

/** Integer milliseconds UTC as words, in `zone`. Parts are put together here, so that no locale's comma intrudes. */
export function formatTime(at: number, show: TimeShow, zone: string): string {
  const parts = new Map(
    new Intl.DateTimeFormat('en-GB', { ...shapes[show], hourCycle: 'h23', timeZone: zone })
      .formatToParts(at)
      .map((part) => [part.type, part.value]),
  )
  const day = [parts.get('weekday'), parts.get('day'), parts.get('month'), parts.get('year')]
  const clock = parts.has('hour') ? `, ${parts.get('hour')}:${parts.get('minute')}` : ''
  return day.filter(Boolean).join(' ') + clock
}

/** `2026-12-01` of a moment in `zone`, as a date field wants it. */
export function toDateField(at: number, zone: string): string {
  return new Intl.DateTimeFormat('en-CA', { timeZone: zone }).format(at)
}

/** The end of the day that a date field names, in the local zone; null when it names none. */
export function fromDateField(value: string): number | null {
  // '2026-12-01'
  if (!/^\d{4}-\d{2}-\d{2}$/.test(value)) return null
  const at = new Date(`${value}T23:59:59`).getTime()
  return Number.isNaN(at) ? null : at
}
