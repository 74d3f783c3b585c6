'use client'

import { useMemo } from 'react'
import { Button } from '../ui/button'
import { toast } from '../ui/toast'
import { encodeInput, LONGEST_LINK, type CalculatorInput } from './calculator-input'
import { saveFile } from './save-file'

type ToolbarProps = {
  input: CalculatorInput
  /** Written when they are asked for; null while there is nothing to write. */
  writeCsv: (() => string) | null
  writeR: (() => string) | null
}

const tooLong = 'This list is too long for a link. Keep the CSV instead.'

/** Takes the calculation elsewhere: as a link, as a table, as a script. */
export function Toolbar({ input, writeCsv, writeR }: ToolbarProps) {
  const fragment = useMemo(() => encodeInput(input), [input])
  const long = fragment.length > LONGEST_LINK
  const copy = async () => {
    if (long) {
      toast.error(tooLong)
      return
    }
    try {
      await navigator.clipboard.writeText(`${window.location.origin}/calculator#${fragment}`)
      toast.success('The link is copied. Whoever opens it sees this list.')
    } catch {
      toast.error('The browser does not let this page copy. Take the address of the page instead.')
    }
  }
  return (
    <div className="flex max-w-64 flex-wrap gap-2 print:hidden">
      <Button size="small" onClick={() => void copy()}>
        Copy link
      </Button>
      <Button
        size="small"
        disabled={!writeCsv}
        onClick={() => writeCsv && saveFile('calculation.csv', 'text/csv', writeCsv())}
      >
        CSV
      </Button>
      <Button
        size="small"
        disabled={!writeR}
        onClick={() => writeR && saveFile('calculation.R', 'text/plain', writeR())}
      >
        R script
      </Button>
      {long && (
        <p className="w-full text-xs text-ink-soft">Too long for the address: a reload starts anew.</p>
      )}
    </div>
  )
}
