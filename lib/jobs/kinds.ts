import { noteMailTrouble, sendMail } from '@/lib/mail/send-mail'
import type { JobKind } from '@/lib/rules/words'
import type { JobRow } from './kind'
import { giveUpAudit, runAudit } from './run-audit'

const second = 1000
const minute = 60 * second

/** One row a kind of job. */
export const kinds: Record<JobKind, JobRow> = {
  'run-audit': {
    run: runAudit,
    backoff: (attempt) => 10 * second * 6 ** (attempt - 1),
    onTrouble: giveUpAudit,
  },
  'send-mail': {
    run: sendMail,
    backoff: (attempt) => Math.min(120 * minute, 30 * second * 4 ** (attempt - 1)),
    onTrouble: noteMailTrouble,
  },
}
