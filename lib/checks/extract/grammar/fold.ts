/** Characters that stand for another one, each of length one so that offsets stay. */
const STANDS_FOR: Record<string, string> = {
  '\u2212': '-',
  '\u2010': '-',
  '\u2011': '-',
  '\ufe63': '-',
  '\uff0d': '-',
  '\u2014': '–',
  '\u2012': '–',
  '\u2a7d': '≤',
  '\u2266': '≤',
  '\u2a7e': '≥',
  '\u2267': '≥',
  '\uff1d': '=',
  '\uff1c': '<',
  '\uff1e': '>',
  '\u2018': "'",
  '\u2019': "'",
  '\u00b4': "'",
  '\u02bc': "'",
  '\u0060': "'",
  '\u03a7': 'χ',
  '\u03f0': 'k',
  '\u00b5': 'μ',
  '\u22c5': '·',
  '\u2219': '·',
  '\u2022': '·',
  '\u2217': '*',
  '\u2715': '×',
  '\u2a2f': '×',
}

const PLAIN_DIGIT = new Map(
  ['⁰¹²³⁴⁵⁶⁷⁸⁹', '₀₁₂₃₄₅₆₇₈₉', '０１２３４５６７８９'].flatMap((digits) =>
    [...digits].map((digit, i) => [digit, String(i)] as const),
  ),
)

/** Plain characters alone, which stand for themselves: 'A vs B', '0.032*'; a tab and a back quote do not. */
const PLAIN = /^[\x20-\x5f\x61-\x7e]*$/

/**
 * The text in plain characters, same length as before: one minus, one dash, plain spaces, plain digits for
 * superscript and subscript ones, a point for the middle dot between digits ('0·03'), letters for the
 * mathematical italics ('𝑝'). Every offset into the result is an offset into `text`.
 */
export function fold(text: string): string {
  if (PLAIN.test(text)) return text
  return (
    text
      // mathematical italic and sans letters, 𝐀 … 𝟿: the letter and a blank for the second half
      .replace(/\ud835[\udc00-\udfff]/g, (pair) => pair.normalize('NFKC').padEnd(2).slice(0, 2))
      // a superscript footnote digit straight after a decimal, 0.03²
      .replace(/(?<=[.,·]\d{1,4})[⁰¹²³⁴-⁹]/g, ' ')
      .replace(/[⁰¹²³⁴-⁹₀-₉０-９]/g, (digit) => PLAIN_DIGIT.get(digit) ?? digit)
      .replace(/[⁻₋]/g, '-')
      .replace(/[−‐‑﹣－—‒⩽≦⩾≧＝＜＞‘’´ʼ`Χϰµ⋅∙•∗✕⨯]/g, (c) => STANDS_FOR[c] ?? c)
      .replace(/[\u00a0\u2000-\u200b\u202f\u205f\u3000\u00ad\ufeff\t]/g, ' ')
      // the middle dot as a decimal point, 0·03 and ·03, but not as a sign of multiplication, 5·10-8
      .replace(/(?<![\d)]\s?)·(?=\d)|(?<=\d)·(?=\d)(?!·?10\s?[\^-])/g, '.')
      .replace(/·(?=\s?10\s?[\^-])/g, '×')
      // the equals sign of older typesetting, p ¼ .03
      .replace(/(?<=[A-Za-z)\]\d]\s?)¼(?=\s?[-.\d])/g, '=')
  )
}
