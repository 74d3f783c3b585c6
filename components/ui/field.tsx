'use client'

import { createContext, useContext, useId, type ComponentProps, type ReactNode } from 'react'
import { classes } from './classes'

type FieldIds = { id: string; describedBy: string | undefined; invalid: boolean; required: boolean }

const FieldContext = createContext<FieldIds | null>(null)

type FieldProps = {
  label: ReactNode
  /** One sentence that helps to fill it in; stays visible. */
  hint?: ReactNode
  /** What is wrong and what to do. */
  error?: string | undefined
  required?: boolean
  /** Shown after the label where most fields of the form are required. */
  optional?: boolean
  className?: string
  /** One Input, Textarea or Select: it takes its id, description and state from here. */
  children: ReactNode
}

/** A label, a control, its hint and its error, tied together for the screen reader. */
export function Field({ label, hint, error, required = false, optional, className, children }: FieldProps) {
  const id = useId()
  const described = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ')
  return (
    <div className={classes('flex flex-col gap-1', className)}>
      <label htmlFor={id} className="font-medium">
        {label}
        {optional ? <span className="font-normal text-ink-soft"> (optional)</span> : null}
      </label>
      <FieldContext value={{ id, describedBy: described || undefined, invalid: Boolean(error), required }}>
        {children}
      </FieldContext>
      {hint ? (
        <p id={`${id}-hint`} className="text-xs text-ink-soft">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={`${id}-error`} className="text-sm text-fails">
          {error}
        </p>
      ) : null}
    </div>
  )
}

function useFieldProps() {
  const field = useContext(FieldContext)
  if (!field) return {}
  return {
    id: field.id,
    'aria-describedby': field.describedBy,
    'aria-invalid': field.invalid || undefined,
    'aria-required': field.required || undefined,
  }
}

const look =
  'w-full rounded-sm border border-edge bg-sheet px-2.5 text-ink placeholder:text-ink-soft hover:border-ink-soft ' +
  'focus-visible:border-tide focus-visible:outline-2 focus-visible:outline-offset-0 focus-visible:outline-tide ' +
  'aria-invalid:border-fails disabled:cursor-not-allowed disabled:bg-sunken disabled:text-ink-soft'

export function Input({ className, type = 'text', ...rest }: ComponentProps<'input'>) {
  return <input type={type} className={classes(look, 'h-9', className)} {...useFieldProps()} {...rest} />
}

export function Textarea({ className, rows = 4, ...rest }: ComponentProps<'textarea'>) {
  return (
    <textarea
      rows={rows}
      className={classes(look, 'py-2 leading-normal', className)}
      {...useFieldProps()}
      {...rest}
    />
  )
}

type SelectProps = Omit<ComponentProps<'select'>, 'children'> & {
  options: readonly { value: string; label: string; disabled?: boolean }[]
  /** First entry with the value '' where nothing need be chosen, such as "Any outcome". */
  empty?: string
}

/** The platform's own list: keyboard, touch and screen reader come with it. `className` sizes the whole control. */
export function Select({ options, empty, className, ...rest }: SelectProps) {
  return (
    <span className={classes('relative block w-full', className)}>
      <select className={classes(look, 'h-9 appearance-none pr-8')} {...useFieldProps()} {...rest}>
        {empty === undefined ? null : <option value="">{empty}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
      </select>
      <svg
        viewBox="0 0 12 12"
        aria-hidden="true"
        className="pointer-events-none absolute top-1/2 right-2.5 size-3 -translate-y-1/2 fill-none stroke-ink-soft"
      >
        <path d="M2 4.5 6 8.5l4-4" strokeWidth="1.4" />
      </svg>
    </span>
  )
}
