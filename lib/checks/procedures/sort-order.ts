/** Up to this many values, moving them one by one is faster than counting digits. */
const FEW = 40
/** A double that is not negative sorts as its bits do; the upper 32 of them are sorted in three digits of 11. */
const DIGIT = 11
const BUCKETS = 1 << DIGIT

const UPPER = new Uint8Array(new Uint32Array([1]).buffer)[0] === 1 ? 1 : 0

/**
 * The places of `values` in ascending order, equal values in input order: values[order[0]] is the smallest. `values`
 * are at least 0 (Infinity allowed, no NaN). Linear time but for runs of values that differ in the lower 32 bits
 * only, which are sorted by comparison. Source: radix sort by counting, Knuth, The Art of Computer Programming 3, 5.2.5.
 */
export function sortOrder(values: Float64Array): Uint32Array {
  const order = new Uint32Array(values.length)
  for (let i = 0; i < order.length; i++) order[i] = i
  if (order.length <= FEW) {
    insert(values, order, 0, order.length)
    return order
  }
  const sorted = sortByUpperBits(values, order)
  finishRuns(values, sorted)
  return sorted
}

function sortByUpperBits(values: Float64Array, order: Uint32Array): Uint32Array {
  const size = values.length
  const bits = new Uint32Array(values.buffer, values.byteOffset, 2 * size)
  let keys = new Uint32Array(size)
  const counts = [0, 1, 2].map(() => new Uint32Array(BUCKETS))
  const [first = keys, second = keys, third = keys] = counts
  for (let i = 0; i < size; i++) {
    // −0 sorts as 0
    const key = (bits[2 * i + UPPER] ?? 0) & 0x7fffffff
    keys[i] = key
    first[key & (BUCKETS - 1)] = (first[key & (BUCKETS - 1)] ?? 0) + 1
    second[(key >>> DIGIT) & (BUCKETS - 1)] = (second[(key >>> DIGIT) & (BUCKETS - 1)] ?? 0) + 1
    third[key >>> (2 * DIGIT)] = (third[key >>> (2 * DIGIT)] ?? 0) + 1
  }

  let from: Uint32Array = order
  let to: Uint32Array = new Uint32Array(size)
  let nextKeys = new Uint32Array(size)
  counts.forEach((count, pass) => {
    const shift = pass * DIGIT
    // All in one bucket: this digit orders nothing.
    if (count[((keys[0] ?? 0) >>> shift) & (BUCKETS - 1)] === size) return
    let start = 0
    for (let bucket = 0; bucket < BUCKETS; bucket++) {
      const held = count[bucket] ?? 0
      count[bucket] = start
      start += held
    }
    for (let i = 0; i < size; i++) {
      const key = keys[i] ?? 0
      const bucket = (key >>> shift) & (BUCKETS - 1)
      const at = count[bucket] ?? 0
      count[bucket] = at + 1
      nextKeys[at] = key
      to[at] = from[i] ?? 0
    }
    ;[from, to] = [to, from]
    ;[keys, nextKeys] = [nextKeys, keys]
  })
  return from
}

/** Sorts the runs that the upper bits leave in disorder. */
function finishRuns(values: Float64Array, order: Uint32Array) {
  const at = (i: number) => values[order[i] ?? 0] ?? 0
  let previous = at(0)
  for (let i = 1; i < order.length; i++) {
    const value = at(i)
    if (value >= previous) {
      previous = value
      continue
    }
    const key = upperBits(value)
    let from = i - 1
    while (from > 0 && upperBits(at(from - 1)) === key) from--
    let to = i + 1
    while (to < order.length && upperBits(at(to)) === key) to++
    if (to - from <= FEW) insert(values, order, from, to)
    else order.subarray(from, to).sort((a, b) => (values[a] ?? 0) - (values[b] ?? 0) || a - b)
    i = to - 1
    previous = at(i)
  }
}

const cell = new Float64Array(1)
const cellBits = new Uint32Array(cell.buffer)

function upperBits(value: number): number {
  cell[0] = value
  return (cellBits[UPPER] ?? 0) & 0x7fffffff
}

function insert(values: Float64Array, order: Uint32Array, from: number, to: number) {
  for (let i = from + 1; i < to; i++) {
    const moved = order[i] ?? 0
    const value = values[moved] ?? 0
    let j = i
    for (; j > from && (values[order[j - 1] ?? 0] ?? 0) > value; j--) order[j] = order[j - 1] ?? 0
    order[j] = moved
  }
}
