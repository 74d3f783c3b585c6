'use client'

import { useEffect, useState } from 'react'
import { Button } from './button'
import { Dialog } from './dialog'

export type KeyNote = { keys: readonly string[]; does: string }

/** True where a key press is meant for a control, so that a screen's keys must not take it. */
export function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))
  )
}

/** The keys of a screen: opens on `?` and from its button. */
export function KeyHelp({ keys }: { keys: readonly KeyNote[] }) {
  const [open, setOpen] = useState(false)
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key === '?' && !isTyping(event.target)) {
        event.preventDefault()
        setOpen(true)
      }
    }
    window.addEventListener('keydown', onKey)
    return () => window.removeEventListener('keydown', onKey)
  }, [])
  return (
    <>
      <Button size="small" variant="quiet" onClick={() => setOpen(true)} aria-keyshortcuts="?">
        Keys <Key>?</Key>
      </Button>
      <Dialog open={open} onOpenChange={setOpen} title="Keys of this screen">
        <dl className="grid grid-cols-[auto_1fr] items-baseline gap-x-5 gap-y-2">
          {[...keys, { keys: ['?'], does: 'Show this list' }].map((note) => (
            <div key={note.does} className="contents">
              <dt className="flex gap-1">
                {note.keys.map((key) => (
                  <Key key={key}>{key}</Key>
                ))}
              </dt>
              <dd>{note.does}</dd>
            </div>
          ))}
        </dl>
      </Dialog>
    </>
  )
}

export function Key({ children }: { children: string }) {
  return (
    <kbd className="inline-flex h-5 min-w-5 items-center justify-center rounded-sm border border-edge bg-sheet px-1 font-mono text-xs text-ink">
      {children}
    </kbd>
  )
}
