'use client'

import Link from 'next/link'
import { DropdownMenu as Radix } from 'radix-ui'
import type { ReactElement, ReactNode } from 'react'
import { classes } from './classes'

export type MenuItem = {
  label: ReactNode
  disabled?: boolean
  danger?: boolean
} & ({ onSelect: () => void; href?: never } | { href: string; onSelect?: never })

type MenuProps = {
  /** A Button or IconButton. */
  trigger: ReactElement
  items: readonly MenuItem[]
  align?: 'start' | 'end'
}

/** A list of things to do that opens from a button. */
export function Menu({ trigger, items, align = 'end' }: MenuProps) {
  return (
    <Radix.Root modal={false}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          align={align}
          sideOffset={4}
          className="z-50 min-w-44 rounded-md border border-rule bg-sheet py-1 shadow-sheet"
        >
          {items.map((item, index) => (
            <Radix.Item
              key={index}
              disabled={item.disabled}
              onSelect={item.onSelect}
              asChild={item.href !== undefined}
              className={classes(
                'block w-full cursor-pointer px-3 py-1.5 outline-none data-highlighted:bg-tide-wash data-disabled:cursor-not-allowed data-disabled:text-ink-soft',
                item.danger ? 'text-fails' : null,
              )}
            >
              {item.href === undefined ? item.label : <Link href={item.href}>{item.label}</Link>}
            </Radix.Item>
          ))}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
