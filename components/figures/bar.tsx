type BarProps = {
  /** Parts of one bar from the left: filled, or outlined. */
  parts: readonly { value: number; fill: 'filled' | 'outlined' }[]
  /** The value that takes the whole width; the same for every bar of a table. */
  max: number
}

const width = 240
const height = 14

/** One horizontal bar, drawn on the server. The numbers stand in the row beside it, so it is hidden from readers. */
export function Bar({ parts, max }: BarProps) {
  const scale = max > 0 ? (width - 2) / max : 0
  const starts = parts.map((_, index) => parts.slice(0, index).reduce((sum, part) => sum + part.value, 0))
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      preserveAspectRatio="none"
      aria-hidden="true"
      className="h-3.5 w-full max-w-60 min-w-24 overflow-visible"
    >
      <line x1="0.5" x2="0.5" y1="-4" y2={height + 4} className="stroke-edge" />
      {parts.map((part, index) =>
        part.value > 0 ? (
          <rect
            key={index}
            x={1 + (starts[index] ?? 0) * scale}
            y="2.5"
            width={Math.max(part.value * scale, 1)}
            height={height - 5}
            className={part.fill === 'filled' ? 'fill-tide stroke-tide' : 'fill-none stroke-tide'}
            vectorEffect="non-scaling-stroke"
          />
        ) : null,
      )}
    </svg>
  )
}
