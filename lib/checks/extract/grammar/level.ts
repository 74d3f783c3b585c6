import { findDivision } from './counts'
import { parseNumber } from './number'

/** A level as printed: '.05', '0.05', '0,05', '5%', '5 %', '5 per cent', '1.7 × 10-4'. */
const LEVEL = String.raw`(?<level>0?[.,]\d+(?:\s?[×x]\s?10\s?\^?\{?-\s?\d+\}?|e-\d+)?|\d(?:\.\d+)?\s?[×x]\s?10\s?\^?\{?-\s?\d+\}?|\d{1,2}(?:\.\d+)?\s?(?:%|per\s?cent))`

const FILL = String.raw`(?:\s(?:level|value|of|was|were|is|being|to|at|set|fixed|a|an|the|statistical|significance|type I|error|rate|for|all|each|tests?|analyses|two-sided|two-tailed|chosen|used|as|be|accepted|defined|taken|established|individual|comparisons?|per|test|considered|P|p|equal|α|alpha|less|than|or|statistically|significant|this|study|in|our|throughout|overall|an?|kept|held|adopted|assumed|specified|determined|results?|both|nominal|and|by|convention|probability|value)\b|[\s,:()=<≤α])*?\s?`

/** Forms that state the general level, each with what it is for. */
const GENERAL: readonly RegExp[] = [
  // 'α = .05', 'alpha of 5 %', 'alpha was set at .05', 'α level of 0.05', '(α: .05)'
  new RegExp(
    String.raw`(?:α|\balpha\b)${FILL}(?:=|<|≤|:|\bof\b|\bat\b|\bto\b|\bwas\b|\bis\b|\s)\s?${LEVEL}`,
    'i',
  ),
  // 'significance level of 0.05', 'level of significance was 5%', 'statistical significance was set at p ≤ .05', 'significance was accepted at P < 0.05'
  new RegExp(
    String.raw`\bsignifican(?:ce|t)\b${FILL}(?:=|<|≤|:|\bof\b|\bat\b|\bto\b|\bwas\b|\bis\b|\bthan\b|\bif\b|\bwhen\b|\bbelow\b)\s?(?:the\s|a\s|an\s)?(?:two-sided\s|adjusted\s|corrected\s)?(?:[pP](?:[\s-]?values?)?\s?(?:of\s|was\s|is\s|were\s|found\s[pP]\s?)?)?(?:less than\s|below\s|under\s|smaller than\s|equal to or less than\s)?[<≤=]?\s?${LEVEL}`,
    'i',
  ),
  // 'P < 0.05 was considered significant', 'p-values below .05 were regarded as significant', 'P values equal to or less than 0.05 were considered'
  new RegExp(
    String.raw`\b[pPq](?:[\s-]?values?)?\s?(?:of\s)?(?:[<≤]|(?:of\s)?(?:less than|below|under|smaller than|lower than|equal to or less than|less than or equal to)|=)\s?(?:or equal to\s)?[<≤]?\s?${LEVEL}(?=[^.;]{0,80}\b(?:considered|regarded|taken|deemed|accepted|defined|significan|required|judged|declared|indicat))`,
    'i',
  ),
  // 'at the 5% level', 'a 5 % significance level', 'the .05 level of significance', 'at 5% significance'
  new RegExp(
    String.raw`\b(?:at|a|an|the|used)\s(?:the\s|a\s)?(?:nominal\s|two-sided\s|conventional\s|overall\s)?${LEVEL}\s?(?:level|significance|alpha|probability level|confidence level of)`,
    'i',
  ),
  // 'Differences with P below 0.05 are called significant', 'compared with 0.05', 'significant if below 0.05', 'values below 0.05'
  new RegExp(
    String.raw`\b(?:below|compared with|compared to|held against|less than|smaller than|under)\s(?:the level of\s)?${LEVEL}(?![\d/]|\s?(?:[kcmμn]?[mgLsNWVJ]|[kM]?Pa|°\s?C|h|min)\b)`,
    'i',
  ),
  // 'error rate at 5%', 'overall error at 5%', 'false discovery rate … controlled at 0.05', 'q < 0.05'
  new RegExp(String.raw`\b(?:error|rate)\b[^.;]{0,60}?\b(?:at|of|to|below|<)\s?${LEVEL}`, 'i'),
]

/** 'Cronbach's α = .81', power and reliability, confidence, and effect sizes are no levels. */
const NO_LEVEL = /cronbach|reliab|internal consistency|mcdonald|coefficient alpha/i

