import Link from 'next/link'
import type { ComponentProps, ReactNode } from 'react'
import { classes } from './classes'

/** `primary`: the one thing a screen is for. `plain`: everything else. `quiet`: in a row or a text. `danger`: cannot be undone. */
export type ButtonVariant = 'primary' | 'plain' | 'quiet' | 'danger'

type Look = {
  variant?: ButtonVariant
  /** `small` for rows and toolbars. */
  size?: 'normal' | 'small'
}

const variants: Record<ButtonVariant, string> = {
  primary: 'border-tide bg-tide text-on-tide hover:border-tide-deep hover:bg-tide-deep',
  plain: 'border-edge bg-sheet text-ink hover:border-tide hover:text-tide',
  quiet: 'border-transparent text-tide hover:bg-tide-wash',
  danger: 'border-fails bg-sheet text-fails hover:bg-fails-wash',
}

export function buttonLook({ variant = 'plain', size = 'normal' }: Look): string {
  return classes(
    'inline-flex items-center justify-center gap-1.5 rounded-sm border font-medium whitespace-nowrap transition-colors',
    'disabled:cursor-not-allowed disabled:border-rule disabled:bg-sunken disabled:text-ink-soft',
    'aria-disabled:cursor-progress aria-disabled:opacity-80',
    size === 'small' ? 'h-7 px-2 text-sm' : 'h-9 px-3.5 text-sm',
    variants[variant],
  )
}

/** A button. `busy` names what is under way ("Assigning…") and refuses a second press while it lasts. */
export function Button({
  variant,
  size,
  busy,
  children,
  className,
  onClick,
  type = 'button',
  ...rest
}: ComponentProps<'button'> & Look & { busy?: string | false }) {
  return (
    <button
      type={type}
      className={classes(buttonLook({ variant, size }), className)}
      aria-disabled={busy ? true : undefined}
      onClick={busy ? (event) => event.preventDefault() : onClick}
      {...rest}
    >
      {busy ? <span aria-live="polite">{busy}</span> : children}
    </button>
  )
}

/** A link that looks like a button: it goes somewhere, it does nothing. */
export function ButtonLink({
  variant,
  size,
  className,
  ...rest
}: ComponentProps<typeof Link> & Look & { children: ReactNode }) {
  return <Link className={classes(buttonLook({ variant, size }), className)} {...rest} />
}
