import type { ReactNode } from 'react'
import { EntryFrame } from '@/components/entry/entry-frame'
import { getSettings } from '@/lib/settings'

export default function EntryLayout({ children }: { children: ReactNode }) {
  return <EntryFrame house={getSettings().house}>{children}</EntryFrame>
}
