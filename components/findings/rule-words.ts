import type { Rule } from '@/lib/checks/vocabulary'

/** 'call-not-upheld' as a heading: 'Call not upheld'. */
export function ruleWords(rule: Rule | null): string {
  if (rule === null) return 'Own point'
  const words = rule.replaceAll('-', ' ')
  return words.startsWith('p ') ? words : words.charAt(0).toUpperCase() + words.slice(1)
}
