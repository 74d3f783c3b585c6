/** `check(what, shown, computed, tolerance)` and `finish()`. */
export const checking = `
# ---- comparing ----

differences <- character(0)

# Holds numbers that are shown against numbers computed here. NA stands for "not shown" or "not known" on both sides.
# Relative tolerance; absolute below 1e-300.
check <- function(what, shown, computed, tolerance = 1e-8) {
  computed <- as.numeric(computed)
  shown <- as.numeric(shown)
  if (length(shown) != length(computed)) {
    differences <<- c(differences, sprintf("%s: %d numbers are shown, %d are computed", what,
                                           length(shown), length(computed)))
    return(invisible(FALSE))
  }
  same <- mapply(function(a, b) {
    if (is.na(a) || is.na(b)) return(is.na(a) && is.na(b))
    if (is.infinite(a) || is.infinite(b)) return(a == b)
    abs(a - b) <= tolerance * max(abs(a), abs(b), 1e-300)
  }, shown, computed)
  same <- as.logical(same)
  if (verbose) {
    cat(sprintf("%s: shown %s, computed %s\\n", what, format(shown, digits = 10), format(computed, digits = 10)),
        sep = "")
  }
  wrong <- which(!same)
  if (length(wrong) > 0) {
    at <- if (length(shown) > 1) paste0(" [", wrong, "]") else ""
    differences <<- c(differences, sprintf("%s%s: shown %.10g, computed %.10g", what, at, shown[wrong],
                                           computed[wrong]))
  }
  invisible(length(wrong) == 0)
}

finish <- function() {
  if (length(differences) == 0) {
    cat("agrees\\n")
  } else {
    writeLines(differences)
    if (!interactive()) quit(status = 1)
  }
}
`
