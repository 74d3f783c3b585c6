/** How far something is, in [0, 1]; null while that is not known. */
export function ProgressBar({ value, label }: { value: number | null; label: string }) {
  const percent = value === null ? null : Math.round(Math.min(1, Math.max(0, value)) * 100)
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent ?? undefined}
      className="h-1.5 w-full overflow-hidden rounded-sm bg-sunken ring-1 ring-rule"
    >
      <div
        className="h-full bg-tide"
        style={{ width: percent === null ? '100%' : `${percent}%`, opacity: percent === null ? 0.35 : 1 }}
      />
    </div>
  )
}
