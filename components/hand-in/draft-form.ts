import { z } from 'zod'
import type { RoundView } from '@/db/queries/manuscript'

/** What the hand-in form asks, as the fields hold it: text. The command checks again. */
export const draftForm = z.object({
  title: z
    .string()
    .trim()
    .min(1, 'Please give the title.')
    .max(500, 'Please keep the title to 500 characters.'),
  correspondingAuthor: z.string().trim().min(1, 'Please name the corresponding author.').max(200),
  correspondingEmail: z
    .string()
    .trim()
    .pipe(z.email('Please give an e-mail address, such as name@institute.example.')),
  alpha: z
    .string()
    .trim()
    .refine(isAlpha, 'Please give a number between 0 and 1, such as 0.05, or leave it empty.'),
  correction: z.string().trim().max(5000),
  primaryOutcome: z.string().trim().max(1000),
  note: z.string().trim().max(5000),
})
export type DraftForm = z.infer<typeof draftForm>
export type DraftField = keyof DraftForm

export const draftFieldLabels: Record<DraftField, string> = {
  title: 'Title',
  correspondingAuthor: 'Corresponding author',
  correspondingEmail: 'Corresponding e-mail address',
  alpha: 'Significance level (alpha)',
  correction: 'What was corrected, and how',
  primaryOutcome: 'Primary outcome',
  note: 'Note to the reader',
}

function isAlpha(text: string): boolean {
  const value = Number(text.replace(',', '.'))
  return text === '' || (value > 0 && value < 1)
}

type Drafted = {
  title: string
  correspondingAuthor: string | null
  correspondingEmail: string | null
} & Pick<RoundView, 'alpha' | 'correction' | 'primaryOutcome' | 'note'>

/** What is stored, as the fields hold it. */
export function toDraftForm(drafted: Drafted): DraftForm {
  return {
    title: drafted.title,
    correspondingAuthor: drafted.correspondingAuthor ?? '',
    correspondingEmail: drafted.correspondingEmail ?? '',
    alpha: drafted.alpha === null ? '' : String(drafted.alpha),
    correction: drafted.correction,
    primaryOutcome: drafted.primaryOutcome,
    note: drafted.note,
  }
}

/**
 * The part of the form that can be saved as it stands. A draft may hold an empty title, but no alpha and no
 * address that could not be one: those wait until they are whole.
 */
export function toDraftChange(form: DraftForm, touched: Iterable<DraftField>): Record<string, unknown> {
  const change: Record<string, unknown> = {}
  for (const field of touched) {
    const text = form[field].trim()
    if (field === 'alpha') {
      if (isAlpha(text)) change.alpha = text === '' ? null : Number(text.replace(',', '.'))
    } else if (field === 'correspondingEmail') {
      if (text === '' || z.email().safeParse(text).success) change.correspondingEmail = text
    } else change[field] = text
  }
  return change
}
