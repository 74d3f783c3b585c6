import type { ReadClaim, SectionKind } from '../../types'
import type { Scale } from '../../vocabulary'
import { COUNT } from './number'

/** 'No Bonferroni …', 'without Holm', 'instead of Tukey', 'rather than Bonferroni', 'not using', 'did not apply the Bonferroni'. */
const DENIED_BEFORE =
  /(?:\b(?:no|without|instead of|rather than|unlike|in place of|other than|in contrast to|as opposed to)|(?:\bnot|n't|\bnever)\s(?:us\w+|appl\w+|employ\w*|perform\w*|mak\w+|correct\w*|adjust\w*|carry out|conduct\w*|follow\w*|have|been|be)(?:\s(?:by|with|using|for))?)\s+(?:(?:a|an|the|any|formal|further|additional|such|multiple|using|with|for|by|of|use|classical|strict|more|less|conservative|overly)\s+)*$/i
/** '… was not used', '… correction was not applied', '… were not needed'. */
const DENIED_AFTER =
  /^[^.;,]{0,50}?\b(?:was|were|is|are|has been|have been)\s(?:not|never|deliberately not)\s(?:\w+\s)?(?:us\w+|appl\w+|made|perform\w*|done|need\w*|necessary|appropriate|employ\w*|conduct\w*|required|chosen|considered)/i
/** 'would have required', 'might be', 'a reader could apply'. */
const HYPOTHETICAL = /\b(?:would|might|could have|could be|if we had|had we|were to)\b/i
/** 'such as Bonferroni', 'e.g. Holm', 'including', 'like'; and general talk: 'is known to be conservative', 'the Bonferroni inequality'. */
const EXAMPLE_BEFORE =
  /(?:\bsuch as|\be\.g\.,?|\blike|\bfor example,?|\bfor instance,?)\s+(?:the\s)?(?:\w+\s(?:or|and)\s)?$/i
const GENERAL_TALK =
  /\b(?:is|are)\s(?:\w+\s)?(?:known|often|usually|generally|widely|commonly|sometimes|frequently|overly|too|considered|simple|more powerful|less powerful|conservative|popular)\b|\b(?:inequality|textbooks?|in general|many authors|some authors|readers? (?:who|may|can|might))\b/i

/** The paper's own doing: 'we', 'our', 'in this study', 'here'. */
const OWN =
  /\b(?:we|our|us|here|this (?:study|paper|work|trial|report|article)|the present|these data|in both experiments)\b/i
/** 'after correction', 'survived', 'remained significant', 'corrected P', 'post hoc': its own results, even in a discussion. */
const OWN_RESULT =
  /\b(?:after|survived?|remained|withstood|following|with)\s(?:\w+\s){0,3}(?:correct|adjust)|\bpost[\s-]?hoc|\b(?:was|were) (?:\w+ )?(?:compared|adjusted|corrected|used|applied|performed|tested|followed|analy[sz]ed|controlled|multiplied)/i

/** Whether naming a procedure at `start`–`end` of the sentence claims that it was used here. */
export function isOwnUse(text: string, start: number, end: number, section: SectionKind): boolean {
  const before = text.slice(0, start)
  const after = text.slice(end)
  if (section === 'references' || section === 'title') return false
  if (DENIED_BEFORE.test(before) || DENIED_AFTER.test(after)) return false
  if (EXAMPLE_BEFORE.test(before)) return false
  const near = `${before.slice(-80)} ${after.slice(0, 80)}`
  if (
    HYPOTHETICAL.test(near) &&
    !/\bwould (?:be|have been) (?:considered|regarded|declared|taken)/i.test(near)
  )
    return false
  if (section === 'introduction') return OWN.test(text) && !GENERAL_TALK.test(text)
  if (section === 'discussion') return (OWN.test(text) || OWN_RESULT.test(text)) && !GENERAL_TALK.test(text)
  return !(GENERAL_TALK.test(text) && !OWN.test(text) && !OWN_RESULT.test(text))
}

const MULTIPLE = String.raw`(?:multipl(?:e|icity)[\s-]*(?:\w+[\s-]){0,2}?(?:comparison|test|hypothes|contrast|outcome|end-?\s?point|look|inference|analys)\w*|multiplicity|multiple\b(?=\s?[.,;)]|$)|the (?:total )?number of (?:\w+\s){0,2}(?:comparisons|tests|contrasts|outcomes|hypotheses|analyses|SNPs|ROIs|regions)|repeated testing|family-?wise error|type[\s-]I error|alpha inflation)`

/** 'corrected for multiple comparisons', 'adjustment for multiplicity', 'to account for multiple testing', 'multiplicity-adjusted'. */
const CORRECTED = new RegExp(
  String.raw`\b(?:correct(?:ed|ion|ions|ing)?|adjust(?:ed|ment|ments|ing)?|account(?:ed|ing)?|allow(?:ed|ance|ing)?|control(?:led|ling)?|compensat\w+)\b(?:\s(?:\w+\s){0,3}?)(?:for|of)\s(?:the\s)?(?:${MULTIPLE}|${COUNT}\s(?:\w+\s){0,2}?(?:comparisons|tests|contrasts|outcomes|hypotheses))|multiplicity[\s-](?:adjusted|corrected)|multiple[\s-](?:comparison|testing)s?[\s-](?:correct|adjust)\w*`,
  'i',
)
/** 'all p-values are adjusted', 'P values in this report are corrected in this manner', 'adjusted p-values are given', 'adjusted P'. */
const P_CORRECTED =
  /\b[pP][\s-]?values?\b[^.;]{0,60}?\b(?:are|were|have been|is|was)\s(?:\w+\s)?(?:corrected|adjusted)(?!\s(?:for|to)\s(?!multipl|the number|\w+ (?:comparisons|tests)))|\b(?:corrected|adjusted)\s[pP][\s-]?values?\b/i

/** 'no adjustment for multiple comparisons was made', 'without correction for multiplicity', 'P values were not adjusted for'. */
const NONE: readonly RegExp[] = [
  new RegExp(
    String.raw`\b(?:no|without(?:\sany)?|nor|lack of|absence of)\s(?:\w+\s){0,2}?(?:adjust\w*|correct\w*|allowance|control)\b(?:[^.;]{0,40}\b${MULTIPLE}|\s(?:was|were|has been|is)\s(?:\w+\s)?(?:made|applied|performed|used|done|needed|carried|attempted|undertaken|necessary))`,
    'i',
  ),
  new RegExp(
    String.raw`(?:\bnot|n't|\bnever)\s(?:\w+\s){0,2}?(?:adjust\w*|correct\w*|control\w*|account\w*|allow\w*)\b(?:\s(?:\w+\s){0,3}?for\s(?:the\s)?${MULTIPLE}|\s?(?:[.;,)]|$))`,
    'i',
  ),
  /\b(?:unadjusted|uncorrected)\s(?:for\s(?:multipl\w+|the number)|[pP][\s-]?values?\b)|\b[pP][\s-]?values?\s(?:are|were)\s(?:\w+\s){0,2}?(?:nominal|unadjusted|uncorrected|descriptive|not (?:adjusted|corrected))/i,
  // 'each test was made at the 5% level'
  /\b(?:each|every|all)\s(?:\w+\s){0,2}?(?:tests?|comparisons?)\s(?:was|were)\s(?:\w+\s){0,2}?(?:made|performed|carried out|done|conducted|run|tested|judged|evaluated)\s(?:\w+\s){0,2}?at\s(?:the|a|an)?\s?(?:\w+\s){0,3}?(?:of\s)?(?:\d+\s?%|0?\.\d+)/i,
]

export const saysUncorrected = (text: string): boolean => NONE.some((form) => form.test(text))
export const saysCorrected = (text: string): boolean => CORRECTED.test(text)
export const saysPCorrected = (text: string): boolean => P_CORRECTED.test(text)

/** 'family-wise', 'experiment-wise', 'overall error', 'any false positive finding in the study as a whole'; 'false discovery rate', 'FDR'. */
export function findErrorRate(text: string): ReadClaim['errorRate'] {
  if (
    /\b(?:family|experiment|study|table)[\s-]?wise\b|\bFWER?\b|\boverall (?:type[\s-]I |alpha |error|level|significance|probability|risk)|\b(?:any|one or more|at least one) (?:false|type[\s-]I)|type[\s-]I error (?:rate )?(?:over|across|for all|inflation)|inflat\w+ (?:of )?(?:the )?(?:type|alpha|α)/i.test(
      text,
    )
  )
    return 'fwer'
  return /false[\s-](?:discovery|detection)|\bFDR\b/i.test(text) ? 'fdr' : null
}

/** A control by its word: 'the untreated control', 'vehicle', 'placebo', 'the surface'. */
const CONTROL =
  /\b(?:compared|comparisons?|tested|contrasted|compare)\b[^.;]{0,60}?\b(?:with|to|versus|vs\.?|against)\s(?:that of\s)?(?:the\s)?(?<name>(?:[\w°.+-]+\s){0,2}?(?:control|placebo|vehicle|sham|reference|baseline|standard|surface|check|blank|untreated(?!\s(?:control|check|group|reference))|wild[\s-]?type)(?:\s(?:group|condition|treatment|diet))?)\b/i
const AGAINST_ONE =
  /\beach (?:of the )?(?:[\w-]+\s){1,4}(?:was|were|is|are)?\s?(?:compared )?(?:with|to|versus|vs\.?|against)\s(?:the\s)?(?<name>[\w°.+-]+(?:\s[\w°.+-]+)?)/i

export function findScope(text: string, procedure: ReadClaim['procedure']): ReadClaim['scope'] {
  const named = CONTROL.exec(text)?.groups?.name ?? (procedure === 'dunnett' ? undefined : undefined)
  const control = named ?? AGAINST_ONE.exec(text)?.groups?.name ?? null
  if (
    /\b(?:all (?:possible )?pairs|all (?:\w+ )?pair-?wise|pair-?wise|in pairs|each other|one another|every pair|pairs of|all possible comparisons|between all|pairwise|all the groups)\b/i.test(
      text,
    ) &&
    procedure !== 'dunnett'
  )
    return { design: 'all-pairs', control: null }
  if (procedure === 'dunnett' || control !== null)
    return {
      design: 'many-to-one',
      control: control?.trim().replace(/\s(?:by|using|with|in|and)$/i, '') ?? null,
    }
  if (procedure === 'tukey' || procedure === 'games-howell') return { design: 'all-pairs', control: null }
  if (
    /\b(?:outcomes?|end-?\s?points?|measures|variables|parameters|regions|ROIs|transcripts|genes|traits|behaviou?rs|metabolites|proteins|cytokines|SNPs|voxels|items|subscales|biomarkers)\b/i.test(
      text,
    )
  )
    return { design: 'outcomes', control: null }
  return { design: /\bcontrasts\b/i.test(text) ? 'contrasts' : null, control: null }
}

/** Whether the correction, as worded, changes the p-values or lowers the level; null where it does not say. */
export function scaleOfCorrection(
  text: string,
  procedure: ReadClaim['procedure'],
): Exclude<Scale, 'unknown'> | null {
  if (procedure === 'none') return 'raw'
  if (
    /\b(?:level|alpha|threshold|α)\b[^.;]{0,60}(?:lowered|reduced|divided|corrected|set|adjusted)|(?:lowered|reduced|divided|corrected|adjusted)\s(?:\w+[\s-]){0,2}(?:level|alpha|threshold|α)\b|0?[.,]\d+\s?\/\s?\d/i.test(
      text,
    )
  )
    return /multipl(?:ied|ying)\b/i.test(text) ? 'adjusted' : 'raw'
  if (
    /\b[pP][\s-]?values?\b[^.;]{0,80}(?:adjusted|corrected|multiplied)|(?:adjusted|corrected)\s[pP]\b|\badjusted values\b|[pP][\s-]?values? refer to the studenti[sz]ed/i.test(
      text,
    )
  )
    return 'adjusted'
  return procedure === 'tukey' ||
    procedure === 'dunnett' ||
    procedure === 'games-howell' ||
    procedure === 'scheffe' ||
    procedure === 'single-step'
    ? 'adjusted'
    : null
}
