import { useEffect, useRef } from 'react'
import { isTyping } from '../ui/key-help'

/** Calls what belongs to a pressed key, unless someone types, a dialog is open or a control wants the key. */
export function useBenchKeys(keys: Readonly<Record<string, () => void>>): void {
  const held = useRef(keys)
  useEffect(() => {
    held.current = keys
  }, [keys])
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return
      if (isTyping(event.target) || document.querySelector('[role="dialog"]')) return
      if (event.key === 'Enter' && isControl(event.target)) return
      const act = held.current[event.key]
      if (!act) return
      event.preventDefault()
      act()
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
}

function isControl(target: EventTarget | null): boolean {
  return (
    target instanceof Element && target.closest('a, button, summary, [role="button"], [role="tab"]') !== null
  )
}
