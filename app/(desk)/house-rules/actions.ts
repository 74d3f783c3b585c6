'use server'

import { changeHouseRules, changeHouseRulesInput } from '@/lib/desk/change-house-rules'
import { action } from '@/lib/web/action'

export const changeHouseRulesAction = action(changeHouseRulesInput, changeHouseRules)
