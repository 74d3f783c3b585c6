import { scaleLinear, scaleLog } from '@visx/scale'
import type { Claim, Decision, Family, Report } from '@/lib/checks/types'
import type { Outcome } from '@/lib/checks/vocabulary'
import { outcomeOfDecision } from './outcome-of-decision'
import type { Interval } from './raw-intervals'
import { spreadLabels } from './spread-labels'
import { procedureNames, steppedFor, thresholdOf, type Stepped } from './thresholds'

/** What a staircase needs of a family. */
export type DrawnFamily = Pick<Family, 'id' | 'label' | 'members' | 'm' | 'outcome' | 'decisions'>

export type StaircaseFrame = { width: number; height: number }

export type StaircaseDot = {
  report: Report
  decision: Decision | null
  rank: number
  x: number
  y: number
  /** Ends of the whisker; null where it would be shorter than the dot. */
  whisker: { top: number; bottom: number } | null
  /** The interval reaches below the picture, as with '< 0.001'. */
  openBelow: boolean
  outcome: Outcome | null
}

export type StaircaseLine = {
  key: string
  label: string
  kind: 'claimed' | 'as-claimed-m' | 'other' | 'alpha'
  points: { x: number; y: number }[]
  end: { x: number; y: number }
  labelY: number
}

export type StaircaseGeometry = {
  frame: StaircaseFrame
  plot: { left: number; right: number; top: number; bottom: number }
  dots: StaircaseDot[]
  lines: StaircaseLine[]
  ticks: { y: number; label: string }[]
  ranks: { x: number; label: string }[]
  /** Members that have no place on this scale: given only as adjusted values beside raw ones. */
  apart: Report[]
  adjustedOnly: boolean
}

const others: readonly Stepped[] = ['bonferroni', 'sidak', 'holm', 'bh', 'by']

const noRaw: ReadonlyMap<string, Interval> = new Map()

type Entry = Interval & { report: Report; decision: Decision | null; value: number }

/**
 * Everything that the picture of a family needs, in pixels of `frame`; no drawing. One dot a comparison: its
 * unadjusted p-value against the thresholds where that is known (`raw`, by the decision's report), else the
 * adjusted ones against alpha.
 */
export function staircaseGeometry(
  family: DrawnFamily,
  reports: readonly Report[],
  claim: Claim | null,
  alpha: number,
  frame: StaircaseFrame,
  raw: ReadonlyMap<string, Interval> = noRaw,
): StaircaseGeometry {
  const members = listMembers(family, reports)
  const onThresholds = claim === null || claim.procedure === 'none' || steppedFor(claim.procedure) !== null
  const rawEntries = onThresholds ? members.flatMap((member) => rawEntry(member, raw)) : []
  const adjustedOnly = rawEntries.length === 0
  const shown = (adjustedOnly ? members.map(printedEntry) : rawEntries).sort(
    (a, b) => a.value - b.value || a.low - b.low,
  )
  const m = Math.max(family.m.due ?? family.m.printed, shown.length, 1)
  const lastRank = Math.min(m, Math.max(shown.length * 2, 12))
  const narrow = frame.width < 480
  const plot = {
    left: 44,
    right: frame.width - (narrow ? 104 : 168),
    top: 34,
    bottom: frame.height - 34,
  }
  const drafts = adjustedOnly ? [alphaLine(alpha)] : draftLines(claim, family, m, alpha)
  const floor = floorOf(shown, drafts, lastRank)
  const onY = scaleLog({ domain: [floor, 1], range: [plot.bottom, plot.top], clamp: true })
  const onX = scaleLinear({ domain: [0.5, lastRank + 0.5], range: [plot.left, plot.right] })
  const yScale = (value: number) => toHundredths(onY(value))
  const xScale = (rank: number) => toHundredths(onX(rank))
  const lines = drafts.map((draft) => {
    const points = stepPoints(draft.at, lastRank, xScale, yScale)
    return { ...draft, points, end: points[points.length - 1] ?? { x: plot.right, y: plot.top } }
  })
  const labelYs = spreadLabels(
    lines.map((line) => line.end.y),
    13,
    plot.top,
    plot.bottom,
  )
  return {
    frame,
    plot,
    dots: shown.map((entry, index) => placeDot(entry, index + 1, family, floor, xScale, yScale)),
    lines: lines.map(({ key, label, kind, points, end }, index) => ({
      key,
      label,
      kind,
      points,
      end,
      labelY: labelYs[index] ?? end.y,
    })),
    ticks: decades(floor).map((value) => ({ y: yScale(value), label: tickLabel(value) })),
    ranks: rankTicks(lastRank, narrow ? 6 : 12).map((rank) => ({ x: xScale(rank), label: String(rank) })),
    apart: adjustedOnly
      ? []
      : members.flatMap(({ report }) => (shown.some((one) => one.report === report) ? [] : [report])),
    adjustedOnly,
  }
}

type Member = { report: Report; decision: Decision | null }

/** One a comparison, as decided; the members themselves where nothing was decided. */
function listMembers(family: DrawnFamily, reports: readonly Report[]): Member[] {
  const byId = new Map(reports.map((report) => [report.id, report]))
  const entries: { id: string; decision: Decision | null }[] =
    family.decisions.length > 0
      ? family.decisions.map((decision) => ({ id: decision.report, decision }))
      : family.members.map((id) => ({ id, decision: null }))
  return entries.flatMap(({ id, decision }) => {
    const report = byId.get(id)
    return report ? [{ report, decision }] : []
  })
}

