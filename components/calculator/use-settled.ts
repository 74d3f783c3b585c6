'use client'

import { useDeferredValue, useEffect, useState } from 'react'

/**
 * The value once it has rested for `pause` milliseconds, so that long computations start when the typing stops; with
 * no pause it follows as soon as the screen has time.
 */
export function useSettled<T>(value: T, pause: number): T {
  const [settled, setSettled] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), pause)
    return () => clearTimeout(timer)
  }, [value, pause])
  const deferred = useDeferredValue(value)
  return pause === 0 ? deferred : settled
}
