import { LinePath } from '@visx/shape'
import type { Claim, Decision, Report } from '@/lib/checks/types'
import { OutcomeRing } from './outcome-ring'
import { describeDot, nameOfReport } from './describe-dot'
import type { Interval } from './raw-intervals'
import {
  staircaseGeometry,
  type DrawnFamily,
  type StaircaseDot,
  type StaircaseLine,
} from './staircase-geometry'

export type StaircaseProps = {
  family: DrawnFamily
  reports: readonly Report[]
  claim: Claim | null
  alpha: number
  /** The unadjusted p-values behind the printed ones, where they are known. */
  raw?: ReadonlyMap<string, Interval>
  /** Unique on the page: names the picture's title and description. */
  id: string
  chosen?: string | null
  onPick?: (reportId: string) => void
  /** Name and words of a dot, where they are not those of a manuscript's comparison and call. */
  describe?: (report: Report, decision: Decision | null) => { name: string; words: string }
}

const describeCall = (report: Report, decision: Decision | null) => ({
  name: nameOfReport(report),
  words: describeDot(report, decision),
})

/** The picture of a family, once for narrow and once for wide places; style decides which is shown. */
export function Staircase(props: StaircaseProps) {
  return (
    <div className="@container">
      <div className="@lg:hidden print:hidden">
        <Picture {...props} id={`${props.id}-narrow`} width={320} height={260} />
      </div>
      <div className="hidden @lg:block print:block">
        <Picture {...props} id={`${props.id}-wide`} width={620} height={320} />
      </div>
    </div>
  )
}

/** With more dots than this each would be one stop of the Tab key too many; the table names them all. */
const MOST_STOPS = 40

function Picture(props: StaircaseProps & { width: number; height: number }) {
  const { family, reports, claim, alpha, id, width, height } = props
  const picture = staircaseGeometry(family, reports, claim, alpha, { width, height }, props.raw)
  const { plot, dots } = picture
  const stops = dots.length <= MOST_STOPS
  const radius = Math.max(1.8, Math.min(4.5, (plot.right - plot.left) / (dots.length * 3 + 1)))
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      className="block h-auto w-full max-w-[760px] font-sans text-ink"
      role="group"
      aria-labelledby={`${id}-title`}
      aria-describedby={`${id}-desc`}
      fontSize={11}
    >
      <title id={`${id}-title`}>{`Staircase of ${family.label}`}</title>
      <desc id={`${id}-desc`}>
        {`${dots.length} p-values by rank on a logarithmic scale, with their rounding intervals and the thresholds of the procedures. The table holds the same numbers.`}
      </desc>
      <g aria-hidden="true">
        {picture.ticks.map((tick) => (
          <g key={tick.label}>
            <line
              x1={plot.left}
              x2={plot.right}
              y1={tick.y}
              y2={tick.y}
              className="stroke-rule"
              strokeWidth={0.5}
            />
            <text x={plot.left - 6} y={tick.y + 4} textAnchor="end" className="fill-ink-soft">
              {tick.label}
            </text>
          </g>
        ))}
        {picture.ranks.map((rank) => (
          <text
            key={rank.label}
            x={rank.x}
            y={plot.bottom + 14}
            textAnchor="middle"
            className="fill-ink-soft"
          >
            {rank.label}
          </text>
        ))}
        <text x={(plot.left + plot.right) / 2} y={height - 5} textAnchor="middle" className="fill-ink-soft">
          rank
        </text>
        <text
          x={plot.left - 6}
          y={plot.top - 10}
          textAnchor="end"
          fontStyle="italic"
          className="fill-ink-soft"
        >
          p
        </text>
        {picture.lines.map((line) => (
          <StepLine key={line.key} line={line} labelX={plot.right + 16} />
        ))}
      </g>
      {dots.map((dot) => (
        <Dot
          key={dot.report.id}
          dot={dot}
          radius={radius}
          floorY={plot.bottom}
          focusable={stops}
          chosen={props.chosen === dot.report.id}
          onPick={props.onPick}
          describe={props.describe ?? describeCall}
        />
      ))}
    </svg>
  )
}

const lineStyle: Record<
  StaircaseLine['kind'],
  { stroke: string; text: string; width: number; dash?: string }
