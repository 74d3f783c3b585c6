import type { PageViewport } from 'pdfjs-dist'
import { useEffect, useRef, type KeyboardEvent } from 'react'
import type { Outcome } from '@/lib/checks/vocabulary'
import { OutcomeShape } from '../shell/outcome-mark'
import { classes } from '../ui/classes'
import { isSame, type MarkedPlace, type Target } from './audit-index'
import { boxToPixels } from './box-to-pixels'

type PageMarksProps = {
  marks: readonly MarkedPlace[]
  viewport: PageViewport
  chosen: Target | null
  onChoose: (target: Target) => void
  /** Told of the chosen mark's element whenever it is drawn. */
  onChosenDrawn: (element: HTMLElement) => void
}

const looks: Record<Outcome | 'none', string> = {
  holds: 'border-b-2 border-holds',
  fails: 'border-2 border-fails',
  undecidable: 'border-2 border-dashed border-undecidable',
  uncorrected: 'border-2 border-dotted border-uncorrected',
  none: 'border-b border-ink-soft',
}

/** The marks over a rendered page: one button a number; the arrow keys walk them, so that Tab passes by. */
export function PageMarks({ marks, viewport, chosen, onChoose, onChosenDrawn }: PageMarksProps) {
  const stop = Math.max(
    0,
    marks.findIndex((mark) => isSame(mark.target, chosen)),
  )
  return (
    <div className="absolute inset-0" role="group" aria-label="Marked numbers" onKeyDown={walkMarks}>
      {marks.map((mark, index) => (
        <PageMark
          key={`${mark.target.kind}-${mark.target.id}`}
          mark={mark}
          viewport={viewport}
          chosen={isSame(mark.target, chosen)}
          stop={index === stop}
          onChoose={onChoose}
          onChosenDrawn={onChosenDrawn}
        />
      ))}
    </div>
  )
}

function PageMark(props: {
  mark: MarkedPlace
  viewport: PageViewport
  chosen: boolean
  stop: boolean
  onChoose: (target: Target) => void
  onChosenDrawn: (element: HTMLElement) => void
}) {
  const { mark, viewport, chosen, onChosenDrawn } = props
  const button = useRef<HTMLButtonElement>(null)
  useEffect(() => {
    if (chosen && button.current) onChosenDrawn(button.current)
  }, [chosen, viewport, onChosenDrawn])
  const look = looks[mark.outcome ?? 'none']
  return mark.boxes.map((box, index) => {
    const { left, top, width, height } = boxToPixels(box, viewport)
    const style = { left: left - 2, top: top - 1, width: width + 4, height: height + 2 }
    const shown = classes(
      'absolute cursor-pointer rounded-none',
      look,
      chosen
        ? 'bg-[oklch(0.85_0.13_95/0.45)] outline-2 outline-offset-2 outline-tide'
        : 'hover:bg-[oklch(0.85_0.13_95/0.3)]',
    )
    if (index > 0) {
      return (
        <span
          key={index}
          aria-hidden="true"
          style={style}
          className={classes(shown, 'pointer-events-none')}
        />
      )
    }
    return (
      <button
        key={index}
        ref={button}
        type="button"
        data-mark=""
        tabIndex={props.stop ? 0 : -1}
        aria-label={`${mark.label}, ${mark.target.kind === 'claim' ? 'claim' : (mark.outcome ?? 'not judged')}`}
        aria-pressed={chosen}
        style={style}
        className={shown}
        onClick={() => props.onChoose(mark.target)}
      >
        {mark.outcome && mark.outcome !== 'holds' && (
          <OutcomeShape outcome={mark.outcome} className="absolute -top-2 -left-2.5 size-2.5" />
        )}
      </button>
    )
  })
}

function walkMarks(event: KeyboardEvent<HTMLDivElement>) {
  const step = { ArrowDown: 1, ArrowRight: 1, ArrowUp: -1, ArrowLeft: -1 }[event.key]
  if (step === undefined) return
  const all = [...event.currentTarget.querySelectorAll<HTMLButtonElement>('[data-mark]')]
  const at = all.findIndex((one) => one === document.activeElement)
  const next = all[at + step]
  if (!next) return
  event.preventDefault()
  next.focus()
}

/** Scrolls the pane, and nothing around it, so far that the mark stands in its middle. */
export function bringIntoSight(element: HTMLElement) {
  const pane = element.closest<HTMLElement>('[data-page-scroller]')
  if (!pane) return
  const mark = element.getBoundingClientRect()
  const frame = pane.getBoundingClientRect()
  const across = mark.left < frame.left + 8 || mark.right > frame.right - 8
  const down = mark.top < frame.top + 24 || mark.bottom > frame.bottom - 24
  pane.scrollBy({
    top: down ? mark.top - frame.top - frame.height / 2 : 0,
    left: across ? mark.left - frame.left - frame.width / 2 : 0,
  })
}
