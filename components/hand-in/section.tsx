import type { ReactNode } from 'react'

/** A numbered part of a long form; its number stands in the ruled margin. */
export function Section({ number, title, children }: { number: number; title: string; children: ReactNode }) {
  return (
    <section className="grid grid-cols-[2rem_minmax(0,1fr)] sm:grid-cols-[3rem_minmax(0,1fr)]">
      <span aria-hidden="true" className="pt-px pr-3 text-right font-serif text-lg text-ink-soft">
        {number}
      </span>
      <div className="margin-rule pb-8 pl-4 sm:pl-6">
        <h2 className="mb-3 text-lg font-semibold">{title}</h2>
        <div className="flex flex-col gap-4">{children}</div>
      </div>
    </section>
  )
}
