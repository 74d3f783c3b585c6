import type { Verdict } from '@/lib/rules/words'
import type { Answer } from '../shell/use-action'
import type { Preview } from './use-preview'

export type VerdictDraft = {
  manuscriptId: string
  verdict: Verdict
  remark: string
  effortMinutes: number | null
  body: string
}

/** The changes that the verdict page offers, as the page binds them. */
export type VerdictActions = {
  draft: (input: VerdictDraft) => Promise<Answer<unknown>>
  compose: (input: { manuscriptId: string; verdict: Verdict }) => Promise<Answer<{ body: string }>>
  preview: Preview
  sendBack: (input: { manuscriptId: string; reason: string }) => Promise<Answer<unknown>>
  release: (input: { manuscriptId: string }) => Promise<Answer<unknown>>
}
