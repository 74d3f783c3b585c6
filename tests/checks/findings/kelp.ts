import { sayPairs, type Row } from '../../support/manuscript'

/** t(36) of the six pairs of four substrates with raw p and six times it, computed with lib/checks (held to R there). */
export const substrates = ['granite', 'slate', 'concrete', 'plastic'] as const
const pairs = [
  ['Granite', 'slate', '0.52', '.606', 1],
  ['Granite', 'concrete', '2.43', '.020', 0.1213],
  ['Granite', 'plastic', '3.31', '.002', 0.0128],
  ['Slate', 'concrete', '1.97', '.057', 0.3394],
  ['Slate', 'plastic', '2.84', '.007', 0.0443],
  ['Concrete', 'plastic', '1.12', '.270', 1],
] as const

export type Telling = {
  /** The printed p of a pair: 'raw', six times it, or what is given in the order of the pairs. */
  print: 'raw' | 'bonferroni' | readonly string[]
  /** Which pairs are called significant, by their place in the order. */
  called: readonly number[]
  statistics?: boolean
  only?: readonly number[]
}

/** The results of the six pairs as text. */
export function tellPairs({ print, called, statistics = true, only }: Telling): string {
  const rows = pairs.map(([a, b, t, raw, six], i): Row => {
    const p = print === 'raw' ? raw : print === 'bonferroni' ? six.toFixed(3) : (print[i] ?? raw)
    return [
      a,
      b,
      statistics ? `t(36) = ${t}` : '',
      /^[<>=]/.test(p) ? `p ${p}` : `p = ${p}`,
      called.includes(i),
    ]
  })
  return sayPairs('attachment strength', only ? rows.filter((_, i) => only.includes(i)) : rows)
}

export function kelp(methods: string, results: string): string {
  return `# Abstract
    Kelp was grown on four substrates.
    # Methods
    Attachment strength of kelp was measured on granite, slate, concrete and plastic, ten plants each. ${methods}
    # Results
    ${results}
    # Discussion
    Kelp holds best on rough ground.`
}

export const claim =
  'All six pairs of substrates were compared with t tests, and p values were Bonferroni-corrected for six comparisons. Adjusted values below .05 were regarded as significant.'
export const level =
  'All six pairs of substrates were compared with t tests; with Bonferroni correction for six comparisons p < .0083 (.05/6) was regarded as significant.'
