import { createContext, useContext } from 'react'
import type { AuditIndex, Target } from './audit-index'

/** What every part of the bench shares: the audit, what is chosen, and how to choose or show something. */
export type BenchState = {
  manuscriptId: string
  /** The round whose audit is shown. */
  round: number
  index: AuditIndex
  /** Whether the viewer decides points, and whether they see what was decided. */
  mayDecide: boolean
  seesPoints: boolean
  chosen: Target | null
  /** Marks it in the lists and on the page, and scrolls the page to it. */
  show: (target: Target) => void
  /** Opens the comments with this as their subject; null for the whole manuscript. */
  comment: ((target: Target | null) => void) | null
}

export const BenchContext = createContext<BenchState | null>(null)

export function useBench(): BenchState {
  const state = useContext(BenchContext)
  if (!state) throw new Error('Parts of the bench stand inside a BenchContext.')
  return state
}
