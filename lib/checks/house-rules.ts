import type { HouseRules } from './types'
import { PROCEDURES } from './vocabulary'

/** What holds where a house has decided nothing else: alpha 0.05, every procedure that controls an error rate. */
export const defaultHouseRules: HouseRules = {
  alpha: 0.05,
  accepted: PROCEDURES.filter(
    (procedure) => procedure !== 'lsd' && procedure !== 'duncan' && procedure !== 'snk',
  ),
  correctionFrom: 2,
  secondaryApart: true,
}
