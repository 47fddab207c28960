# How far the power of linear-interaction with sampled predictors is from the truth. The method averages over predictors
# as if they and their product were jointly normal; here the product is a product. For each design f2 is chosen so that the
# method says .80, predictors are drawn, and the power given the drawn values (a noncentral F) is averaged over draws, so
# that the Monte Carlo error is that of an average and not of counted rejections. Two main effects, nothing else in the
# model, alpha .05. Base R; base R's pf with ncp is good to 1e-10, far below the Monte Carlo error.
#   Rscript test/methods/linear/interaction-simulation.R > test/methods/linear/interaction-simulation.json

alpha <- 0.05
draws <- 4000

method_power <- function(n, f2) {
  v <- n - 4
  x <- qbeta(alpha, 1 / 2, v / 2, lower.tail = FALSE)
  j <- 0:ceiling(qnbinom(1e-15, (n - 3) / 2, 1 / (1 + f2), lower.tail = FALSE))
  sum(dnbinom(j, (n - 3) / 2, 1 / (1 + f2)) * pbeta(x, 1 / 2 + j, v / 2, lower.tail = FALSE))
}

# One draw: power given the values drawn. Without any product to test there is no power.
given_draw <- function(kind, n, f2, correlation, proportion) {
  x <- if (kind == "binary-binary") rbinom(n, 1, proportion) else rnorm(n)
  z <- if (kind == "continuous-continuous") correlation * x + sqrt(1 - correlation^2) * rnorm(n)
       else rbinom(n, 1, proportion)
  variance <- switch(kind,
    "continuous-continuous" = 1 + correlation^2,
    "continuous-binary" = proportion * (1 - proportion),
    "binary-binary" = (proportion * (1 - proportion))^2)
  left <- sum(qr.resid(qr(cbind(1, x, z)), x * z)^2)
  if (left < 1e-9) return(0)
  pf(qf(alpha, 1, n - 4, lower.tail = FALSE), 1, n - 4, f2 / variance * left, lower.tail = FALSE)
}

designs <- list(
  list("continuous-continuous", 0, NA), list("continuous-continuous", 0.5, NA),
  list("continuous-binary", 0, 0.5), list("continuous-binary", 0, 0.2),
  list("binary-binary", 0, 0.5), list("binary-binary", 0, 0.2))

rows <- character()
for (design in designs) for (n in c(60, 120, 250, 500)) {
  f2 <- uniroot(function(f) method_power(n, f) - 0.8, c(1e-4, 3), tol = 1e-14)$root
  set.seed(20261201)
  power <- replicate(draws, given_draw(design[[1]], n, f2, design[[2]], design[[3]]))
  rows <- c(rows, sprintf(
    '    {"kind": "%s", "correlation": %g, "proportion": %s, "n": %d, "f2": %.15g, "simulated": %.5f, "error": %.5f}',
    design[[1]], design[[2]], if (is.na(design[[3]])) "null" else sprintf("%g", design[[3]]), n, f2, mean(power), sd(power) / sqrt(draws)))
}
cat('{\n  "made_by": "interaction-simulation.R",\n  "with": "base R, Mersenne Twister, seed 20261201",\n  "draws": ', draws,
    ',\n  "rows": [\n', paste(rows, collapse = ",\n"), "\n  ]\n}\n", sep = "")
