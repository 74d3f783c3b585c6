import type { Verdict } from '@/lib/rules/words'

/** What each verdict says, in one sentence to the one who chooses. */
export const verdictSentences: Record<Verdict, string> = {
  sound: 'The corrections hold as they are reported; nothing has to change.',
  'sound after changes': 'The conclusions stand once the points below are put right.',
  'not supported': 'At least one conclusion does not survive the correction that is due.',
  'cannot be judged from what is given':
    'What is printed does not let the families or the calls be judged; the letter asks for what is missing.',
}
