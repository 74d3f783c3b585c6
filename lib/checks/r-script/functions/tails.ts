/** `p_value`, `p_range`: the p-values that a printed statistic can have. */
export const tails = `
# ---- p-values of statistics ----

# Two-sided for t, z and r; upper tail for F and chi-squared.
p_value <- function(test, value, df) {
  switch(test,
    t = 2 * pt(-abs(value), df[1]),
    z = 2 * pnorm(-abs(value)),
    r = 2 * pt(-abs(value) * sqrt(df[1] / (1 - value^2)), df[1]),
    F = pf(value, df[1], df[2], lower.tail = FALSE),
    chi2 = pchisq(value, df[1], lower.tail = FALSE))
}

# Printed degrees of freedom, as text: whole ones as they are, fractional ones with the ends of their rounding.
df_ends <- function(text) {
  df <- as.numeric(text)
  if (!is.finite(df) || df == round(df)) return(df)
  ends <- rounding(df, nchar(sub("^[^.]*[.]", "", text)))
  if (ends[1] > 0) c(ends[1], df, ends[2]) else c(df, ends[2])
}

# All p-values that a statistic printed with so many decimals can have. df: text, one element each.
p_range <- function(test, value, decimals, df) {
  ends <- rounding(value, decimals)
  if (test %in% c("F", "chi2")) {
    sizes <- pmax(0, ends)
  } else {
    sizes <- if (ends[1] <= 0 && ends[2] >= 0) c(0, max(abs(ends))) else sort(abs(ends))
    if (test == "r") sizes <- pmin(1, sizes)
  }
  corners <- if (length(df) == 0) matrix(nrow = 1, ncol = 0) else as.matrix(expand.grid(lapply(df, df_ends)))
  at <- function(size) apply(corners, 1, function(corner) p_value(test, size, corner))
  c(min(at(sizes[2])), max(at(sizes[1])))
}
`