> = {
  claimed: { stroke: 'stroke-ink', text: 'fill-ink font-semibold', width: 1.8 },
  'as-claimed-m': { stroke: 'stroke-ink', text: 'fill-ink', width: 1.2, dash: '5 3' },
  other: { stroke: 'stroke-ink-soft opacity-50', text: 'fill-ink-soft', width: 0.7 },
  alpha: { stroke: 'stroke-ink-soft', text: 'fill-ink', width: 1, dash: '1.5 3' },
}

function StepLine({ line, labelX }: { line: StaircaseLine; labelX: number }) {
  const style = lineStyle[line.kind]
  return (
    <g>
      <LinePath
        data={line.points}
        x={(point) => point.x}
        y={(point) => point.y}
        fill="none"
        strokeWidth={style.width}
        strokeDasharray={style.dash}
        className={style.stroke}
      />
      <path
        d={`M${line.end.x + 1} ${line.end.y}L${labelX - 3} ${line.labelY}`}
        fill="none"
        strokeWidth={0.5}
        className="stroke-ink-soft"
      />
      <text x={labelX} y={line.labelY + 4} className={style.text}>
        {line.label}
      </text>
    </g>
  )
}

function Dot(props: {
  dot: StaircaseDot
  radius: number
  floorY: number
  focusable: boolean
  chosen: boolean
  onPick?: (reportId: string) => void
  describe: typeof describeCall
}) {
  const { dot, radius, onPick } = props
  const { report, decision } = dot
  const { name, words } = props.describe(report, decision)
  const pick = onPick ? () => onPick(report.id) : undefined
  return (
    <g
      className="group cursor-default outline-none data-[pick=true]:cursor-pointer"
      data-pick={pick !== undefined}
      role={pick ? 'button' : 'img'}
      tabIndex={props.focusable ? 0 : undefined}
      aria-label={`${name}: ${words}`}
      onClick={pick}
      onKeyDown={
        pick &&
        ((event) => {
          if (event.key !== 'Enter' && event.key !== ' ') return
          event.preventDefault()
          event.stopPropagation()
          pick()
        })
      }
    >
      <rect x={dot.x - 12} y={dot.y - 12} width={24} height={24} fill="transparent" />
      {dot.whisker && (
        <path
          d={`M${dot.x} ${dot.whisker.top}V${dot.openBelow ? props.floorY : dot.whisker.bottom}`}
          strokeWidth={1.4}
          className="stroke-ink"
        />
      )}
      {dot.openBelow && (
        <path
          d={`M${dot.x - 3} ${props.floorY - 4}L${dot.x} ${props.floorY}L${dot.x + 3} ${props.floorY - 4}`}
          fill="none"
          strokeWidth={1.4}
          className="stroke-ink"
        />
      )}
      <g transform={`translate(${dot.x} ${dot.y})`}>
        <circle
          r={radius + 7}
          fill="none"
          strokeWidth={2}
          className={`stroke-tide group-focus-visible:opacity-100 ${props.chosen ? '' : 'opacity-0'}`}
        />
        <DotBody called={callOf(report, decision)} radius={radius} />
        {dot.outcome && <OutcomeRing outcome={dot.outcome} radius={radius + 3.5} />}
      </g>
      <g
        aria-hidden="true"
        className="pointer-events-none opacity-0 group-hover:opacity-100 group-focus-visible:opacity-100"
      >
        <rect x={14} y={0} width="100%" height={28} className="fill-sheet" />
        <text x={16} y={11} className="fill-ink font-semibold">
          {name}
        </text>
        <text x={16} y={25} className="fill-ink">
          {words}
        </text>
      </g>
    </g>
  )
}

/** As the judgement took it, which looks at every place of the comparison; else as it stands with the number. */
function callOf(report: Report, decision: StaircaseDot['decision']): Report['called'] {
  if (decision === null || decision.called === null) return report.called
  return decision.called ? 'significant' : 'not significant'
}

function DotBody({ called, radius }: { called: Report['called']; radius: number }) {
  if (called === 'significant') return <circle r={radius} className="fill-ink" />
  if (called === 'not significant') {
    return <circle r={radius} strokeWidth={1.4} className="fill-sheet stroke-ink" />
  }
  return (
    <path d={`M${-radius} 0H${radius}M0 ${-radius}V${radius}`} strokeWidth={1.6} className="stroke-ink" />
  )
}
