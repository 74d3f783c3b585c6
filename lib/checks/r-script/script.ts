import { audit } from './functions/audit'
import { checking } from './functions/checking'
import { dunnett } from './functions/dunnett'
import { families } from './functions/families'
import { fitting } from './functions/fitting'
import { ordered } from './functions/ordered'
import { procedures } from './functions/procedures'
import { ranges } from './functions/ranges'
import { studentizedRange } from './functions/studentized-range'
import { tails } from './functions/tails'
import { rComment } from './literals'

/**
 * The stretches of R that a script is put together from, in the order in which they are defined there. `needs`: others
 * that it calls. Base R only; where Dunnett's test is used, mvtnorm serves as a second witness if it is installed.
 */
const LIBRARY = {
  checking: { needs: [], text: checking },
  ranges: { needs: [], text: ranges },
  tails: { needs: ['ranges'], text: tails },
  'studentized-range': { needs: [], text: studentizedRange },
  dunnett: { needs: ['checking', 'studentized-range'], text: dunnett },
  procedures: { needs: [], text: procedures },
  ordered: { needs: [], text: ordered },
  families: { needs: ['ranges', 'procedures', 'studentized-range'], text: families },
  fitting: { needs: ['ranges', 'procedures', 'families'], text: fitting },
  audit: { needs: ['ranges', 'tails', 'families', 'fitting'], text: audit },
} as const satisfies Record<string, { needs: readonly string[]; text: string }>

export type RFunctions = keyof typeof LIBRARY

/**
 * A whole R script. `title` and `facts` go into comments at its head, one line each, made harmless; `functions` names
 * the stretches of the library that `body` calls (what these need is added, and 'checking' always); `body` is R.
 *
 * In the body, `check(what, shown, computed, tolerance)` holds a number that Assize shows against the one that R
 * computes: vectors of the same length, NA for what is not shown, relative tolerance 1e-8 by default. At the end the
 * script prints "agrees", or each difference on a line of its own, and ends with status 1 where there is one.
 */
export function writeScript(script: {
  title: string
  facts: readonly string[]
  functions: readonly RFunctions[]
  body: string
}): string {
  const used = listUsed(script.functions)
  return [
    rComment(script.title),
    ...script.facts.map(rComment),
    '#',
    '# Run it with: Rscript FILE, or source() it. It needs R 4.0 or later and no package. It computes every number',
    '# again from the printed ones and prints "agrees", or each number that differs. With verbose <- TRUE it prints',
    '# every number.',
    '',
    'verbose <- FALSE',
    '',
    ...Object.entries(LIBRARY).flatMap(([name, { text }]) => (used.has(name) ? [`${text.trim()}\n`] : [])),
    '# ---- what is checked ----',
    '',
    script.body.trim(),
    '',
    'finish()',
    '',
  ].join('\n')
}

function listUsed(functions: readonly RFunctions[]): Set<string> {
  const used = new Set<string>(['checking'])
  const add = (name: RFunctions) => {
    if (used.has(name)) return
    used.add(name)
    for (const needed of LIBRARY[name].needs) add(needed)
  }
  functions.forEach(add)
  return used
}