function printedEntry({ report, decision }: Member): Entry {
  return { report, decision, low: report.low, high: report.high, value: report.value }
}

function rawEntry(member: Member, raw: ReadonlyMap<string, Interval>): Entry[] {
  const { report, decision } = member
  const behind = report.scale === 'raw' ? undefined : raw.get(report.id)
  if (behind) return [{ report, decision, ...behind, value: Math.sqrt(behind.low * behind.high) }]
  return report.scale === 'adjusted' ? [] : [printedEntry(member)]
}

type DraftLine = {
  key: string
  label: string
  kind: StaircaseLine['kind']
  at: (rank: number) => number
}

type Scale = (value: number) => number

function alphaLine(alpha: number): DraftLine {
  return { key: 'alpha', label: `α = ${alpha}`, kind: 'alpha', at: () => alpha }
}

function draftLines(claim: Claim | null, family: DrawnFamily, m: number, alpha: number): DraftLine[] {
  const claimed = steppedFor(claim?.procedure ?? null)
  const lines: DraftLine[] = [alphaLine(alpha)]
  if (claimed) {
    lines.push({
      key: claimed,
      label: `${shortNames[claimed]}, m = ${m}`,
      kind: 'claimed',
      at: (rank) => thresholdOf[claimed](rank, m, alpha),
    })
    const used = family.m.claimed ?? claim?.m ?? null
    if (used !== null && used !== m && used > 0) {
      lines.push({
        key: 'as-claimed-m',
        label: `as claimed, m = ${used}`,
        kind: 'as-claimed-m',
        at: (rank) => thresholdOf[claimed](Math.min(rank, used), used, alpha),
      })
    }
  }
  for (const other of others) {
    const same = other === claimed || (other === 'holm' && claimed === 'hochberg')
    if (same || m === 1) continue
    lines.push({
      key: other,
      label: other === 'holm' && claimed !== 'holm' ? 'Holm, Hochberg' : shortNames[other],
      kind: 'other',
      at: (rank) => thresholdOf[other](rank, m, alpha),
    })
  }
  return lines
}

const shortNames: Record<Stepped, string> = {
  ...procedureNames,
  bh: 'BH',
  by: 'BY',
}

/** The lowest decade that is drawn: below every printed value and threshold, between 1e-12 and 1e-3. */
function floorOf(shown: readonly Entry[], lines: readonly DraftLine[], lastRank: number): number {
  const values = shown.flatMap((entry) => [entry.low, entry.value, entry.high])
  const steps = lines.flatMap((line) => [line.at(1), line.at(lastRank)])
  const smallest = Math.min(...[...values, ...steps].filter((value) => value > 0), 1)
  const exponent = Math.floor(Math.log10(smallest) - 0.15)
  return 10 ** Math.min(-3, Math.max(-12, exponent))
}

function stepPoints(at: (rank: number) => number, lastRank: number, x: Scale, y: Scale) {
  const points: { x: number; y: number }[] = []
  for (let rank = 1; rank <= lastRank; rank += 1) {
    const level = y(at(rank))
    const last = points[points.length - 1]
    if (last && Math.abs(last.y - level) < 0.01) {
      last.x = x(rank + 0.5)
    } else {
      points.push({ x: x(rank - 0.5), y: level }, { x: x(rank + 0.5), y: level })
    }
  }
  return points
}

function placeDot(
  entry: Entry,
  rank: number,
  family: DrawnFamily,
  floor: number,
  x: Scale,
  y: Scale,
): StaircaseDot {
  const { report, decision } = entry
  const middle = entry.value > 0 ? entry.value : entry.high
  const top = y(Math.max(entry.high, floor))
  const bottom = y(Math.max(entry.low, floor))
  return {
    report,
    decision,
    rank,
    x: x(rank),
    y: y(Math.max(middle, floor)),
    whisker: bottom - top > 1 ? { top, bottom } : null,
    openBelow: entry.low < floor,
    outcome: decision ? outcomeOfDecision(decision, family) : null,
  }
}

function decades(floor: number): number[] {
  const lowest = Math.round(Math.log10(floor))
  const every = lowest < -6 ? 2 : 1
  const values: number[] = []
  for (let exponent = 0; exponent >= lowest; exponent -= every) values.push(10 ** exponent)
  return values
}

function tickLabel(value: number): string {
  const exponent = Math.round(Math.log10(value))
  return exponent >= -4 ? value.toFixed(Math.max(0, -exponent)) : `1e${exponent}`.replace('-', '−')
}

/** The server and the browser differ in the last digits of a logarithm; in a drawing they must agree. */
function toHundredths(pixels: number): number {
  return Math.round(pixels * 100) / 100
}

/** Ranks that are named below the picture: at most `most`, evenly, with the first. */
function rankTicks(lastRank: number, most: number): number[] {
  const every = Math.ceil(lastRank / most)
  return Array.from({ length: lastRank }, (_, index) => index + 1).filter(
    (rank) => every === 1 || rank === 1 || rank % every === 0,
  )
}
