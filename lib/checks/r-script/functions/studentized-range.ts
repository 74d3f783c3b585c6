/** `average_over_scale`, `range_upper`, `tukey_p`: the studentized range with relative accuracy, by quadrature. */
export const studentizedRange = `
# ---- the studentized range (ptukey is a few 1e-6 off in the upper tail of small df) ----

# The mean of f(s) over s = sqrt(chi-squared / df), piece by piece; f takes a vector.
average_over_scale <- function(f, df) {
  if (is.infinite(df)) return(f(1))
  density <- function(s) 2 * df * s * dchisq(df * s^2, df)
  cuts <- c(qchisq(c(1e-200, 1e-60, 1e-20, 1e-6, 0.1), df), qchisq(c(1e-2, 1e-17), df, lower.tail = FALSE))
  cuts <- unique(c(0, sqrt(cuts / df)))
  pieces <- mapply(function(from, to) {
    integrate(function(s) density(s) * f(s), from, to, rel.tol = 1e-10, abs.tol = 0, subdivisions = 400,
              stop.on.error = FALSE)$value
  }, cuts[-length(cuts)], cuts[-1])
  min(1, sum(pieces))
}

# P(range of k standard normals > w), w a vector, by the trapezoidal rule over the largest of them.
range_upper <- function(w, k) {
  step <- 0.05
  sapply(w, function(one) {
    z <- seq(-9, max(9, one / 2 + 9), by = step)
    above <- pmin(1, exp(pnorm(one - z, lower.tail = FALSE, log.p = TRUE) - pnorm(z, log.p = TRUE)))
    inner <- ifelse(above == 1, 1, -expm1((k - 1) * log1p(-above)))
    min(1, sum(step * k * dnorm(z) * pnorm(z)^(k - 1) * inner))
  })
}

# Tukey, Tukey-Kramer, Games-Howell: the adjusted p of a pair from its t, the number of groups and df.
tukey_p <- function(t, groups, df) {
  q <- sqrt(2) * abs(t)
  if (q == 0) return(1)
  average_over_scale(function(s) range_upper(q * s, groups), df)
}
`
