source("lib.R"); source("cohort_ref.R"); source("weighted_age_ref.R")
RNGkind("Mersenne-Twister", "Inversion", "Rejection")
clip <- function(v, lo, hi) pmin(hi, pmax(lo, v))
make <- function(out, s0) {
  t0 <- Sys.time()
  ## 1 tiny with ties
  set.seed(s0 + 1)
  { s <- clip(round(rnorm(37, 11, 3.4)), 0, 20); ref_group("c1_tiny", s, 0, 20, 1, out, "N=37, scale 0-20, heavy ties, roughly symmetric", gwidth = 3) }
  ## 2 skewed
  set.seed(s0 + 2)
  { s <- rbinom(200, 30, rbeta(200, 5.5, 1.7)); ref_group("c2_leftskew", s, 0, 30, 1, out, "N=200, scale 0-30, beta-binomial(5.5,1.7), left-skewed with a ceiling") }
  ## 3 modes and gaps
  set.seed(s0 + 3)
  { s <- c(rbinom(820, 60, rbeta(820, 9, 19)), rbinom(680, 60, rbeta(680, 22, 7))); s[s %in% c(11, 24, 25, 37, 52)] <- s[s %in% c(11, 24, 25, 37, 52)] + 2
    s[s == 25] <- 26; s[s == 37] <- 38; ref_group("c3_twomodes", clip(s, 0, 60), 0, 60, 1, out, "N=1500, scale 0-60, two modes; no one has 11, 24, 25, 37 (or 52) : interior gaps") }
  ## 4 large
  set.seed(s0 + 4)
  { s <- rbinom(20000, 120, rbeta(20000, 6.2, 5.1)); ref_group("c4_large", s, 0, 120, 1, out, "N=20000, scale 0-120, beta-binomial(6.2,5.1)", gwidth = 10) }
  ## 5 weighted
  set.seed(s0 + 5)
  { n <- 900; s <- rbinom(n, 40, rbeta(n, 4, 3.2)); w <- round(clip(exp(rnorm(n, -.1, .55) + .012 * (s - 22)), .2, 4.7), 4); w[1] <- .2; w[2] <- 4.7
    ref_weighted("c5_weighted", s, w, 0, 40, out, "n=900, scale 0-40, sampling weights 0.2-4.7 correlated with score") }
  ## 6 age
  set.seed(s0 + 6)
  { n <- 3000; a <- round(runif(n, 6, 16.9), 2); t <- (a - 11.5) / 5.5; s <- clip(round(44 + 17 * t - 5 * t^2 + exp(2.1 + .25 * t - .15 * t^2) * rnorm(n)), 0, 80)
    ref_age("c6_age", a, s, 0, 80, 6, 17, out, "n=3000, ages 6.00-16.90, scale 0-80, normal with cubic mean and quadratic log-sd in age") }
  cat(out, format(Sys.time() - t0), "\n")
}
make("../cohorts", 20240500)
print(R.version.string); print(packageVersion("mgcv")); print(packageVersion("MASS"))
