import { Field, Input } from '../ui/field'
import type { CalculatorInput } from './calculator-input'

type LevelFieldProps = {
  input: CalculatorInput
  error: string | undefined
  onChange: (part: Partial<CalculatorInput>) => void
}

export function LevelField({ input, error, onChange }: LevelFieldProps) {
  return (
    <Field label="Level α" error={error}>
      <Input
        inputMode="decimal"
        value={input.alpha}
        onChange={(event) => onChange({ alpha: event.target.value })}
      />
    </Field>
  )
}
