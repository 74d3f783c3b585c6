/** `adjust_in_order`, `adjust_in_order_bounds`: procedures that need weights, an order, a graph or the number of groups. */
export const ordered = `
# ---- procedures with weights, an order or a graph ----

# p in the order of the list; weights: one each; graph: a square matrix; groups: k, where all pairs are compared.
adjust_in_order <- function(procedure, p, m = length(p), weights = rep(1 / m, length(p)), graph = NULL, groups = NA) {
  n <- length(p)
  level_of <- function(p, weight) ifelse(p == 0, 0, ifelse(weight > 0, p / weight, Inf))
  switch(procedure,
    "weighted-bonferroni" = pmin(1, level_of(p, weights)),
    "weighted-holm" = {
      levels <- level_of(p, weights)
      by_level <- order(levels)
      left <- pmin(1, rev(cumsum(rev(weights[by_level]))) + max(0, 1 - sum(weights)))
      steps <- ifelse(is.infinite(levels[by_level]), 1, levels[by_level] * left)
      pmin(1, cummax(steps))[order(by_level)]
    },
    "fixed-sequence" = cummax(p),
    fallback = {
      adjusted <- numeric(n)
      for (i in seq_len(n)) {
        adjusted[i] <- min(sapply(seq_len(i), function(s) {
          before <- if (s < i) max(adjusted[s:(i - 1)]) else 0
          max(before, level_of(p[i], sum(weights[s:i])))
        }), 1)
      }
      adjusted
    },
    graphical = {
      adjusted <- numeric(n)
      left <- seq_len(n)
      largest <- 0
      while (length(left) > 0) {
        j <- left[which.min(level_of(p[left], weights[left]))]
        largest <- min(1, max(largest, level_of(p[j], weights[j])))
        adjusted[j] <- largest
        left <- setdiff(left, j)
        passed <- weights
        for (l in left) passed[l] <- weights[l] + weights[j] * graph[j, l]
        updated <- graph
        for (l in left) for (k in left) {
          loop <- graph[l, j] * graph[j, l]
          updated[l, k] <- if (l == k || loop >= 1) 0 else (graph[l, k] + graph[l, j] * graph[j, k]) / (1 - loop)
        }
        weights <- passed
        graph <- updated
      }
      adjusted
    },
    shaffer = {
      pairs <- groups * (groups - 1) / 2
      # the numbers of pairs of so many means that can be equal at once
      counts <- function(k) {
        if (k < 2) return(0)
        sort(unique(unlist(lapply(1:k, function(b) b * (b - 1) / 2 + counts(k - b)))))
      }
      possible <- counts(groups)
      by_p <- order(p)
      most <- sapply(seq_len(n), function(rank) max(possible[possible <= pairs - rank + 1]))
      pmin(1, cummax(most * p[by_p]))[order(by_p)]
    },
    stop("no such procedure: ", procedure))
}

# None of them falls where a p-value rises.
adjust_in_order_bounds <- function(procedure, low, high, ...) {
  list(low = adjust_in_order(procedure, low, ...), high = adjust_in_order(procedure, high, ...))
}
`
