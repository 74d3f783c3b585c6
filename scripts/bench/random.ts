/** The same numbers in (0, 1) in every run: a multiplicative congruential generator (Park and Miller 1988). */
export function createRandom(seed: number): () => number {
  let state = seed
  return () => (state = (state * 48271) % 2147483647) / 2147483647
}
