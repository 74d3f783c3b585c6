/** `check_reports`, `check_statistics`, `check_family`: an audit's numbers held against what is computed here. */
export const audit = `
# ---- an audit ----

# The p-values that a printed one stands for.
printed_range <- function(relation, value, decimals) {
  if (relation %in% c("<", "<=")) return(c(min(0, value), value))
  if (relation %in% c(">", ">=")) return(c(value, max(1, value)))
  ends <- rounding(value, decimals)
  if (value < 0 || value > 1) ends else clip(ends)
}

check_reports <- function() {
  for (id in names(reports)) {
    one <- reports[[id]]
    check(paste(id, "stands for"), one$shown, printed_range(one$relation, one$value, one$decimals))
  }
}

statistic_range <- function(id) {
  one <- statistics[[id]]
  p_range(one$test, one$value, one$decimals, one$df)
}

check_statistics <- function() {
  for (id in names(statistics)) {
    one <- statistics[[id]]
    if (!anyNA(one$shown)) check(paste("p of", id), one$shown, statistic_range(id))
  }
}

# A statistic as t, without its sign, where it is one; else NULL.
as_t <- function(id) {
  one <- statistics[[id]]
  df <- as.numeric(one$df)
  half <- 0.5 * 10^-one$decimals
  low <- max(0, abs(one$value) - half)
  high <- abs(one$value) + half
  if (one$test == "t" && length(df) > 0 && df[1] > 0) return(list(low = low, high = high, df = df[1]))
  if (one$test == "z") return(list(low = low, high = high, df = Inf))
  if (one$test == "F" && length(df) > 1 && df[1] == 1 && df[2] > 0) {
    return(list(low = sqrt(low), high = sqrt(high), df = df[2]))
  }
  NULL
}

# The range of p that a print stands for: a report's own, or that of a statistic, halved where the test is one-sided.
witness_range <- function(id, one_sided) {
  if (id %in% names(statistics)) {
    range <- clip(statistic_range(id))
    return(if (one_sided) range / 2 else range)
  }
  one <- reports[[id]]
  clip(printed_range(one$relation, one$value, one$decimals))
}

check_family <- function(family) {
  tests <- lapply(family$tests, function(test) {
    ranges <- function(ids) lapply(ids, witness_range, one_sided = test$one_sided)
    witnesses <- list(raw = ranges(test$raw), adjusted = ranges(test$adjusted), open = ranges(test$open))
    weighed <- weigh(witnesses, family$undone$procedure, family$undone$m)
    c(weighed, list(statistics = Filter(Negate(is.null), lapply(test$statistics, as_t))))
  })
  end <- function(range, i) if (is.null(range)) NA else range[i]
  check(paste0(family$label, ", raw p, lower end"), family$shown$raw_low,
        sapply(tests, function(test) end(test$raw, 1)))
  check(paste0(family$label, ", raw p, upper end"), family$shown$raw_high,
        sapply(tests, function(test) end(test$raw, 2)))
  judged <- judge_family(tests, family$procedure, family$sizes, family$parts, family$groups, family$alpha,
                         family$trusted)
  check(paste0(family$label, ", adjusted p, lower end"), family$shown$low,
        sapply(judged, function(one) one$range[1]))
  check(paste0(family$label, ", adjusted p, upper end"), family$shown$high,
        sapply(judged, function(one) one$range[2]))
  check(paste0(family$label, ", significant (1) or not (0)"), family$shown$significant,
        sapply(judged, function(one) one$significant))
  check(paste0(family$label, ", kept up to m"), family$shown$kept_up_to,
        sapply(tests, function(test) if (is.null(test$raw)) NA else kept_up_to(test$raw[2], family$alpha)))
  pairs <- Filter(function(test) !is.null(test$raw) && !is.null(test$printed), tests)
  if (family$fits_up_to > 0) {
    check_fits(paste0(family$label, ", fits"), family$shown$fits, lapply(pairs, function(test) test$printed),
               lapply(pairs, function(test) test$raw), family$fits_up_to)
  }
}
`
