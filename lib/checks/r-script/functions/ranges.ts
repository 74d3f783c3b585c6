/** Ranges of numbers, c(low, high): rounding, meeting, joining. */
export const ranges = `
# ---- ranges: c(low, high) ----

slack <- 1e-9

# What a number printed with so many decimals stands for.
rounding <- function(value, decimals) c(value - 0.5 * 10^-decimals, value + 0.5 * 10^-decimals)

clip <- function(range) c(min(max(range[1], 0), min(max(range[2], 0), 1)), min(max(range[2], 0), 1))

overlaps <- function(a, b) {
  a[1] <= b[2] * (1 + slack) + slack * 1e-6 && b[1] <= a[2] * (1 + slack) + slack * 1e-6
}

# The common part, NULL where there is none.
intersect_ranges <- function(a, b) {
  if (!overlaps(a, b)) return(NULL)
  low <- max(a[1], b[1])
  c(low, max(low, min(a[2], b[2])))
}

join_ranges <- function(a, b) c(min(a[1], b[1]), max(a[2], b[2]))

# All that is printed of one number: the common part where it agrees, all of it together where it contradicts itself.
combine <- function(list_of_ranges) {
  if (length(list_of_ranges) == 0) return(NULL)
  common <- list_of_ranges[[1]]
  for (range in list_of_ranges[-1]) if (!is.null(common)) common <- intersect_ranges(common, range)
  if (!is.null(common)) return(common)
  Reduce(join_ranges, list_of_ranges)
}
`
