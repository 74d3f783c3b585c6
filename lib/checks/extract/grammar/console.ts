import type { Scale } from '../../vocabulary'

/** 'pvalue(it, method = "single-step")', 'p.adjust(p, "holm")', 'fit$p.value', 'pairwise.t.test(…)$p.value', 'multipletests(p)[1]'. */
const GIVES_P =
  /(?:^|[^\w.])(?:p_?values?|p\.values?|p\.adjust|p_?adjust|padjust|multipletests)\s*\(|[$.]p_?\.?(?:values?|adj(?:usted)?)\b(?!\s*[(=])/i

/** 'p.adjust(', 'method = "single-step"', 'adjust = "tukey"', '$p.adj'; not 'method = "none"', not a test's own method. */
const ADJUSTS =
  /p\.?_?adj|multipletests|method\s*=\s*["'](?:single-step|step-down|free|discrete|bonferroni|holm|hochberg|hommel|bh|by|fdr|sidak)/i

/**
 * What a command typed at a prompt puts out, as far as that are p-values and nothing else: their scale; null for any
 * other command. Only the last command of several counts.
 */
export function readCommand(text: string): { scale: Scale } | null {
  const commands = text.split(/(?:^|\s)(?:R>|>>>|In \[\d+\]:|>(?=\s+[A-Za-z.][\w.$]*\s*(?:<-|\(|\$)))\s*/)
  const last = commands.at(-1)?.trim() ?? ''
  // what is put into a variable is not shown
  if (commands.length < 2 || /^[\w.$]+\s*(?:<-|=(?!=))/.test(last) || !GIVES_P.test(last)) return null
  return { scale: ADJUSTS.test(last) ? 'adjusted' : 'raw' }
}
