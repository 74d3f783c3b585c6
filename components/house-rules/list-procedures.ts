import { procedureTable } from '@/lib/checks'
import { PROCEDURES, type Procedure } from '@/lib/checks/vocabulary'

export type ProcedureOption = {
  procedure: Procedure
  label: string
  controls: 'fwer' | 'fdr' | 'none'
  source: string
}

/** What the form needs to know of each procedure; read on the server, so that the engine stays there. */
export function listProcedures(): ProcedureOption[] {
  return PROCEDURES.map((procedure) => {
    const { label, controls, source } = procedureTable[procedure]
    return { procedure, label, controls, source }
  })
}
