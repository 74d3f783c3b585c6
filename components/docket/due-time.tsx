'use client'

import { useSyncExternalStore } from 'react'
import { Time } from '../ui/time'

const subscribe = (onChange: () => void) => {
  const timer = setInterval(onChange, 60_000)
  return () => clearInterval(timer)
}
// To the minute, so that two reads in one rendering agree.
const readMinute = () => Math.floor(Date.now() / 60_000) * 60_000

/** A due date with its weekday; says in a word when it has passed. The clock is the viewer's. */
export function DueTime({ at }: { at: number }) {
  const now = useSyncExternalStore(subscribe, readMinute, () => 0)
  const overdue = now > at
  return (
    <span className={overdue ? 'text-fails' : undefined}>
      <Time at={at} show="due-short" />
      {overdue ? <span className="ml-1.5 text-xs font-semibold">overdue</span> : null}
    </span>
  )
}
