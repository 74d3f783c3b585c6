'use client'

import { X } from 'lucide-react'
import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'
import { IconButton } from './icon-button'
import { useFocusReturn } from './use-focus-return'

type SidePanelProps = {
  open: boolean
  onOpenChange: (open: boolean) => void
  title: ReactNode
  description: ReactNode
  /** Links or buttons beside the title. */
  actions?: ReactNode
  children: ReactNode
}

/** A sheet that comes in from the right and takes most of the window. Escape and a press outside close it. */
export function SidePanel({ open, onOpenChange, title, description, actions, children }: SidePanelProps) {
  const focusReturn = useFocusReturn()
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink/25 dark:bg-paper/70" />
        <Radix.Content
          {...focusReturn}
          className="fixed inset-y-0 right-0 z-50 flex w-full max-w-[72rem] flex-col border-l border-rule bg-paper shadow-sheet focus:outline-none"
        >
          <div className="flex items-start justify-between gap-4 border-b border-rule px-4 pt-4 pb-3 sm:px-6">
            <div className="min-w-0">
              <Radix.Title className="text-lg font-semibold">{title}</Radix.Title>
              <Radix.Description className="mt-0.5 text-ink-soft">{description}</Radix.Description>
            </div>
            <div className="flex shrink-0 items-center gap-2">
              {actions}
              <Radix.Close asChild>
                <IconButton label="Close">
                  <X />
                </IconButton>
              </Radix.Close>
            </div>
          </div>
          <div className="min-h-0 flex-1 overflow-y-auto px-4 py-5 sm:px-6">{children}</div>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
