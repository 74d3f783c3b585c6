import { expect, test } from 'vitest'
import { nameAgent } from '@/components/account/name-agent'

// The forms of these strings are from memory of what the browsers send.
test.each([
  ['Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0', 'Firefox on Linux'],
  [
    'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0 Safari/537.36 Edg/140.0',
    'Edge on Windows',
  ],
  [
    'Mozilla/5.0 (iPhone; CPU iPhone OS 18_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.0 Mobile/15E148 Safari/604.1',
    'Safari on iPhone',
  ],
  ['curl/8.5.0', 'A browser'],
  ['', 'A browser'],
])('%s is told in two words', (agent, words) => {
  expect(nameAgent(agent)).toBe(words)
})
