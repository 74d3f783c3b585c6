import type { ComponentProps, ReactNode } from 'react'
import { classes } from './classes'

/** A square button that shows an icon only; `label` is its name, for the screen reader and as a tooltip. */
export function IconButton({
  label,
  children,
  className,
  type = 'button',
  ...rest
}: ComponentProps<'button'> & { label: string; children: ReactNode }) {
  return (
    <button
      type={type}
      aria-label={label}
      title={label}
      className={classes(
        'inline-flex size-8 shrink-0 items-center justify-center rounded-sm text-ink-soft transition-colors',
        'hover:bg-tide-wash hover:text-tide disabled:cursor-not-allowed disabled:text-edge disabled:hover:bg-transparent',
        '[&_svg]:size-4',
        className,
      )}
      {...rest}
    >
      {children}
    </button>
  )
}
