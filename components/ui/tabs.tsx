'use client'

import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { Tabs as Radix } from 'radix-ui'
import type { ReactNode } from 'react'

const tab =
  '-mb-px inline-flex h-9 items-center gap-1.5 border-b-2 border-transparent px-1 whitespace-nowrap text-ink-soft hover:text-ink ' +
  'data-[state=active]:border-tide data-[state=active]:font-medium data-[state=active]:text-ink ' +
  'aria-[current=page]:border-tide aria-[current=page]:font-medium aria-[current=page]:text-ink'
const bar = 'flex gap-5 overflow-x-auto border-b border-rule'

type TabsProps = {
  /** Names the set for the screen reader. */
  label: string
  items: readonly { value: string; label: ReactNode; content: ReactNode }[]
  value?: string
  defaultValue?: string
  onValueChange?: (value: string) => void
}

/** Panes of one screen. Panes that are not shown are not mounted. */
export function Tabs({ label, items, ...state }: TabsProps) {
  const first = items[0]?.value
  return (
    <Radix.Root {...(state.value === undefined ? { defaultValue: first } : {})} {...state}>
      <Radix.List aria-label={label} className={bar}>
        {items.map((item) => (
          <Radix.Trigger key={item.value} value={item.value} className={tab}>
            {item.label}
          </Radix.Trigger>
        ))}
      </Radix.List>
      {items.map((item) => (
        <Radix.Content key={item.value} value={item.value} className="pt-4">
          {item.content}
        </Radix.Content>
      ))}
    </Radix.Root>
  )
}

/** Screens that belong together, each with its own address; looks like Tabs and is a navigation. */
export function LinkTabs({
  label,
  items,
}: {
  label: string
  items: readonly { href: string; label: ReactNode }[]
}) {
  const path = usePathname()
  return (
    <nav aria-label={label} className={bar}>
      {items.map((item) => (
        <Link
          key={item.href}
          href={item.href}
          className={tab}
          aria-current={path === item.href ? 'page' : undefined}
        >
          {item.label}
        </Link>
      ))}
    </nav>
  )
}
