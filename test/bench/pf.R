# The base R side of numeric-bench.ts: prints seconds for the task named by its argument.
# pf:    20 rounds over 2000 noncentralities, vectorised; prints seconds a call
# table: 100 x 100 required numbers (partial R2 x power), u = 3, p = 5, fixed predictors, by uniroot over pf
task <- commandArgs(trailingOnly = TRUE)[1]
if (task == "pf") {
  ncp <- 10 + (0:1999) / 200
  q <- qf(0.05, 4, 115, lower.tail = FALSE)
  start <- proc.time()[["elapsed"]]
  for (i in 1:200) pf(q, 4, 115, ncp, lower.tail = FALSE)
  cat((proc.time()[["elapsed"]] - start) / (200 * 2000), "\n")
} else {
  start <- proc.time()[["elapsed"]]
  for (r2 in seq(0.02, 0.30, length.out = 100)) for (power in seq(0.60, 0.97, length.out = 100)) {
    f2 <- r2 / (1 - r2)
    miss <- function(n) pf(qf(0.05, 3, n - 9, lower.tail = FALSE), 3, n - 9, f2 * n, lower.tail = FALSE) - power
    n <- ceiling(uniroot(miss, c(10.5, 5000))$root)
  }
  cat(proc.time()[["elapsed"]] - start, "\n")
}
