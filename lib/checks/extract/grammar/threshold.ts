import type { SectionKind } from '../../types'
import type { PrintedP } from './p-value'

/** What the sentence around a printed p-value makes of it. */
export type Setting = { text: string; section: SectionKind; caption: boolean; linked: boolean }

/** Levels that are set by convention and not by dividing one. */
const CONVENTIONAL = new Set([0.1, 0.05, 0.025, 0.01, 0.005, 0.001, 0.0005, 0.0001])

/** 'P < 0.05 was considered …', 'P < 0.0083 (0.05/6) was required', 'p ≤ .05 indicated statistical significance'. */
const SET_AFTER =
  /^(?:\s?\/\s?\d+[^a-z]{0,25})?(?:\s*\([^)]*\))?(?:\s(?!was|were|is|are|as|to|being|indicat|denot|represent|signif)[\w-]+){0,8}\s(?:(?:was|were|is|are|as|to be|being)\s(?:\w+\s){0,3}?(?:considered|regarded|taken|deemed|accepted|defined|chosen|required|assumed|adopted|interpreted|judged|treated|set|used|declared|counted|called|reported|significan\w+|statistically|evidence|indicati(?:ve|ng))|(?:indicat|denot|represent)(?:ed|es)\s(?:a\s)?(?:\w+\s){0,2}significan\w*|signif(?:ied|ies))/i

/** 'at the p < .05 level', 'P<0.01 significance level', 'p < .001 as the threshold'. */
const LEVEL_AFTER =
  /^\)?\s*(?:(?:significance|probability|confidence|alpha)?[\s-]?(?:level|threshold|criterion|cut-?off)\b|as (?:the|a|our)\s(?:\w+\s){0,3}(?:level|threshold|criterion|cut-?off|limit))/i

