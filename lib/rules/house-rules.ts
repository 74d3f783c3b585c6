import { z } from 'zod'
import { PROCEDURES } from '@/lib/checks/vocabulary'
import { defaultHouseRules as auditDefaults } from '@/lib/checks/house-rules'
import { BLINDINGS } from './words'

/** What a house decides; stored as one version a row, so that a manuscript is judged by the rules of its day. */
export const houseRulesSchema = z.object({
  alpha: z.coerce.number().gt(0).lt(1),
  accepted: z.array(z.enum(PROCEDURES)).min(1),
  correctionFrom: z.coerce.number().int().min(2).max(1000),
  secondaryApart: z.boolean(),
  blinding: z.enum(BLINDINGS),
  submitterSeesAudit: z.boolean(),
  twoPersonRelease: z.boolean(),
  reviewDays: z.coerce.number().int().min(1).max(365),
  answerDays: z.coerce.number().int().min(1).max(365),
  greeting: z.string().trim().min(1).max(500),
  closing: z.string().trim().min(1).max(1000),
})
export type FullHouseRules = z.infer<typeof houseRulesSchema>

export const defaultFullHouseRules: FullHouseRules = {
  ...auditDefaults,
  accepted: [...auditDefaults.accepted],
  blinding: 'single',
  submitterSeesAudit: false,
  twoPersonRelease: true,
  reviewDays: 14,
  answerDays: 60,
  greeting:
    'Thank you for handing in your manuscript. A statistician has looked at how it handles multiple comparisons.',
  closing:
    'If you see a point differently, please say so in your answer; both views will be kept. This review covers the handling of multiple comparisons only and does not replace the policy of the journal or the protocol of the study.',
}
