import type { Procedure } from '@/lib/checks/vocabulary'
import { Checkbox } from '../ui/choice'
import type { ProcedureOption } from './list-procedures'

type ProcedureChoiceProps = {
  options: readonly ProcedureOption[]
  value: readonly Procedure[]
  onChange: (value: Procedure[]) => void
  error?: string | undefined
}

const groups = [
  { controls: 'fwer', title: 'control the family-wise error rate' },
  { controls: 'fdr', title: 'control the false discovery rate' },
  { controls: 'none', title: 'control neither for every number of groups' },
] as const

/** The procedures that the house accepts, by what they control. */
export function ProcedureChoice({ options, value, onChange, error }: ProcedureChoiceProps) {
  const toggle = (procedure: Procedure, accepted: boolean) =>
    onChange(accepted ? [...value, procedure] : value.filter((other) => other !== procedure))
  return (
    <fieldset aria-describedby={error ? 'accepted-error' : undefined}>
      <legend className="mb-1 font-medium">Accepted procedures</legend>
      <div className="flex flex-col gap-3">
        {groups.map((group) => (
          <div key={group.controls} role="group" aria-label={`They ${group.title}`}>
            <p className="mb-1 text-xs text-ink-soft" aria-hidden="true">
              They {group.title}
            </p>
            <div className="grid gap-x-4 gap-y-1 sm:grid-cols-2">
              {options
                .filter((option) => option.controls === group.controls)
                .map(({ procedure, label, source }) => (
                  <Checkbox
                    key={procedure}
                    label={
                      <>
                        {label} <span className="text-xs text-ink-soft">{source}</span>
                      </>
                    }
                    checked={value.includes(procedure)}
                    onChange={(event) => toggle(procedure, event.target.checked)}
                  />
                ))}
            </div>
          </div>
        ))}
      </div>
      {error ? (
        <p id="accepted-error" className="mt-1 text-fails">
          {error}
        </p>
      ) : null}
    </fieldset>
  )
}
