import { linearRegression, median } from 'simple-statistics'
import type { TextRun } from '@/lib/checks/types'
import type { SeenWord } from './recogniser'

/** Key of the font that stands for all recognised text. */
export const recognisedFont = 'recognised'

// letters and signs that reach below the line, and those as high as a capital
const descends = /[gjpqyQ,;()[\]{}|/$§_]/
const tall = /[A-Z0-9bdfhkl]/
/** Height of a capital or a digit as a share of the size, in common text faces. */
const capitalHeight = 0.68
/** Pixels by which the box of a recognised word is higher than its letters. */
const blur = 2

type LineOfWords = { words: SeenWord[]; size: number; baseline: number }

/**
 * Recognised words as runs of text: words of a line on one baseline, lines of nearly the usual size in that size.
 * `pixel` is points a pixel, `height` that of the page in points. A page that lies askew is set straight.
 */
export function toRuns(words: readonly SeenWord[], pixel: number, height: number): TextRun[] {
  const kept = words.map(mend).filter(({ text, confidence }) => !isRule(text) && confidence >= 20)
  const lines = groupLines(kept)
  const slope = findSlope(lines)
  const middle = kept.length > 0 ? median(kept.map((word) => word.left + word.width / 2)) : 0
  const measured = lines.map((line) => measureLine(line, slope, middle))
  const usual = usualSize(measured)
  return measured.flatMap(({ words: row, size, baseline }) => {
    const points = Math.abs(size - usual) < 0.18 * usual ? usual : size
    return row.map((word, i): TextRun => ({
      text: word.text,
      x: word.left * pixel,
      y: height - baseline * pixel,
      width: word.width * pixel,
      size: points * pixel,
      angle: 0,
      font: recognisedFont,
      endsLine: i === row.length - 1,
    }))
  })
}

/** A drawn rule between the columns of a table. */
function isRule(text: string): boolean {
  return /^[|¦_—–\-\\[\]]*[|¦_\\[\]][|¦_—–\-\\[\]]*$/.test(text)
}

/** χ² before its degrees of freedom is recognised as other letters with some mark: "x?(1)", "¥2(3)", "X*(2)". */
function mend(word: SeenWord): SeenWord {
  const text = word.text
    .replace(/^(\W?)[xXyY¥%][?%*2²°"']{1,2}(?=\(\d)/, '$1χ2')
    .replace(/[|¦]$/, '')
    .replace(/[—–](?=\.?\d)/g, '-')
  return { ...word, text: text === '' ? word.text : text }
}

function groupLines(words: readonly SeenWord[]): SeenWord[][] {
  const lines = new Map<string, SeenWord[]>()
  for (const word of words) lines.set(word.line, [...(lines.get(word.line) ?? []), word])
  return [...lines.values()]
}

/** How the baselines fall per pixel to the right: the middle one of those of long lines. */
function findSlope(lines: readonly SeenWord[][]): number {
  const slopes = lines.flatMap((line) => {
    const feet = line.filter(({ text }) => !descends.test(text))
    if (feet.length < 5) return []
    const points = feet.map((word) => [word.left + word.width / 2, word.top + word.height])
    return [linearRegression(points).m]
  })
  return slopes.length === 0 ? 0 : median(slopes)
}

function measureLine(words: SeenWord[], slope: number, middle: number): LineOfWords {
  const straight = (word: SeenWord) => word.top + word.height - slope * (word.left + word.width / 2 - middle)
  const feet = words.filter(({ text }) => !descends.test(text) && /[\p{L}\d]/u.test(text))
  const capitals = feet.filter(({ text }) => tall.test(text))
  const highest = Math.max(...words.map((word) => word.height))
  const size =
    capitals.length > 0
      ? (median(capitals.map((word) => word.height)) - blur) / capitalHeight
      : highest / 0.95
  const baseline = feet.length > 0 ? median(feet.map(straight)) : median(words.map(straight)) - 0.22 * size
  return { words: [...words].sort((a, b) => a.left - b.left), size, baseline }
}

/** The size of most characters. */
function usualSize(lines: readonly LineOfWords[]): number {
  const sizes = lines.flatMap(({ words, size }) => words.map(() => size))
  return sizes.length === 0 ? 0 : median(sizes)
}
