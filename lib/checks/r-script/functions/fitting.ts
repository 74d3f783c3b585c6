/** `find_fits`: which procedures at which m reproduce printed adjusted values. */
export const fitting = `
# ---- which procedure and which m reproduce the printed adjusted values ----

fits_tried <- c("bonferroni", "sidak", "holm", "holm-sidak", "hochberg", "hommel", "bh", "by")

# "procedure m" for every candidate whose range meets every printed range.
find_fits <- function(printed, raw, up_to) {
  meets <- function(a, b) a[1] <= b[2] + 1e-12 && b[1] <= a[2] + 1e-12
  low <- sapply(raw, function(range) range[1])
  high <- sapply(raw, function(range) range[2])
  n <- length(raw)
  found <- if (all(mapply(meets, printed, raw))) paste("raw", n) else character(0)
  for (procedure in fits_tried) {
    for (m in seq(n, max(n, up_to))) {
      bounds <- adjust_bounds(procedure, low, high, m)
      ranges <- lapply(seq_len(n), function(i) c(bounds$low[i], bounds$high[i]))
      if (all(mapply(meets, printed, ranges))) found <- c(found, paste(procedure, m))
    }
  }
  found
}

# Whether a single-step procedure at an m below the number of values reproduces each of them.
fits_each <- function(procedure, m, printed, raw) {
  all(mapply(function(a, b) overlaps(adjust_ranges(procedure, list(b), m, 0.05)[[1]], a), printed, raw))
}

check_fits <- function(what, shown, printed, raw, up_to) {
  computed <- if (length(raw) == 0) character(0) else find_fits(printed, raw, up_to)
  below <- setdiff(shown, computed)
  for (fit in below) {
    parts <- strsplit(fit, " ")[[1]]
    m <- as.numeric(parts[2])
    if (parts[1] %in% single_step && m < length(raw) && fits_each(parts[1], m, printed, raw)) {
      computed <- c(computed, fit)
    }
  }
  for (fit in union(setdiff(shown, computed), setdiff(computed, shown))) {
    differences <<- c(differences, sprintf("%s: %s is %s", what, fit,
                      if (fit %in% shown) "shown, but does not fit" else "not shown, but fits"))
  }
}
`
