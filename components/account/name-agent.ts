// The first family that fits counts: an Edge says "Chrome" and "Safari" too, a Chrome says "Safari".
const browsers: readonly (readonly [sign: string, name: string])[] = [
  ['Edg/', 'Edge'],
  ['OPR/', 'Opera'],
  ['Firefox/', 'Firefox'],
  ['Chrome/', 'Chrome'],
  ['Safari/', 'Safari'],
]
const systems: readonly (readonly [sign: string, name: string])[] = [
  ['iPhone', 'iPhone'],
  ['iPad', 'iPad'],
  ['Android', 'Android'],
  ['Windows', 'Windows'],
  ['Mac OS X', 'macOS'],
  ['Linux', 'Linux'],
]

/** A browser's own description in two words, such as "Firefox on Linux", so that one knows one's sessions again. */
export function nameAgent(agent: string): string {
  const find = (names: typeof browsers) => names.find(([sign]) => agent.includes(sign))?.[1]
  const browser = find(browsers) ?? 'A browser'
  const system = find(systems)
  return system ? `${browser} on ${system}` : browser
}
