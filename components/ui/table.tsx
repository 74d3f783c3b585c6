import type { ComponentProps, ReactNode } from 'react'
import { classes } from './classes'

type TableProps = {
  /** Names the table; seen only by the screen reader unless `showCaption`. */
  caption: ReactNode
  showCaption?: boolean
  /** Rows become small sheets below 768 px; give cells a `label` then. */
  stacks?: boolean
  children: ReactNode
  className?: string
}

/** A ruled table. Its head stays in sight while the page scrolls. */
export function Table({ caption, showCaption, stacks, children, className }: TableProps) {
  return (
    <table
      role="table"
      className={classes('tabular w-full border-collapse text-left text-sm', stacks && 'stacks', className)}
    >
      <caption className={showCaption ? 'pb-2 text-left text-ink-soft' : 'sr-only'}>{caption}</caption>
      {children}
    </table>
  )
}

export function Thead({ children }: { children: ReactNode }) {
  return (
    <thead role="rowgroup" className="sticky top-0 z-10 bg-paper">
      {children}
    </thead>
  )
}

export function Tbody({ children }: { children: ReactNode }) {
  return <tbody role="rowgroup">{children}</tbody>
}

/** `opens`: the row holds a RowLink, so all of it can be pressed. */
export function Tr({
  opens,
  selected,
  className,
  ...rest
}: ComponentProps<'tr'> & { opens?: boolean; selected?: boolean }) {
  return (
    <tr
      role="row"
      aria-selected={selected}
      className={classes(
        'relative h-9 border-b border-rule',
        opens && 'hover:bg-tide-wash/60',
        selected && 'bg-tide-wash',
        className,
      )}
      {...rest}
    />
  )
}

export type SortDirection = 'ascending' | 'descending'

type ThProps = {
  children?: ReactNode
  /** Right-aligned, for a column of numbers. */
  number?: boolean
  /** Present on a column that sorts: its direction now, or null. */
  sort?: SortDirection | null
  onSort?: () => void
  className?: string
}

export function Th({ children, number, sort, onSort, className }: ThProps) {
  return (
    <th
      role="columnheader"
      scope="col"
      aria-sort={onSort ? (sort ?? 'none') : undefined}
      className={classes(
        'h-9 border-b border-edge px-2 text-xs font-semibold whitespace-nowrap text-ink-soft',
        number && 'text-right',
        className,
      )}
    >
      {onSort ? (
        <button type="button" onClick={onSort} className="inline-flex items-center gap-1 hover:text-tide">
          {children}
          <SortSign direction={sort ?? null} />
        </button>
      ) : (
        children
      )}
    </th>
  )
}

/** Rising or falling steps, as in the mark; both faint where the column does not sort now. */
function SortSign({ direction }: { direction: SortDirection | null }) {
  const steps = direction === 'descending' ? 'M1 2h3v3h3v3h3' : 'M1 8h3V5h3V2h3'
  return (
    <svg viewBox="0 0 11 10" className="h-2.5 w-3" aria-hidden="true">
      <path
        d={steps}
        fill="none"
        strokeWidth="1.5"
        className={direction ? 'stroke-tide' : 'stroke-edge/60'}
      />
    </svg>
  )
}

/** `label` names the cell where the rows are stacked. `number`: right-aligned, tabular. */
export function Td({
  label,
  number,
  className,
  ...rest
}: ComponentProps<'td'> & { label?: string; number?: boolean }) {
  return (
    <td
      role="cell"
      data-label={label}
      className={classes('px-2 py-1.5 align-middle', number && 'text-right whitespace-nowrap', className)}
      {...rest}
    />
  )
}

/** The cell that names its row. */
export function RowTh({ className, ...rest }: ComponentProps<'th'>) {
  return (
    <th
      role="rowheader"
      scope="row"
      className={classes('px-2 py-1.5 text-left align-middle', className ?? 'font-normal')}
      {...rest}
    />
  )
}
