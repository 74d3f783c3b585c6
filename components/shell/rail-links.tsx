'use client'

import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { useEffect, useRef } from 'react'
import { classes } from '../ui/classes'

export type RailLink = { href: string; label: string }

/** A ruled line with the screens beside it; a dot stands on the line at the one that is open. */
export function RailLinks({ links }: { links: readonly RailLink[] }) {
  const path = usePathname()
  const nav = useRef<HTMLElement>(null)
  useEffect(() => {
    nav.current?.closest('details')?.removeAttribute('open')
  }, [path])
  return (
    <nav ref={nav} aria-label="Screens">
      <ul className="border-l border-rule">
        {links.map((link) => {
          const open = path === link.href || path.startsWith(`${link.href}/`)
          const held = open || (link.href === '/docket' && path.startsWith('/manuscripts/'))
          return (
            <li key={link.href} className="relative">
              {held ? (
                <span
                  aria-hidden="true"
                  className="absolute top-1/2 -left-[4.5px] size-2 -translate-y-1/2 rounded-full bg-tide"
                />
              ) : null}
              <Link
                href={link.href}
                aria-current={open ? 'page' : undefined}
                className={classes(
                  'block py-1 pl-4 hover:text-tide',
                  held ? 'font-semibold text-ink' : 'text-ink-soft',
                )}
              >
                {link.label}
              </Link>
            </li>
          )
        })}
      </ul>
    </nav>
  )
}
