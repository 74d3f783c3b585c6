import type { RefObject } from 'react'
import type { Target } from './audit-index'
import type { AuditTab } from './audit-pane'

/** Scrolls the audit to a target's row, once the list that holds it is drawn. */
export function showInList(pane: RefObject<HTMLElement | null>, target: Target, tab: AuditTab): void {
  const name = tab === 'numbers' ? `number-${target.kind}-${target.id}` : `${target.kind}-${target.id}`
  requestAnimationFrame(() =>
    requestAnimationFrame(() => {
      const row = [...(pane.current?.querySelectorAll<HTMLElement>('[data-target]') ?? [])].find(
        (one) => one.dataset.target === name,
      )
      row?.scrollIntoView({ block: 'nearest' })
    }),
  )
}
