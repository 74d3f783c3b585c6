'use client'

import { useBench } from '../bench/bench-state'
import { EmptyState } from '../ui/empty-state'
import { FamilySheet } from './family-sheet'

export function FamiliesSection() {
  const { families } = useBench().index.audit
  if (families.length === 0) {
    return (
      <EmptyState>
        No family of tests was found in this manuscript. If you see one on the pages, write it down as a point
        of your own on the verdict page.
      </EmptyState>
    )
  }
  return (
    <div className="flex flex-col">
      {families.map((family, index) => (
        <FamilySheet key={family.id} family={family} number={index + 1} />
      ))}
    </div>
  )
}
