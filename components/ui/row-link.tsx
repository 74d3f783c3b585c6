import Link from 'next/link'
import type { ComponentProps } from 'react'
import { classes } from './classes'

/** The link that a whole row of a table opens. Other controls of the row need `relative z-1`. */
export function RowLink({ className, ...rest }: ComponentProps<typeof Link>) {
  return <Link className={classes('row-link', className)} {...rest} />
}
