import type { Written } from './write-line'

/**
 * Characters whose reading depends on their neighbours. A dash that is a sign becomes '-'; one that stands
 * between numbers, words or names stays '–'. A raised decimal point becomes '.'. Soft hyphens disappear.
 */
export function normalise(written: Written): Written {
  let { text, origins } = written
  const drop = (found: number) => {
    text = text.slice(0, found) + text.slice(found + 1)
    origins = [...origins.slice(0, found), ...origins.slice(found + 1)]
  }
  for (let at = text.indexOf('\u00ad'); at >= 0; at = text.indexOf('\u00ad')) drop(at)
  // "= – 2.46": a space between a sign and its number
  for (
    let found = /[=<>≤≥(] ?[–-] (?=[\d.]*\d)/.exec(text);
    found;
    found = /[=<>≤≥(] ?[–-] (?=[\d.]*\d)/.exec(text)
  )
    drop(found.index + found[0].length - 1)
  text = text
    // "0·03", not "5·10^-8"
    .replace(/(?<=\d)[·∙•](?=\d)(?!10\^)/g, '.')
    .replace(/(?<![\d\p{L}])[·∙](?=\d{2})/gu, '.')
    // "= –2.46", "(–2.46", "10^–5": a sign
    .replace(/(?<=(?:^|[=<>≤≥([,;:/] ?|\s|\^))–(?=\.?\d)/g, '-')
    .replace(/[∼˜]/g, '~')
  return { text, origins }
}
