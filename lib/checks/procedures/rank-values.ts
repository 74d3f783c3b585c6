/** Up to this many values, moving them one by one is faster than counting digits. */
const FEW = 40
/** A double that is not negative sorts as its bits do; the upper 32 of them are sorted in three digits of 11. */
const DIGIT = 11
const BUCKETS = 1 << DIGIT

const UPPER = new Uint8Array(new Uint32Array([1]).buffer)[0] === 1 ? 1 : 0

/** `values` in ascending order; `places[rank]` is where the value of that rank stood. */
export type Ranked = { values: Float64Array; places: Uint32Array }

/**
 * Sorts `values`, all at least 0 (Infinity allowed, no NaN), which stay as they are; equal values in input order. The
 * values travel with their places: fetching them afterwards from where they stood would cost more than the sorting.
 * Linear time but for runs of values that differ in the lower 32 bits only, which are sorted by comparison.
 * Source: radix sort by counting, Knuth, The Art of Computer Programming 3, 5.2.5.
 */
export function rankValues(values: Float64Array): Ranked {
  if (values.length > FEW) {
    const ranked = rankByUpperBits(values)
    finishRuns(ranked)
    return ranked
  }
  const ranked = { values: values.slice(), places: listPlaces(values.length) }
  insert(ranked, 0, values.length)
  return ranked
}

function rankByUpperBits(values: Float64Array): Ranked {
  const size = values.length
  const counts = countDigits(values)
  const key = bitsOf(values)[UPPER] ?? 0
  let from: Ranked = { values, places: listPlaces(size) }
  let to = createRanked(size)
  for (let pass = 0; pass < 3; pass++) {
    const count = counts.subarray(pass * BUCKETS, (pass + 1) * BUCKETS)
    // All in one bucket: this digit orders nothing.
    if (count[(key >>> (pass * DIGIT)) & (BUCKETS - 1)] === size) continue
    moveByDigit(from.values, from.places, to.values, to.places, count, pass * DIGIT)
    // The given values are read only: the second pass needs room of its own.
    const next = from.values === values ? createRanked(size) : from
    from = to
    to = next
  }
  return from.values === values ? { values: values.slice(), places: from.places } : from
}

function createRanked(size: number): Ranked {
  return { values: new Float64Array(size), places: new Uint32Array(size) }
}

function bitsOf(values: Float64Array): Uint32Array {
  return new Uint32Array(values.buffer, values.byteOffset, 2 * values.length)
}

// These loops run over a million values: each stands alone, so that nothing in it is looked up anew.

function listPlaces(size: number): Uint32Array {
  const places = new Uint32Array(size)
  for (let i = 0; i < size; i++) places[i] = i
  return places
}

/** How often each of the three digits has each value. */
function countDigits(values: Float64Array): Uint32Array {
  const bits = bitsOf(values)
  const counts = new Uint32Array(3 * BUCKETS)
  for (let i = UPPER; i < bits.length; i += 2) {
    // −0 sorts as 0
    const key = (bits[i] ?? 0) & 0x7fffffff
    const first = key & (BUCKETS - 1)
    const second = BUCKETS + ((key >>> DIGIT) & (BUCKETS - 1))
    const third = 2 * BUCKETS + (key >>> (2 * DIGIT))
    counts[first] = (counts[first] ?? 0) + 1
    counts[second] = (counts[second] ?? 0) + 1
    counts[third] = (counts[third] ?? 0) + 1
  }
  return counts
}

/** One stable pass: `starts` holds the counts of this digit and is used up. */
function moveByDigit(
  values: Float64Array,
  places: Uint32Array,
  nextValues: Float64Array,
  nextPlaces: Uint32Array,
  starts: Uint32Array,
  shift: number,
) {
  let start = 0
  for (let bucket = 0; bucket < BUCKETS; bucket++) {
    const held = starts[bucket] ?? 0
    starts[bucket] = start
    start += held
  }
  const bits = bitsOf(values)
  for (let i = 0; i < values.length; i++) {
    const bucket = (((bits[2 * i + UPPER] ?? 0) & 0x7fffffff) >>> shift) & (BUCKETS - 1)
    const at = starts[bucket] ?? 0
    starts[bucket] = at + 1
    nextValues[at] = values[i] ?? 0
    nextPlaces[at] = places[i] ?? 0
  }
}

/** Sorts the runs that the upper bits leave in disorder. */
function finishRuns(ranked: Ranked) {
  const { values } = ranked
  const bits = bitsOf(values)
  let previous = 0
  for (let i = 0; i < values.length; i++) {
    const value = values[i] ?? 0
    if (value < previous) {
      const key = bits[2 * i + UPPER]
      let from = i
      while (from > 0 && bits[2 * (from - 1) + UPPER] === key) from--
      let to = i + 1
      while (to < values.length && bits[2 * to + UPPER] === key) to++
      if (to - from <= FEW) insert(ranked, from, to)
      else sortRun(ranked, from, to)
      i = to - 1
    }
    previous = values[i] ?? 0
  }
}

function insert({ values, places }: Ranked, from: number, to: number) {
  for (let i = from + 1; i < to; i++) {
    const value = values[i] ?? 0
    const place = places[i] ?? 0
    let j = i
    for (; j > from && (values[j - 1] ?? 0) > value; j--) {
      values[j] = values[j - 1] ?? 0
      places[j] = places[j - 1] ?? 0
    }
    values[j] = value
    places[j] = place
  }
}

function sortRun({ values, places }: Ranked, from: number, to: number) {
  const run = Array.from(values.subarray(from, to), (value, i) => ({ value, place: places[from + i] ?? 0 }))
  run.sort((a, b) => a.value - b.value || a.place - b.place)
  run.forEach(({ value, place }, i) => {
    values[from + i] = value
    places[from + i] = place
  })
}
