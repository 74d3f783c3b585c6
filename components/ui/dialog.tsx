'use client'

import { X } from 'lucide-react'
import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'
import { classes } from './classes'
import { IconButton } from './icon-button'
import { useFocusReturn } from './use-focus-return'

type DialogProps = {
  open: boolean
  onOpenChange: (open: boolean) => void
  title: ReactNode
  /** One sentence under the title. */
  description?: ReactNode
  children?: ReactNode
  /** Buttons at the foot, the main one last. */
  footer?: ReactNode
  wide?: boolean
}

/** A sheet above the page. Escape and a press outside close it; the focus goes back to where it came from. */
export function Dialog({ open, onOpenChange, title, description, children, footer, wide }: DialogProps) {
  const focusReturn = useFocusReturn()
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink/25 dark:bg-paper/70" />
        <Radix.Content
          {...focusReturn}
          className={classes(
            'fixed top-[8dvh] left-1/2 z-50 flex max-h-[84dvh] w-[calc(100vw-2rem)] -translate-x-1/2 flex-col',
            'rounded-md border border-rule bg-sheet shadow-sheet focus:outline-none',
            wide ? 'max-w-3xl' : 'max-w-lg',
          )}
          {...(description ? {} : { 'aria-describedby': undefined })}
        >
          <div className="flex items-start justify-between gap-4 border-b border-rule px-5 pt-4 pb-3">
            <div>
              <Radix.Title className="text-lg font-semibold">{title}</Radix.Title>
              {description ? (
                <Radix.Description className="mt-0.5 text-ink-soft">{description}</Radix.Description>
              ) : null}
            </div>
            <Radix.Close asChild>
              <IconButton label="Close" className="-mt-0.5 -mr-2">
                <X />
              </IconButton>
            </Radix.Close>
          </div>
          {children ? <div className="overflow-y-auto px-5 py-4">{children}</div> : null}
          {footer ? (
            <div className="flex flex-wrap justify-end gap-2 border-t border-rule px-5 py-3">{footer}</div>
          ) : null}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
