import { expect, test } from 'vitest'
import { read } from '@/lib/checks/extract/read'
import { readCommand } from '@/lib/checks/extract/grammar/console'
import { defaultHouseRules } from '@/lib/checks/house-rules'
import { layOut } from '@/lib/checks/text/lay-out'
import { block, document, page, prose, row } from '../text/runs'

// What a statistics program printed at its prompt; invented commands and numbers.

const COMMANDS: readonly (readonly [command: string, scale: string | null])[] = [
  ['R> pvalue(it)', 'raw'],
  ['R> pvalue(it, method = "single-step")', 'adjusted'],
  ['R> pvalue(it, method = "none")', 'raw'],
  ['> p.adjust(p, "holm")', 'adjusted'],
  ['> t.test(weight ~ site)$p.value', 'raw'],
  ['> pairwise.t.test(weight, site, p.adjust.method = "bonferroni")$p.value', 'adjusted'],
  ['>>> multipletests(p)[1]', 'adjusted'],
  ['>>> result.pvalue', 'raw'],
  ['In [4]: result.pvalue', 'raw'],
  ['R> p <- pvalue(it)', null],
  ['> statistic(it)', null],
  ['> qperm(it, 0.95)', null],
  ['> fit <- lm(weight ~ site)', null],
  ['> x <- rnorm(20) > mean(weight)', null],
  ['The p.adjust(p) of R was used.', null],
]

test.each(COMMANDS)('%s puts out %s p-values', (command, scale) => {
  expect(readCommand(command)?.scale ?? null).toBe(scale)
})

const small = { size: 8 }
const readPage = (...runs: Parameters<typeof page>[0][]) =>
  read(layOut(document(page(runs.flat()))), null, defaultHouseRules).reports.map(
    ({ relation, value, decimals, scale, place }) =>
      `${relation} ${value}/${decimals} ${scale} ${place.source}`,
  )

test('a printed vector of p-values is read, the quantile printed beside it is not', () => {
  const reports = readPage(
    prose(12, 60, 760),
    block(['R> qperm(test, 0.95)'], 60, 590),
    block(['[1] 0.814126'], 60, 574, small),
    block(['R> pvalue(independence(weight ~ site, data = snails,', '+     subset = males))'], 60, 556),
    block(['[1] 0.09060652 3.169418e-06', '[3] 0.5'], 60, 528, small),
    prose(12, 60, 500),
  )
  expect(reports).toEqual(['= 0.09060652/8 raw text', '= 0.000003169418/12 raw text', '= 0.5/1 raw text'])
})

test('of two matrices, statistics and adjusted p-values, only the second is p-values', () => {
  const heads = ['growth', 'survival', 'colour'] as const
  const matrix = (top: number, rows: readonly (readonly string[])[]) => [
    ...row(
      heads.map((head, i) => [head, 120 + i * 80] as const),
      top,
      small,
    ),
    ...rows.flatMap((cells, r) =>
      row(
        cells.map((cell, i) => [cell, i === 0 ? 60 : 40 + i * 80] as const),
        top - 10 * (r + 1),
        small,
      ),
    ),
  ]
  const reports = readPage(
    prose(10, 60, 760),
    block(['R> statistic(test, type = "standardized")'], 60, 620),
    matrix(606, [
      ['reef', '0.33', '0.18', '0.26'],
      ['bank', '0.75', '0.11', '0.15'],
      ['creek', '0.08', '0.28', '0.42'],
    ]),
    block(['R> pvalue(test, method = "single-step")'], 60, 552),
    matrix(538, [
      ['reef', '0.1359', '0.1895', '0.9999'],
      ['bank', '0.0001', '0.0034', '1.0000'],
      ['creek', '<0.0001', '<0.0001', '0.9986'],
    ]),
    prose(10, 60, 480),
  )
  expect(reports).toHaveLength(9)
  expect(reports.every((report) => report.endsWith('adjusted pdf-table'))).toBe(true)
  expect(reports).toContain('< 0.0001/4 adjusted pdf-table')
  expect(reports).toContain('= 0.1895/4 adjusted pdf-table')
})
