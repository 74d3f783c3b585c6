import { Button } from '../ui/button'

type SaveNamingProps = {
  asksAudit: boolean
  changed: boolean
  pending: boolean
  anyNamed: boolean
  onSave: () => void
  onClear: () => void
}

/** Saving what was named: by a button where an audit follows, else what is said is that it is kept. */
export function SaveNaming({ asksAudit, changed, pending, anyNamed, onSave, onClear }: SaveNamingProps) {
  return (
    <div className="flex flex-wrap items-center gap-3">
      {asksAudit ? (
        <Button variant="primary" disabled={!changed} busy={pending && 'Saving…'} onClick={onSave}>
          Save and audit again
        </Button>
      ) : null}
      {anyNamed ? (
        <Button variant="quiet" disabled={pending} onClick={onClear}>
          Read all columns as found
        </Button>
      ) : null}
      <span aria-live="polite" className="text-xs text-ink-soft">
        {asksAudit
          ? changed
            ? 'Shown as it would be read; not saved yet.'
            : ''
          : pending || changed
            ? 'Saving…'
            : anyNamed
              ? 'What you named is saved.'
              : ''}
      </span>
    </div>
  )
}