/** 'threshold of P < …', 'significance level was p < …', 'alpha set at P = …', 'cut-off (P < …'. */
const LEVEL_BEFORE =
  /\b(?:levels?|thresholds?|cut-?offs?|criteri(?:on|a)|alpha|limits?|boundary)\b(?:\s(?:of|for|at|was|were|is|set|to|the|as|a|an|being|fixed|used|chosen|taken|and|considered|statistical|significance|significant|in|all|tests?|analyses|comparisons?|corrected|adjusted|Bonferroni|individual|each)|[\s,:(=])*(?:i\.e\.,?\s)?$|α(?:\s?(?:was|=|of|at|set|level|[\d./=]+)){0,4}[\s(,]*$/i

/** 'were considered significant at P<0.05', 'significance was set at', 'accepted when', 'declared significant when the adjusted'. */
const SET_BEFORE =
  /\b(?:considered|regarded|accepted|deemed|defined|declared|set|taken|judged|assumed|adopted|interpreted|established|fixed|recogni[sz]ed|denoted|indicated|inferred|concluded|determined)\b[^.;()]{0,70}?\b(?:at|as|if|when|whenever|where|for|by|with|to|using|of|below|only|than)\b(?:\s(?:the|a|an|its|their|adjusted|corrected|two-sided|two-tailed|associated|nominal|level|of|resulting|found|was|were|is))*[\s(,:]*(?:[a-z]+\s)?$/i

/** 'significant if P', 'significance: P', 'significant differences when the adjusted p', 'significance required'. */
const IF_BEFORE =
  /significan\w+[^.;()]{0,50}?(?:\b(?:if|when|whenever|only if|unless|required|requires|means|meant|implies|defined as|as)\b|:)\s*(?:the\s+)?(?:[\w-]+\s){0,4}$/i

/** Methods: 'Tukey's test (p<0.05) was used', 'were separated by LSD at P < 0.05', 'compared at p <'. */
const TEST_AT =
  /\b(?:tests?|anova|analysis|lsd|procedure|method|range|compar(?:ed|isons?)|separated|tested|analy[sz]ed|performed|conducted|evaluated|assessed)\b[^.;]{0,60}?(?:\bat\b(?:\s(?:the|a|level|of|significance))*\s*|\()$/i

/** 'sample size', 'power of 80 %', 'to detect': a calculation made before the study. */
const POWER =
  /sample[\s-]size|\bpower(?:ed)?\s(?:of|to|analys|calculat|was|at)|\b[89]\d\s?%\s(?:statistical\s)?power|\ba priori power/i

/** Marks straight before the letter: '* p', '**P', '#p', '†, P', '***, p'. */
const MARK_BEFORE =
  /(?:^|[\s,;(:.\])–])(?:[*†‡#§¶$&@+^]{1,5}|\^?\{?[*†‡#§]{1,4}\}?)\s?[,:=]?\s?(?:(?:adjusted|corrected)\s)?$/
/** Letters and words as marks: 'a = p', 'b: p', 'x indicates p', 'a , significant differences (p', 'ns, p', 'ns = not significant (p', 'significant at'. */
const LETTER_BEFORE =
  /(?:^|[\s,;(.)])(?:(?:\^?\{?[a-eA-Ex-z]\}?|ns|NS|n\.s\.)(?:\s?[=:]\s?|\s(?:indicates?|denotes?|represents?|means?)\s(?:[a-z]+\s){0,4}\(?(?:at\s)?|\s?,\s(?:significant|different|not significant)[^.;(]{0,40}\()|(?:asterisks?|stars?|symbols?|crosses|letters?)(?:\s?[=:]\s?|\s?(?:indicat|denot|represent|mean|signif)\w*\s(?:[a-z]+\s){0,4}\(?(?:at\s)?))$/
/** 'Means with different letters differ significantly at P', 'different superscripts in the same row … at P'. */
const LETTERS =
  /\b(?:(?:different|same|common|unlike|dissimilar|distinct|various|lower-?case|small|capital)\s(?:\w+\s)?(?:letters?|superscripts?)|letters?\b|superscripts?\b|asterisks?\b|in (?:a|the same|each) (?:row|column)|within (?:a|the same|each|rows?|columns?))[^.]{0,120}(?:differ|significan|at|\()[^.]{0,40}$/i

/** 'Significant correlations (p < 0.05) are shown in bold', 'p < .01 are listed', 'are marked by asterisks'. */
const SHOWN_AFTER =
  /^\)?[^.;()]{0,40}?\s(?:are|were|is)\s(?:shown|printed|marked|highlighted|listed|displayed|set|given|denoted|indicated|represented|coloured|colored)\b/i

/** Whether the printed value is a level that results are held against, and no result. */
export function isThreshold(p: PrintedP, { text, section, caption, linked }: Setting): boolean {
  if (linked || p.markOnly) return false
  const before = text.slice(0, p.start)
  const after = text.slice(p.end)
  const bound = p.relation === '<' || p.relation === '<='
  const alone = /\(\s*$/.test(before) && /^\s*\)/.test(after)
  if (POWER.test(text) && CONVENTIONAL.has(p.value)) return true
  if (!alone && (bound || p.relation === '=') && SET_AFTER.test(after)) return true
  if (/^\s?\/\s?\d/.test(after)) return true
  if (!bound && p.relation !== '=') return false
  if (LEVEL_AFTER.test(after) && CONVENTIONAL.has(p.value)) return true
  if (LEVEL_BEFORE.test(stripWords(before))) return true
  if (!bound) return false
  if (FOR_SIGNIFICANCE.test(after)) return true
  if (SET_BEFORE.test(before) || IF_BEFORE.test(before)) return true
  if (/^\)?\s(?:was|were)\s(?:considered|regarded|required|accepted|taken|set|used)\b/.test(after))
    return true
  const planned = section === 'methods' || caption
  // 'variables with P < 0.10 were entered', 'the hypothesis was rejected at p < .05'
  if (section === 'methods' && !alone && CONVENTIONAL.has(p.value) && !p.plural) return true
  if (
    planned &&
    CONVENTIONAL.has(p.value) &&
    (TEST_AT.test(before) || (section === 'methods' && /significan|differen/i.test(text)))
  )
    return true
  // 'significant at P < 0.0125 after correction for four tests'
  return (
    isDivided(p) &&
    /\bat\s(?:the\s)?(?:\w+\s)?$/.test(before) &&
    /correct|adjust|bonferroni|significan|tested|contrast|comparison|judged/i.test(text)
  )
}

/** Whether it explains marks or letters in a figure or table. */
export function isLegend(p: PrintedP, { text, caption, linked }: Setting): boolean {
  if (linked || p.markOnly || p.relation === '=') return false
  const before = text.slice(0, p.start)
  if (MARK_BEFORE.test(before) || LETTER_BEFORE.test(before)) return true
  if (SHOWN_AFTER.test(text.slice(p.end))) return true
  const bound = p.relation === '<' || p.relation === '<='
  if (bound && CONVENTIONAL.has(p.value) && LETTERS.test(before)) return true
  // in captions, a bare bound that is no parenthesis after a statement: 'p < 0.05 vs control'
  return caption && bound && CONVENTIONAL.has(p.value) && !/\(\s*$/.test(before)
}

/** alpha / m for a whole m and no convention: .0083, .0125, .0167, .008. */
function isDivided(p: PrintedP): boolean {
  if (CONVENTIONAL.has(p.value) || p.value <= 0 || p.value >= 0.05) return false
  return [0.05, 0.01].some((alpha) =>
    Array.from({ length: 199 }, (_, i) => i + 2).some(
      (m) => Math.abs(alpha / m - p.value) <= 0.5 * 10 ** -p.decimals,
    ),
  )
}

/** 'P < 5 × 10-8 for genome-wide significance', 'p < .005 (0.05/10) as evidence of significance' */
const FOR_SIGNIFICANCE = /^\s?(?:\([^)]*\)\s)?(?:for|as)\s(?:[\w-]+\s){0,4}significance\b/i

/** Words that stand between the level and the letter: 'adjusted', 'a Bonferroni-corrected'. */
function stripWords(before: string): string {
  return before.replace(
    /(?:\b(?:a|an|the|adjusted|corrected|two-sided|two-tailed|nominal|uncorrected|overall|conventional)\s)+$/i,
    '',
  )
}
