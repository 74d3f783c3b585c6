/** `adjust_p`, `adjust_bounds`: the procedures that work on p-values alone. */
export const procedures = `
# ---- adjusted p-values ----

# m: the size of the whole family; members that are not given act as p = 1. alpha matters to two-stage procedures.
adjust_p <- function(procedure, p, m = length(p), alpha = 0.05) {
  switch(procedure,
    raw = p,
    bonferroni = p.adjust(p, "bonferroni", n = m),
    holm = p.adjust(p, "holm", n = m),
    hochberg = p.adjust(p, "hochberg", n = m),
    hommel = p.adjust(p, "hommel", n = m),
    bh = p.adjust(p, "BH", n = m),
    by = p.adjust(p, "BY", n = m),
    sidak = at_least_one(p, m),
    "holm-sidak" = {
      order_up <- order(p)
      stepped <- cummax(at_least_one(p[order_up], m - seq_along(p) + 1))
      stepped[order(order_up)]
    },
    bky = two_stage(p, m, alpha / (1 + alpha), 1 + alpha),
    "bky-unscaled" = two_stage(p, m, alpha / (1 + alpha), 1),
    tsbh = two_stage(p, m, alpha, 1),
    storey = {
      above <- sum(p >= 0.5) + m - length(p)
      min(1, above / (m * 0.5)) * p.adjust(p, "BH", n = m)
    },
    stop("no such procedure: ", procedure))
}

# 1 - (1 - p)^m without loss of digits.
at_least_one <- function(p, m) -expm1(m * log1p(-p))

# Two-stage Benjamini-Hochberg: r rejections at the first level leave m - r hypotheses.
two_stage <- function(p, m, level, factor) {
  q <- p.adjust(p, "BH", n = m)
  sorted <- sort(p)
  kept <- which(sorted <= level * seq_along(sorted) / m)
  r <- if (length(kept) == 0) 0 else max(kept)
  left <- if (r == 0 || r == m) m else m - r
  pmin(1, q * (left / m) * factor)
}

first_level <- function(procedure, alpha) if (procedure == "tsbh") alpha else alpha / (1 + alpha)

# The bounds of each adjusted p when every p ranges over [low, high]: at the ends of the box, as all procedures but
# the two-stage ones are monotone. These drop where the largest p passes the level of the first stage, so that the
# two sides of that are looked at one by one.
adjust_bounds <- function(procedure, low, high, m = length(low), alpha = 0.05) {
  run <- function(p) adjust_p(procedure, p, m, alpha)
  if (!(procedure %in% c("bky", "bky-unscaled", "tsbh"))) return(list(low = run(low), high = run(high)))
  level <- first_level(procedure, alpha)
  lows <- list()
  highs <- list()
  if (all(low <= level)) {
    lows <- c(lows, list(run(low)))
    highs <- c(highs, list(run(pmin(high, level))))
    for (i in which(high > level)) {
      raised <- low
      raised[i] <- level * (1 + 1e-14)
      lows <- c(lows, list(run(raised)))
    }
  } else {
    lows <- list(run(low))
  }
  if (any(high > level)) highs <- c(highs, list(run(high)))
  list(low = do.call(pmin, lows), high = do.call(pmax, highs))
}
`
