import type { ReactNode } from 'react'
import { Mark } from '../ui/mark'

/** The frame of the screens before sign-in: the house at the left of a ruled line, the form at its right. */
export function EntryFrame({ house, children }: { house: string; children: ReactNode }) {
  return (
    <div className="mx-auto grid min-h-dvh max-w-5xl content-start gap-8 px-5 py-8 md:grid-cols-[1fr_1fr] md:content-center md:gap-0 md:py-16">
      <header className="flex flex-col justify-between gap-6 md:pr-12 md:text-right">
        <div className="flex flex-col md:items-end">
          <Mark className="size-10 md:size-20" />
          <p className="mt-3 font-serif text-xl leading-none font-semibold md:mt-6">Assize</p>
          <p className="mt-1.5 text-ink-soft">{house}</p>
        </div>
        <p className="max-w-[34ch] font-serif text-base text-ink-soft max-md:hidden md:self-end">
          Manuscripts come in, every correction for multiple comparisons is recomputed, and a statistician
          sends back a verdict.
        </p>
      </header>
      <main className="margin-rule pl-5 md:py-4 md:pl-12">
        <div className="max-w-sm">{children}</div>
      </main>
    </div>
  )
}
