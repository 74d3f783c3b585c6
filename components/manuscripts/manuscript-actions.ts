import type { AnswerInput } from '../docket/answer-dialog'
import type { AssignInput } from '../docket/assign-dialog'
import type { Answer } from '../shell/use-action'

type Act<I> = (input: I) => Promise<Answer<unknown>>
type Reasoned = { manuscriptId: string; reason: string }

/** The changes that the overview offers, as the page binds them. */
export type ManuscriptActions = {
  offer: Act<AssignInput>
  answer: Act<AnswerInput>
  endAssignment: Act<Reasoned>
  declareConflict: Act<Reasoned>
  liftConflict: Act<{ conflictId: string }>
  withdraw: Act<Reasoned>
  close: Act<{ manuscriptId: string }>
  runAuditAgain: Act<{ manuscriptId: string }>
  handInAgain: Act<{ manuscriptId: string }>
}
