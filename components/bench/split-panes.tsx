'use client'

import { useRef, useState, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react'
import { classes } from '../ui/classes'

type SplitPanesProps = {
  left: ReactNode
  right: ReactNode
  leftName: string
  rightName: string
  /** Which pane is shown where there is room for one only. */
  shown: 'left' | 'right'
  onShown: (pane: 'left' | 'right') => void
}

const LEAST = 25
const MOST = 75

/** Two panes side by side with a movable border from 1,024 px; one of them at a time below that. */
export function SplitPanes({ left, right, leftName, rightName, shown, onShown }: SplitPanesProps) {
  const frame = useRef<HTMLDivElement>(null)
  const [share, setShare] = useState(42)
  const drag = (event: PointerEvent<HTMLDivElement>) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId) || !frame.current) return
    const { left: from, width } = frame.current.getBoundingClientRect()
    setShare(clamp(((event.clientX - from) / width) * 100))
  }
  const onKey = (event: KeyboardEvent) => {
    const step = { ArrowLeft: -2, ArrowRight: 2, Home: -100, End: 100 }[event.key]
    if (step === undefined) return
    event.preventDefault()
    setShare(clamp(share + step))
  }
  return (
    <div className="flex min-h-0 flex-1 flex-col print:block">
      <div
        className="flex shrink-0 border-b border-rule lg:hidden print:hidden"
        role="group"
        aria-label="Pane"
      >
        {(['left', 'right'] as const).map((pane) => (
          <button
            key={pane}
            type="button"
            aria-pressed={shown === pane}
            onClick={() => onShown(pane)}
            className={classes(
              'h-10 flex-1 border-b-2',
              shown === pane ? 'border-tide font-medium text-ink' : 'border-transparent text-ink-soft',
            )}
          >
            {pane === 'left' ? leftName : rightName}
          </button>
        ))}
      </div>
      <div
        ref={frame}
        className="flex min-h-0 flex-1 print:block"
        style={{ ['--share' as string]: `${share}%` }}
      >
        <section
          aria-label={leftName}
          className={classes(
            'min-h-0 min-w-0 max-lg:flex-1 lg:block lg:w-(--share) print:hidden',
            shown === 'left' ? 'block' : 'hidden',
          )}
        >
          {left}
        </section>
        <div
          role="separator"
          aria-label={`Border between ${leftName.toLowerCase()} and ${rightName.toLowerCase()}`}
          aria-orientation="vertical"
          aria-valuenow={Math.round(share)}
          aria-valuemin={LEAST}
          aria-valuemax={MOST}
          tabIndex={0}
          onKeyDown={onKey}
          onPointerDown={(event) => event.currentTarget.setPointerCapture(event.pointerId)}
          onPointerMove={drag}
          className="hidden w-2 shrink-0 cursor-col-resize touch-none border-x border-rule bg-paper hover:bg-tide-wash lg:block print:hidden"
        />
        <section
          aria-label={rightName}
          className={classes(
            'min-h-0 min-w-0 flex-1 lg:block print:block',
            shown === 'right' ? 'block' : 'hidden',
          )}
        >
          {right}
        </section>
      </div>
    </div>
  )
}

function clamp(share: number): number {
  return Math.min(MOST, Math.max(LEAST, share))
}
