# Planning values of the example, from a real data set: `attitude` of base R's package datasets (30 departments of one
# company, ratings in percent). The package is part of R and comes under GPL-2 | GPL-3; no data are copied here, only
# the figures this script prints. Run: Rscript planning-values.R
model <- lm(rating ~ learning + complaints + privileges + raises + critical + advance, data = attitude)
overlap <- lm(learning ~ complaints + privileges + raises + critical + advance, data = attitude)
n <- nrow(attitude)
k <- length(coef(model)) - 1
show <- function(name, value) cat(sprintf("%-22s %.6f\n", name, value))
show("n", n)
show("residual SD", sigma(model))
show("SD of learning", sd(attitude$learning) * sqrt((n - 1) / n))
show("R2 of learning", summary(overlap)$r.squared)
show("slope of learning", coef(model)[["learning"]])
show("R2", summary(model)$r.squared)
show("adjusted R2", summary(model)$adj.r.squared)
show("predictors", k)
