import { useId, type ComponentProps, type ReactNode } from 'react'
import { classes } from './classes'

type CheckboxProps = Omit<ComponentProps<'input'>, 'type'> & {
  label: ReactNode
  hint?: ReactNode
  /** Leaves the label to the screen reader, for a row's own box in a table. */
  hideLabel?: boolean
}

export function Checkbox({ label, hint, hideLabel, className, ...rest }: CheckboxProps) {
  const id = useId()
  return (
    <div className={classes('flex items-start gap-2', className)}>
      <input
        id={id}
        type="checkbox"
        aria-describedby={hint ? `${id}-hint` : undefined}
        className="mt-0.5 size-4 shrink-0"
        {...rest}
      />
      <div className={hideLabel ? 'sr-only' : undefined}>
        <label htmlFor={id}>{label}</label>
        {hint ? (
          <p id={`${id}-hint`} className="text-xs text-ink-soft">
            {hint}
          </p>
        ) : null}
      </div>
    </div>
  )
}

type RadioGroupProps<V extends string> = {
  legend: ReactNode
  name: string
  options: readonly { value: V; label: ReactNode; hint?: ReactNode; disabled?: boolean }[]
  /** Controlled with `onChange`, or leave both out and give `defaultValue` for a plain form. */
  value?: V | null
  defaultValue?: V
  onChange?: (value: V) => void
  error?: string | undefined
  /** Side by side instead of one below the other. */
  inline?: boolean
}

export function RadioGroup<V extends string>({
  legend,
  name,
  options,
  value,
  defaultValue,
  onChange,
  error,
  inline,
}: RadioGroupProps<V>) {
  const id = useId()
  const controlled = onChange !== undefined
  return (
    <fieldset aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="mb-1 font-medium">{legend}</legend>
      <div className={inline ? 'flex flex-wrap gap-x-5 gap-y-1' : 'flex flex-col gap-1.5'}>
        {options.map((option) => (
          <label key={option.value} className="flex items-start gap-2">
            <input
              type="radio"
              name={name}
              value={option.value}
              disabled={option.disabled}
              className="mt-0.5 size-4 shrink-0"
              {...(controlled
                ? { checked: value === option.value, onChange: () => onChange(option.value) }
                : { defaultChecked: defaultValue === option.value })}
            />
            <span>
              {option.label}
              {option.hint ? <span className="block text-xs text-ink-soft">{option.hint}</span> : null}
            </span>
          </label>
        ))}
      </div>
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-fails">
          {error}
        </p>
      ) : null}
    </fieldset>
  )
}
