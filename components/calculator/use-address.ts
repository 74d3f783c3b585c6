'use client'

import { useCallback, useEffect, useRef, useState, useSyncExternalStore } from 'react'
import { decodeInput, encodeInput, LONGEST_LINK, type CalculatorInput } from './calculator-input'

const PAUSE = 300

type Store = { subscribe: (notify: () => void) => () => void; getArrived: () => string }

/**
 * What stands after '#' when the page is opened or such a link is followed. What the page itself writes there is no
 * arrival, so that typing does not start the page anew.
 */
function createStore(): Store {
  let arrived: string | null = null
  return {
    subscribe: (notify) => {
      const take = () => {
        arrived = window.location.hash
        notify()
      }
      window.addEventListener('hashchange', take)
      return () => window.removeEventListener('hashchange', take)
    },
    getArrived: () => (arrived ??= window.location.hash),
  }
}

/** The fragment that the page was opened with; null on the server, which never sees it. */
export function useArrivedFragment(): string | null {
  const [store] = useState(createStore)
  return useSyncExternalStore<string | null>(store.subscribe, store.getArrived, () => null)
}

/**
 * The calculator's input, kept in the address after '#': it is not sent to the server and not logged there. Written
 * after a short pause; an input too long for a link is not written.
 */
export function useLinkedInput(
  arrived: string,
): [CalculatorInput, (change: Partial<CalculatorInput>) => void] {
  const [input, setInput] = useState(() => decodeInput(arrived))
  const written = useRef(arrived.replace(/^#/, ''))
  useEffect(() => {
    const timer = setTimeout(() => {
      const fragment = encodeInput(input)
      if (fragment === written.current) return
      written.current = fragment
      const kept = fragment === '' || fragment.length > LONGEST_LINK ? '' : `#${fragment}`
      window.history.replaceState(null, '', `${window.location.pathname}${window.location.search}${kept}`)
    }, PAUSE)
    return () => clearTimeout(timer)
  }, [input])
  const change = useCallback(
    (part: Partial<CalculatorInput>) => setInput((before) => ({ ...before, ...part })),
    [],
  )
  return [input, change]
}
