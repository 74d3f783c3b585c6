import type { ReadClaim, ReadReport } from '../types'
import { scaleOfCorrection } from './grammar/correction'

/**
 * Gives reports whose own words do not say it the scale that the paper states for them: where every claim of
 * correction that says anything says the same ('P values were multiplied by six', 'the level was lowered to
 * .05/6'), it holds for all comparisons; where claims differ, for those whose heading, outcome or sentence shares
 * words with one claim alone. The rest stays 'unknown'.
 */
export function settleScales(reports: ReadReport[], claims: readonly ReadClaim[]): ReadReport[] {
  const stated = claims
    .filter(({ section }) => section !== 'introduction')
    .map((claim) => ({ claim, scale: scaleOfCorrection(claim.sentence, claim.procedure) }))
    .filter((found): found is { claim: ReadClaim; scale: 'raw' | 'adjusted' } => found.scale !== null)
  if (stated.length === 0) return reports
  const scales = new Set(stated.map(({ scale }) => scale))
  const [only] = scales
  return reports.map((report) => {
    if (report.scale !== 'unknown' || report.role !== 'comparison' || report.place.source === 'results-table')
      return report
    if (scales.size === 1 && only) return { ...report, scale: only }
    const near = stated.filter(({ claim }) => shares(claim.sentence, report))
    const [found] = new Set(near.map(({ scale }) => scale))
    return found && new Set(near.map(({ scale }) => scale)).size === 1 ? { ...report, scale: found } : report
  })
}

/** Words too common to tie a claim to a result. */
const COMMON =
  /^(?:were|with|from|that|this|than|between|compared|comparison|comparisons|significant|difference|differences|value|values|correction|adjusted|corrected|test|tests|group|groups|pairs|each|these|those|method|level|experiment|study|five|four|three|used|which|their|significantly|regarded|below|after|table|results)$/

function shares(claim: string, { sentence, heading, outcome }: ReadReport): boolean {
  // 'Experiment 2' of a heading or a sentence decides alone
  const number = /\b(experiment|study|trial)\s(\d|[A-H])\b/i
  const own = number.exec(claim)?.[0].toLowerCase()
  const here = (number.exec(heading) ?? number.exec(sentence))?.[0].toLowerCase()
  if (own && here) return own === here
  const words = new Set((claim.toLowerCase().match(/[a-z]{4,}/g) ?? []).filter((word) => !COMMON.test(word)))
  const text = `${heading} ${outcome ?? ''} ${sentence}`.toLowerCase()
  return (text.match(/[a-z]{4,}/g) ?? []).some((word) => words.has(word))
}