/** Every printed level has one of these: '.05', '5 %', '5 per cent', '2 × 10-4'; a sentence without is not searched. */
const HAS_LEVEL = /[.,]\d|\d\s?(?:%|per\s?cent|[×x]\s?10)/i

/** What may be a level: above 0, at most 0.2. */
export function toLevel(printed: string): number | null {
  const percent = /%|per\s?cent/i.test(printed)
  const parsed = parseNumber(printed.replace(/\s?(?:%|per\s?cent)/i, ''))
  if (!parsed) return null
  const value = percent ? Number((parsed.value / 100).toPrecision(12)) : parsed.value
  return value > 0 && value <= 0.2 ? value : null
}

/** The general level of significance that a sentence states; null where it states none or only a divided one. */
export function findAlpha(text: string): number | null {
  if (!HAS_LEVEL.test(text) || NO_LEVEL.test(text)) return null
  const division = findDivision(text)
  if (division) return division.alpha
  for (const form of GENERAL) {
    const level = toLevel(form.exec(text)?.groups?.level ?? '')
    if (level !== null) return level
  }
  return null
}

/** '= 0.0083', ', i.e., 0.01', '≈ .008', '(0.0167)', ' or .0125', ', rounded to 0.008' after a division. */
const QUOTIENT =
  /^\s?\)?\s*(?:=|≈|~|,?\s?\(?\s?i\.?\s?e\.?,?|,?\sthat is,?|,?\sor|,?\s?rounded (?:up |down )?to|,?\swhich (?:is|gives)|,?\sgiving|\()\s*(?:to\s|P\s?<\s?|p\s?<\s?|about\s|approximately\s)?(?<level>0?[.,]\d+(?:\s?[×x]\s?10\s?\^?-\s?\d+|e-\d+)?|\d(?:\.\d+)?\s?[×x]\s?10\s?\^?-\s?\d+)/i
/** 'P < 0.0083 (0.05/6)', 'threshold of 0.0083 (0.05/6)' before a division. */
const BEFORE_DIVISION =
  /(?<level>0?[.,]\d+(?:\s?[×x]\s?10\s?\^?-\s?\d+|e-\d+)?|\d(?:\.\d+)?\s?[×x]\s?10\s?\^?-\s?\d+)\s?\(\s?(?:[^()]{0,30}?[\s=])?$/

/** Levels set for single tests: 'level was lowered to 0.008', 'adjusted alpha of 0.0167', 'corrected threshold of P < 1.7 × 10-4', 'α was set at 0.0083', 'P < 0.0125 after correction'. */
const LOWERED: readonly RegExp[] = [
  new RegExp(
    String.raw`\b(?:levels?|alpha|thresholds?|criterion|cut-?off|limit)\b[^.;]{0,70}?(?:\bof\b|\bto\b|\bat\b|\bwas\b|\bis\b|=|<|≤)\s?(?:(?:a|the)\s)?(?:[pP]\s?[<≤=]\s?)?${LEVEL}`,
    'i',
  ),
  new RegExp(String.raw`α[^.;]{0,40}?(?:\bof\b|\bto\b|\bat\b|\bwas\b|=|<)\s?${LEVEL}`, 'i'),
  new RegExp(
    String.raw`\b[pP](?:[\s-]?values?)?\s?(?:[<≤]|below|less than|of less than|under)\s?${LEVEL}`,
    'i',
  ),
  new RegExp(
    String.raw`\b(?:compared with|held against|significant (?:if|when) (?:it was |they were )?(?:below|less than|under)|below)\s?${LEVEL}`,
    'i',
  ),
]

/**
 * The level that single tests are held against by the sentence's own words, as printed where it is printed, else
 * the quotient itself ('0.05/6' alone gives 0.00833…); null where no level is stated.
 */
export function findThreshold(text: string): number | null {
  const division = findDivision(text)
  if (division) {
    const printed =
      QUOTIENT.exec(text.slice(division.end))?.groups?.level ??
      BEFORE_DIVISION.exec(text.slice(0, division.start))?.groups?.level
    const level = toLevel(printed ?? '')
    if (level !== null) return level
    return division.alpha === null ? null : division.alpha / division.m
  }
  if (!HAS_LEVEL.test(text)) return null
  for (const form of LOWERED) {
    const level = toLevel(form.exec(text)?.groups?.level ?? '')
    if (level !== null) return level
  }
  return null
}
