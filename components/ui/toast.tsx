'use client'

import { Toaster as Sonner } from 'sonner'

export { toast } from 'sonner'

/** Where short confirmations appear; mounted once, in the root layout. */
export function Toaster() {
  return (
    <Sonner
      position="bottom-right"
      toastOptions={{
        unstyled: true,
        classNames: {
          toast:
            'flex w-full items-center gap-3 rounded-md font-sans border border-rule bg-sheet px-4 py-3 text-sm text-ink shadow-sheet sm:w-[22rem]',
          error: 'border-l-3 border-l-fails',
          success: 'border-l-3 border-l-holds',
          icon: 'hidden',
          actionButton: 'ml-auto text-tide font-medium',
        },
      }}
    />
  )
}
