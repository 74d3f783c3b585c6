'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import type { ConflictView } from '@/db/queries/manuscript'
import { Button } from '../ui/button'
import type { ManuscriptActions } from './manuscript-actions'
import { ReasonDialog } from './reason-dialog'

/** Lets a person see the manuscript again whose conflict no longer holds. */
export function LiftConflict(props: { conflict: ConflictView; lift: ManuscriptActions['liftConflict'] }) {
  const router = useRouter()
  const [asked, setAsked] = useState(false)
  return (
    <>
      <Button size="small" variant="quiet" onClick={() => setAsked(true)}>
        Lift<span className="sr-only"> the conflict of {props.conflict.person.name}</span>
      </Button>
      {asked && (
        <ReasonDialog
          title="Lift the conflict"
          reasonLabel={null}
          reasonNeeded={false}
          submit="Lift it"
          busy="Lifting…"
          done="The conflict is lifted."
          act={() => props.lift({ conflictId: props.conflict.id })}
          onClose={() => setAsked(false)}
          onDone={() => router.refresh()}
        >
          {props.conflict.person.name} can be asked to review this manuscript again. That it was declared
          stays in the record.
        </ReasonDialog>
      )}
    </>
  )
}
