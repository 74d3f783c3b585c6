/** `raw_range`, `adjust_family`, `kept_up_to`, `is_significant`: the judgement of one family, from its evidence. */
export const families = `
# ---- one family of tests ----

on_p <- c("bonferroni", "sidak", "holm", "holm-sidak", "hochberg", "hommel", "bh", "by", "bky", "storey")
on_t <- c("tukey", "games-howell", "dunnett", "scheffe")
single_step <- c("bonferroni", "sidak")
closed <- c("holm", "holm-sidak", "hochberg", "hommel")

# The raw p that an adjusted one leaves possible: exact for single-step procedures, else between p / m and p.
invert <- function(procedure, adjusted, m) {
  adjusted <- clip(adjusted)
  low <- adjusted[1]
  high <- adjusted[2]
  if (procedure == "bonferroni") return(c(low / m, if (high >= 1) 1 else high / m))
  if (procedure == "sidak") return(c(1 - (1 - low)^(1 / m), if (high >= 1) 1 else 1 - (1 - high)^(1 / m)))
  c(low / m, high)
}

# What is known of one test: the range of its raw p, whether that is printed or only turned back from an adjusted
# one, and the range of its printed adjusted p. witnesses: list(raw =, adjusted =, open =) of lists of ranges.
weigh <- function(witnesses, procedure, m) {
  known <- combine(witnesses$raw)
  printed <- combine(witnesses$adjusted)
  if (!is.null(known)) {
    most <- m * (1 + log(max(1, m)))
    contradicts <- !is.null(printed) && printed[1] > min(1, known[2] * most * 1.05)
    raw <- clip(if (contradicts) join_ranges(known, invert(procedure, printed, m)) else known)
    return(list(raw = raw, direct = TRUE, printed = printed))
  }
  if (!is.null(printed)) return(list(raw = invert(procedure, printed, m), direct = FALSE, printed = printed))
  open <- combine(witnesses$open)
  list(raw = open, direct = !is.null(open), printed = NULL)
}

# Adjusted p as ranges; NULL for a test of which nothing is known. Members that are not printed may have any p.
adjust_ranges <- function(procedure, raw, m, alpha) {
  known <- lapply(raw, function(range) if (is.null(range)) c(0, 1) else clip(range))
  if (m < length(known) && procedure %in% single_step) {
    return(unlist(lapply(known, function(one) adjust_ranges(procedure, list(one), max(1, m), alpha)),
                  recursive = FALSE))
  }
  low <- sapply(known, function(range) range[1])
  high <- sapply(known, function(range) range[2])
  hidden <- if (procedure %in% single_step) 0 else max(0, m - length(known))
  if (hidden > 0 && procedure %in% closed) {
    # members at p = 0 leave a closed procedure on the others as it is without them
    bounds <- list(low = adjust_p(procedure, low, length(low), alpha), high = adjust_p(procedure, high, m, alpha))
  } else {
    bounds <- adjust_bounds(procedure, c(low, rep(0, hidden)), c(high, rep(1, hidden)), max(m, length(low)), alpha)
  }
  lapply(seq_along(known), function(i) c(bounds$low[i], bounds$high[i]))
}

# The adjusted p of one comparison from its t statistics: list(low =, high =, df =) each.
adjust_statistics <- function(procedure, statistics, groups) {
  if (groups < 2 || length(statistics) == 0) return(NULL)
  tail_of <- function(t, df) {
    switch(procedure,
      dunnett = dunnett_p(t, rep(sqrt(0.5), groups - 1), df),
      scheffe = if (is.infinite(df)) pchisq(t^2, groups - 1, lower.tail = FALSE)
                else pf(t^2 / (groups - 1), groups - 1, df, lower.tail = FALSE),
      tukey_p(t, groups, df))
  }
  combine(lapply(statistics, function(one) clip(c(tail_of(one$high, one$df), tail_of(one$low, one$df)))))
}

# tests: a list of list(raw, direct, printed, statistics), as weigh() gives them.
adjust_family <- function(tests, procedure, m, groups, alpha, trusted) {
  raw <- lapply(tests, function(test) test$raw)
  by_p <- NULL
  if (procedure == "any") {
    by_p <- mapply(join_ranges, adjust_ranges("bh", raw, m, alpha), adjust_ranges("bonferroni", raw, m, alpha),
                   SIMPLIFY = FALSE)
  } else if (procedure %in% on_p) {
    by_p <- adjust_ranges(procedure, raw, m, alpha)
  }
  lapply(seq_along(tests), function(i) {
    test <- tests[[i]]
    printed <- test$printed
    exactly_undone <- procedure %in% c("raw", single_step)
    if (!is.null(printed) && (procedure == "any" || (!test$direct && !exactly_undone))) return(printed)
    due <- NULL
    if (procedure == "raw") due <- clip(if (is.null(test$raw)) c(0, 1) else test$raw)
    if (procedure %in% on_t) due <- adjust_statistics(procedure, test$statistics, groups)
    if (is.null(due) && !is.null(by_p)) due <- by_p[[i]]
    if (is.null(due)) {
      if (!is.null(printed)) return(printed)
      return(c(if (is.null(test$raw)) 0 else test$raw[1], 1))
    }
    if ((trusted || m > length(tests)) && !is.null(printed)) {
      narrowed <- intersect_ranges(due, printed)
      if (!is.null(narrowed)) return(narrowed)
    }
    due
  })
}

# TRUE and FALSE for certain, NA where the range holds the level.
is_significant <- function(range, alpha) {
  if (range[2] <= alpha * (1 + 1e-12)) return(TRUE)
  if (range[1] >= alpha) FALSE else NA
}

# The adjusted ranges and decisions at one m, or at several of which the text allows each; a family that was joined of
# several parts is corrected part by part by an m below its size.
judge_family <- function(tests, procedure, sizes, parts, groups, alpha, trusted) {
  judged <- lapply(sizes, function(m) {
    if (length(parts) == 1 || m >= length(tests)) {
      return(adjust_family(tests, procedure, m, groups, alpha, trusted))
    }
    ends <- cumsum(parts)
    unlist(lapply(seq_along(parts), function(i) {
      adjust_family(tests[seq(ends[i] - parts[i] + 1, ends[i])], procedure, m, groups, alpha, trusted)
    }), recursive = FALSE)
  })
  lapply(seq_along(tests), function(i) {
    each <- lapply(judged, function(ranges) ranges[[i]])
    decided <- sapply(each, is_significant, alpha = alpha)
    agreed <- length(unique(decided)) == 1
    list(range = Reduce(join_ranges, each), significant = if (agreed) decided[1] else NA)
  })
}

# The largest number of tests at which Bonferroni keeps p; NA where no number of any use is too large.
kept_up_to <- function(p, alpha) {
  if (p < 1e-12) return(NA)
  m <- floor(alpha / p)
  while ((m + 1) * p <= alpha * (1 + 1e-12)) m <- m + 1
  while (m > 0 && m * p > alpha * (1 + 1e-12)) m <- m - 1
  m
}
`
