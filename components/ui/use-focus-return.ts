'use client'

import { useRef } from 'react'

/**
 * For a dialog without a trigger of its own: keeps what had the focus when it opened and gives it back when it closes.
 */
export function useFocusReturn(): { onOpenAutoFocus: () => void; onCloseAutoFocus: () => void } {
  const from = useRef<HTMLElement | null>(null)
  return {
    onOpenAutoFocus: () => {
      from.current = document.activeElement instanceof HTMLElement ? document.activeElement : null
    },
    onCloseAutoFocus: () => from.current?.focus(),
  }
}
