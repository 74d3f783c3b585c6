import type { FileView, ManuscriptView } from '@/db/queries/manuscript'

/** The results table of the round that is judged, where the viewer may open files; else null. */
export function findTable({ actions, rounds, round }: ManuscriptView): FileView | null {
  if (!actions.includes('readFiles')) return null
  const files = rounds.find(({ number }) => number === round)?.files ?? []
  return files.findLast(({ kind, replacedAt }) => kind === 'table' && replacedAt === null) ?? null
}
