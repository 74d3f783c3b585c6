'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useAction, type Answer } from '../shell/use-action'
import { RadioGroup } from '../ui/choice'

type Choice = 'system' | 'light' | 'dark'

type ThemeChoiceProps = {
  theme: Choice
  choose: (input: { theme: Choice }) => Promise<Answer<unknown>>
}

const options = [
  { value: 'system', label: 'As the system' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
] as const

/** Kept in this browser; the server draws the page in it, so that nothing flashes. */
export function ThemeChoice({ theme, choose }: ThemeChoiceProps) {
  const router = useRouter()
  const [chosen, setChosen] = useState(theme)
  const { run } = useAction(choose, () => router.refresh())
  const change = (value: Choice) => {
    setChosen(value)
    if (value === 'system') delete document.documentElement.dataset.theme
    else document.documentElement.dataset.theme = value
    run({ theme: value })
  }
  return (
    <RadioGroup
      legend={<span className="sr-only">Theme</span>}
      name="theme"
      inline
      options={options}
      value={chosen}
      onChange={change}
    />
  )
}
