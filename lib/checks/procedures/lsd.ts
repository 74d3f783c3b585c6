/**
 * Fisher's protected least significant difference: the raw p of a pair once the omnibus test is significant; as an
 * adjusted p-value max(p, p of the omnibus test), which is at most a level exactly where both are. Holds the
 * family-wise rate for three groups only (two pairs of four groups may be false alarms at once).
 * `p` and `omnibus` in [0, 1]; NaN where either is. Throws RangeError outside.
 * Source: Fisher (1935), The Design of Experiments; its error rate: Hayter (1986), J Am Stat Assoc 81, 1000–1004.
 */
export function pLsd(p: number, omnibus: number): number {
  for (const value of [p, omnibus]) {
    if (value < 0 || value > 1) throw new RangeError(`a p-value lies in [0, 1], not at ${value}`)
  }
  return Math.max(p, omnibus)
}
