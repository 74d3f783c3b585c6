/** Ruled lines where the rows will stand. */
export function Skeleton({ rows = 6, label = 'Loading' }: { rows?: number; label?: string }) {
  return (
    <div role="status" aria-label={`${label}…`}>
      {Array.from({ length: rows }, (_, row) => (
        <div key={row} className="flex h-9 items-center gap-6 border-b border-rule px-2" aria-hidden="true">
          <span className="h-2 w-24 bg-rule/70" />
          <span className="h-2 bg-rule/70" style={{ width: `${30 + ((row * 17) % 35)}%` }} />
          <span className="ml-auto h-2 w-16 bg-rule/70" />
        </div>
      ))}
    </div>
  )
}
