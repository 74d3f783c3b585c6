import { Button } from '../ui/button'
import type { SaveState } from './use-autosave'

const words = {
  saved: 'Everything is saved.',
  waiting: 'Not saved yet.',
  saving: 'Saving…',
} as const

export function SaveLine({ state, onRetry }: { state: SaveState; onRetry: () => void }) {
  if (state.status === 'failed') {
    return (
      <div role="alert" className="flex flex-wrap items-center gap-2 text-fails">
        Not saved: {state.reason}
        <Button size="small" onClick={onRetry}>
          Save again
        </Button>
      </div>
    )
  }
  return (
    <p className="text-ink-soft" aria-live="polite">
      {words[state.status]}
    </p>
  )
}
