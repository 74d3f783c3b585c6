import { printedInterval } from '../numbers/printed-interval'
import type { LaidOut, ReadReport, SectionKind } from '../types'
import { readCommand } from './grammar/console'
import { parseNumber, UNSIGNED } from './grammar/number'
import { toRelation } from './grammar/p-value'
import { placeIn } from './places'

/** '[1] 0.09060652', '[1] 0.031 0.120 <1e-04 [4] 0.5': a printed vector with the ranks of its first elements. */
const VECTOR = /^\[1\]\s+\S/
const ELEMENT = new RegExp(
  String.raw`(?<=\s)(?<relation>[<>]\s?)?(?<number>${UNSIGNED}(?:[eE][-+]?\d+)?)(?=\s|$)`,
  'g',
)

/** The p-values that a command at a prompt printed as a vector in the paragraph below it, with provisional ids. */
export function readConsole({ prose }: LaidOut): ReadReport[] {
  const found: ReadReport[] = []
  let start = 0
  let command: ReturnType<typeof readCommand> = null
  for (const paragraph of prose.text.split('\n\n')) {
    const isOutput = command !== null && VECTOR.test(paragraph)
    if (command && isOutput) found.push(...readVector(prose, paragraph, start, command.scale))
    if (isOutput || !isOfFigure(paragraph)) command = readCommand(paragraph)
    start += paragraph.length + 2
  }
  return found
}

/** 'Figure 2: …', 'Male Female': what a figure between a command and its output leaves of text. */
function isOfFigure(paragraph: string): boolean {
  return (
    /^fig(?:ure|\.)?\s?\d/i.test(paragraph) || (paragraph.length < 60 && /^[\p{L}\d\s-]+$/u.test(paragraph))
  )
}

function readVector(
  prose: LaidOut['prose'],
  paragraph: string,
  start: number,
  scale: ReadReport['scale'],
): ReadReport[] {
  const section = prose.sections.findLast((one) => one.start <= start)
  const kind: SectionKind = section?.kind ?? 'other'
  return [...paragraph.replace(/\[\d+\]/g, (rank) => ' '.repeat(rank.length)).matchAll(ELEMENT)].flatMap(
    ({ index, groups, 0: text }) => {
      const parsed = parseNumber(groups?.number ?? '')
      if (!parsed || parsed.value > 1) return []
      const relation = groups?.relation === undefined ? '=' : toRelation(groups.relation.trim())
      return [
        {
          id: `console-p-${start + index}`,
          place: placeIn(prose, start + index, start + index + text.length),
          relation,
          ...parsed,
          ...printedInterval(parsed.value, parsed.decimals, relation),
          scale,
          statistic: null,
          comparison: null,
          called: null,
          family: null,
          offset: start + index,
          section: kind,
          heading: section?.heading ?? '',
          table: null,
          cell: null,
          sentence: paragraph,
          outcome: null,
          role: 'other' as const,
          oneSided: false,
          markOnly: false,
        },
      ]
    },
  )
}
