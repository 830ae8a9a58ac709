# The work of smoothing-speed.mjs by R's glm: for each row of counts and each degree a Poisson regression on orthogonal
# polynomials, and the standard error of the midpoint rank at each score from the covariance of the fitted shares.
# Prints milliseconds of the work alone.
#
#   Rscript smoothing-speed.R counts.csv
counts <- as.matrix(read.csv(commandArgs(TRUE)[1], header = FALSE))
x <- seq_len(ncol(counts)) - 1
step <- matrix(0, length(x), length(x))
step[lower.tri(step)] <- 1
diag(step) <- 0.5

one <- function(f, k) {
  basis <- poly(x, k)
  fit <- suppressWarnings(glm(f ~ basis, family = poisson))
  p <- fitted(fit) / sum(f)
  vb <- basis * p - outer(p, drop(crossprod(basis, p)))
  covariance <- vb %*% solve(crossprod(basis, vb)) %*% t(vb) / sum(f)
  sqrt(pmax(0, rowSums((step %*% covariance) * step)))
}

started <- proc.time()[["elapsed"]]
checksum <- 0
for (group in seq_len(nrow(counts))) for (k in 2:8) checksum <- checksum + sum(one(counts[group, ], k))
cat(1000 * (proc.time()[["elapsed"]] - started), checksum, "\n")
