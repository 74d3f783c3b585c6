import type { SectionKind } from '../../types'

/** A citation: '[12]', '[1,2–4]', '(Smith 2010)', '(Smith et al., 2010; Jones, 2011)', 'Smith and Jones (2010)', 'et al.', 'Author C'. */
const CITATION =
  /\[\d{1,3}(?:\s?[,;–-]\s?\d{1,3})*\]|\([^()]{0,60}\b(?:19|20)\d\d[a-z]?\b[^()]{0,40}\)|\b[A-Z][\wÀ-ÿ'-]+\s\(?(?:19|20)\d\d[a-z]?\)|\bet al\b/

/** Verbs and nouns by which somebody's finding is reported: 'Smith found', 'a previous study reported', 'as described by'. */
const REPORTED =
  /\b(?:found|reported|described|observed|showed|shown|demonstrated|noted|obtained|documented|detected|claimed|concluded|suggested|published|quoted|described|gave|saw|report|study|studies|trial|trials|meta-analysis|review|authors?|colleagues|coworkers|co-workers|group of)\b/i

/** Somebody else's: 'previous work', 'earlier studies', 'in a frequently quoted report', 'et al. found', 'Author C described'. */
const OTHERS =
  /\b(?:previous|prior|earlier|former|another|other|recent|quoted|cited|published|pioneering|seminal|landmark|classic|original)\s(?:\w+\s)?(?:work|works|stud(?:y|ies)|reports?|trials?|authors?|investigat\w+|research\w*|papers?|experiments?|analys[ei]s|publications?|meta-analys[ei]s|review)\b|\bet al\.?,?\s*(?:[\[(][^\])]*[\])]\s*)?(?:found|reported|described|observed|showed|demonstrated|noted|obtained|documented|concluded)|\bothers\s(?:have\s)?(?:found|reported|described|observed|showed|shown|noted|obtained)|\b(?:and|&) (?:colleagues|co-?workers)\b|\bAuthors?\s[A-Z]\d?\b/i

/** The paper's own: 'we', 'our', 'in this study', 'the present trial', 'here'. */
const OWN =
  /\b(?:we|our|ours|us)\b|\b(?:this|the present|the current|present|current)\s(?:study|work|trial|experiment|paper|investigation|analysis|report|article|cohort|sample|data)/i

/**
 * Whether the sentence tells what others found. In the results only clear words count; in the introduction,
 * where a paper has no findings of its own, a finding without 'we' is taken for somebody else's; in the
 * discussion a citation with a verb of reporting.
 */
export function isCitedWork(text: string, section: SectionKind): boolean {
  if (section === 'references') return true
  if (OWN.test(text)) return false
  const cited = CITATION.test(text)
  const others = OTHERS.test(text)
  if (section === 'introduction') return true
  if (others && (cited || section === 'discussion' || section === 'other') && REPORTED.test(text)) return true
  if (section === 'discussion') return cited && REPORTED.test(text)
  return others && cited && /\bet al\b|\bprevious|\bearlier|\bprior|quoted|\bothers\b/i.test(text)
}
