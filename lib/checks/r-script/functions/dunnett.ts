/** `dunnett_p`: many-to-one comparisons, by quadrature in base R; mvtnorm as second witness where installed. */
export const dunnett = `
# ---- Dunnett: comparisons with one control ----

# P(max |T_i| > |t|), correlations loadings_i loadings_j: sqrt(n_i / (n_i + n_0)), for equal groups all sqrt(1/2).
dunnett_p <- function(t, loadings, df) {
  t <- abs(t)
  if (t == 0) return(1)
  step <- 0.05
  distinct <- unique(loadings)
  times <- tabulate(match(loadings, distinct))
  known <- function(d) {
    sapply(d, function(one) {
      z <- seq(-9 - one, 9 + one, by = step)
      logs <- 0
      for (i in seq_along(distinct)) {
        l <- distinct[i]
        rest <- sqrt(1 - l^2)
        outside <- pnorm((one - l * z) / rest, lower.tail = FALSE) + pnorm((-one - l * z) / rest)
        logs <- logs + times[i] * log1p(-pmin(1, outside))
      }
      min(1, sum(step * dnorm(z) * -expm1(logs)))
    })
  }
  p <- average_over_scale(function(s) known(t * s), df)
  if (requireNamespace("mvtnorm", quietly = TRUE) && (is.infinite(df) || df == round(df))) {
    set.seed(1)
    correlations <- outer(loadings, loadings)
    diag(correlations) <- 1
    k <- length(loadings)
    inside <- mvtnorm::pmvt(lower = rep(-t, k), upper = rep(t, k), corr = correlations,
                            df = if (is.infinite(df)) 0 else df)
    error <- attr(inside, "error")
    if (abs(1 - inside - p) > 5 * error + 1e-6) {
      differences <<- c(differences, sprintf("Dunnett, t = %.10g: %.10g by quadrature, %.10g by mvtnorm", t, p,
                                             1 - inside))
    }
  }
  p
}
`
