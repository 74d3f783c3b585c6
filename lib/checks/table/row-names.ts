import { fold } from '../extract/grammar/fold'
import { splitPair } from '../extract/grammar/comparison'
import type { Grid, GridRow, Reader } from './grid'
import type { Control } from './pdf-table'
import type { ColumnRole } from './roles'

export type RowNames = { comparison: [string, string] | null; outcome: string | null }

/** The pair and the outcome that a row is about. */
export function nameRow(
  { grid, roles, control }: Reader,
  { cells }: GridRow,
  heading: string | null,
): RowNames {
  const textOf = (kind: ColumnRole['kind']) => {
    const c = roles.findIndex((role) => role.kind === kind)
    const text =
      c < 0
        ? ''
        : fold(cells[c] ?? '')
            .replace(/\s+/g, ' ')
            .trim()
    return text === '' ? null : text.replace(/[\^]?[*†‡§#]+$/, '').trim()
  }
  const comparison = textOf('comparison')
  const [group, group2] = [textOf('group'), textOf('group2')]
  const label = textOf('label')
  const outcome = textOf('outcome') ?? heading
  const pair = comparison ? splitPair(comparison) : null
  if (pair) return { comparison: pair, outcome: outcome ?? (label && label !== comparison ? label : null) }
  if (group && group2) return { comparison: [group, group2], outcome: outcome ?? label }
  const inLabel =
    label && /\s(?:vs?\.?|versus|minus|against)\s|\s[-–]\s/i.test(label) ? splitPair(label) : null
  if (inLabel) return { comparison: inLabel, outcome }
  const name = comparison ?? group ?? (textOf('outcome') ? null : label)
  if (name && control && name.toLowerCase() !== control.toLowerCase() && isAgainstControl(grid))
    return { comparison: [name, control], outcome: heading }
  return { comparison: null, outcome: textOf('outcome') ?? label ?? group ?? comparison ?? heading }
}

/**
 * The control that the text names, where this table's first column is what the text compares with it: its head
 * stands in that sentence ('each of the five depths was compared with the surface' over a column 'Depth').
 */
export function controlOf(
  grid: Grid,
  roles: readonly ColumnRole[],
  controls: readonly Control[],
): string | null {
  const c = roles.findIndex(({ kind }) => kind === 'group' || kind === 'label' || kind === 'outcome')
  const head = fold(grid.headers[c] ?? '')
    .toLowerCase()
    .replace(/[^a-z]+.*$/, '')
    .replace(/s$/, '')
  if (c < 0 || head.length < 3) return null
  return controls.find(({ sentence }) => new RegExp(`\\b${head}s?\\b`, 'i').test(sentence))?.name ?? null
}

/** Rows are treatments held against one control only where the table says so. */
const isAgainstControl = (grid: Grid): boolean => !/correlat/i.test(grid.caption)

/** 'compared with the control', 'vs surface', 'minus control', 'difference from placebo' in a caption, note or head. */
export function findControl(text: string): string | null {
  const match =
    /\b(?:compared (?:with|to)|comparisons? (?:with|to)|versus|vs\.?|against|minus|differences? (?:from|to)|relative to|than)\s(?:that of\s|the\s|untreated\s|an?\s)*(?<name>(?:[\w°+-]+\s){0,2}?(?:control|placebo|vehicle|sham|reference|baseline|standard|surface|check|blank|untreated)(?:s\b)?)/i.exec(
      fold(text),
    )
  return match?.groups?.name?.trim() ?? null
}

/** 'A vs B', 'group1-2', 'I–II' behind a value as the two groups. */
export function pairOfLabel(label: string): [string, string] | null {
  // one word before two short names: 'group1-2', 'groups 1 vs 3'
  const short = /^(groups?|arms?)\s?(\w{1,2})\s?(?:[-–/]|vs\.?|and)\s?(\w{1,2})$/i.exec(fold(label))
  if (short?.[1] && short[2] && short[3]) {
    const noun = short[1].replace(/s$/i, '')
    return [`${noun} ${short[2]}`, `${noun} ${short[3]}`]
  }
  return splitPair(fold(label))
}

/** The upper line of a head in several lines, where it names what a block of columns is about: 'BAI | p'. */
export function spanOf({ grid, roles }: Reader, column: number): string | null {
  if (roles.filter(({ kind }) => kind === 'p').length < 2) return null
  const parts = (grid.headers[column] ?? '').split(' | ')
  return parts.length > 1 ? (parts[0] ?? null) : null
}
