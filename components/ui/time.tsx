'use client'

import { useSyncExternalStore } from 'react'
import { formatTime, type TimeShow } from './format-time'

const subscribe = () => () => {}

/** The viewer's time zone; UTC while the server renders. */
export function useZone(): string {
  return useSyncExternalStore(
    subscribe,
    () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    () => 'UTC',
  )
}

/** A moment (milliseconds UTC) in the viewer's zone. `show`: date (default), due (with its weekday), moment, short. */
export function Time({ at, show = 'date', className }: { at: number; show?: TimeShow; className?: string }) {
  const zone = useZone()
  return (
    <time
      dateTime={new Date(at).toISOString()}
      title={show === 'moment' ? undefined : formatTime(at, 'moment', zone)}
      className={className}
    >
      {formatTime(at, show, zone)}
    </time>
  )
}
