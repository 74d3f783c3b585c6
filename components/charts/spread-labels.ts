/**
 * Moves labels along one axis so that neighbours are at least `gap` apart within [`from`, `to`], each as near to
 * its wish as its neighbours allow. Keeps the order of the wishes; where they do not fit they are spaced evenly.
 */
export function spreadLabels(wishes: readonly number[], gap: number, from: number, to: number): number[] {
  const order = wishes.map((_, index) => index).sort((a, b) => (wishes[a] ?? 0) - (wishes[b] ?? 0))
  const even = order.length > 1 ? Math.min(gap, (to - from) / (order.length - 1)) : gap
  const placed = order.map((index) => Math.min(Math.max(wishes[index] ?? from, from), to))
  for (let i = 1; i < placed.length; i += 1) {
    placed[i] = Math.max(placed[i] ?? from, (placed[i - 1] ?? from) + even)
  }
  for (let i = placed.length - 1; i >= 0; i -= 1) {
    const limit = i === placed.length - 1 ? to : (placed[i + 1] ?? to) - even
    placed[i] = Math.min(placed[i] ?? to, limit)
  }
  const answer: number[] = new Array<number>(wishes.length)
  order.forEach((index, place) => {
    answer[index] = placed[place] ?? from
  })
  return answer
}
