/** The first integer in [from, to] for which `holds`, which stays true once it is; to + 1 where there is none. */
export function findFirst(from: number, to: number, holds: (m: number) => boolean): number {
  let low = from
  let high = to + 1
  while (low < high) {
    const middle = Math.floor((low + high) / 2)
    if (holds(middle)) high = middle
    else low = middle + 1
  }
  return low
}
