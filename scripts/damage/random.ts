/** The same numbers in every run from the same seed. */
export type Random = { below: (end: number) => number; one: <T>(of: readonly [T, ...T[]]) => T }

/** A counter of 32 bits whose bits are mixed by multiplication and shifts, so that neighbouring seeds differ at once. */
export function makeRandom(seed: number): Random {
  let state = seed >>> 0
  const next = () => {
    state = (state + 0x9e37_79b9) >>> 0
    let mixed = Math.imul(state ^ (state >>> 16), 0x85eb_ca6b)
    mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2_ae35)
    return ((mixed ^ (mixed >>> 16)) >>> 0) / 4_294_967_296
  }
  const below = (end: number) => Math.floor(next() * end)
  return { below, one: (of) => of[below(of.length)] ?? of[0] }
}
