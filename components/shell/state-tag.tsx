import type { State } from '@/lib/rules/states'
import { Tag, type Tone } from '../ui/tag'

const tones: Partial<Record<State, Tone>> = {
  stuck: 'fails',
  assigned: 'tide',
  'in review': 'tide',
  'verdict drafted': 'tide',
  returned: 'holds',
}

/** Where a manuscript stands. */
export function StateTag({ state }: { state: State }) {
  return <Tag tone={tones[state] ?? 'plain'}>{state}</Tag>
}
