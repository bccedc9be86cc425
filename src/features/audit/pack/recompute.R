# Works the numbers of an audit pack out again, from readings.csv, with base R alone (no package).
# In the unpacked folder: Rscript recompute.R
# Exit code 0: every number agrees to 1e-8; 1: one does not, and it is named; 2: a file is missing.

invisible(suppressWarnings(Sys.setlocale("LC_CTYPE", "C.UTF-8")))
needed <- c("readings.csv", "settings.csv", "results.csv", "points.csv", "limits.csv", "product.csv", "words.csv")
for (name in needed[!file.exists(needed)]) cat(name, "?\n", sep = "")
if (!all(file.exists(needed))) quit(status = 2)

read <- function(name) read.csv(name, check.names = FALSE, colClasses = "character", na.strings = "", fileEncoding = "UTF-8-BOM")
num <- function(text) as.numeric(text)
word_list <- read("words.csv")
say <- function(key, ...) {
  text <- word_list$text[match(key, word_list$key)]
  cat(if (...length() > 0) sprintf(text, ...) else text, "\n", sep = "")
}
settings <- read("settings.csv")
letters_used <- settings$letter
tolerance <- 1e-8

# ---- what was computed: one row a number ------------------------------------------------------------------------------------
mine <- new.env()
mine$rows <- list()
put <- function(part, item, statistic, value, scale = 1) {
  if (length(value) != 1 || is.na(value)) return(invisible())
  mine$rows[[length(mine$rows) + 1]] <- list(mine$result, part, as.character(item), statistic, value, scale)
}

# ---- columns ----------------------------------------------------------------------------------------------------------------
list_terms <- function(most) unlist(lapply(seq_len(min(most, length(letters_used))), function(order)
  combn(letters_used, order, paste, collapse = "")))
term_column <- function(term, x) Reduce(`*`, lapply(strsplit(term, "")[[1]], function(letter) x[, letter]))
unit_contrasts <- function(unit) {
  different <- unique(unit)
  if (length(different) < 2) return(NULL)
  last <- different[length(different)]
  sapply(different[-length(different)], function(one) (unit == one) - (unit == last))
}
indicators <- function(key) sapply(unique(key), function(one) as.numeric(key == one))
rank_of <- function(columns) if (is.null(columns)) 0 else qr(scale_columns(columns), tol = 1e-9)$rank
scale_columns <- function(columns) {
  columns <- as.matrix(columns)
  lengths <- sqrt(colSums(columns^2))
  sweep(columns, 2, ifelse(lengths > 0, lengths, 1), "/")
}
is_new <- function(columns, column) rank_of(cbind(columns, column)) > rank_of(columns)
constant_within <- function(unit, column) all(tapply(column, unit, function(v) max(v) - min(v)) < 1e-9)

# Residual sum of squares around columns that may depend on each other, weighted.
around <- function(columns, y, w) {
  root <- sqrt(w)
  decomposition <- qr(scale_columns(cbind(root, columns * root)), tol = 1e-9)
  df <- length(y) - decomposition$rank
  list(df = df, ss = if (df == 0) 0 else sum(qr.resid(decomposition, (y - y[1]) * root)^2))
}

# ---- tails ------------------------------------------------------------------------------------------------------------------
# Studentized maximum modulus of k effects: the average, over the estimated standard deviation, of the chance that any of k normal
# values passes the limit. Trapezoidal rule over the logarithm of the ratio s / sigma.
modulus_tail <- function(limit, k, df) {
  if (limit <= 0) return(1)
  step <- 0.02 / sqrt(2 * df + 150)
  log_ratio <- seq(-50 / df - 2, log(1600 / df) / 2 + 0.1, by = step)
  ratio <- exp(log_ratio)
  log_density <- log(2) + (df / 2) * log(df / 2) - lgamma(df / 2) + df * log_ratio - (df / 2) * ratio^2
  any_beyond <- -expm1(k * log1p(-2 * pnorm(limit * ratio, lower.tail = FALSE)))
  min(1, sum(exp(log_density) * any_beyond) * step)
}
over_strata <- function(within, p, strata) min(1, max(p, -expm1(strata * log1p(-min(1, within)))))

limits <- read("limits.csv")
# Tail of a statistic on pseudo error, from the table of simulated logarithms: cubic through the four nearest points.
pseudo_tail <- function(stick, statistic, t) {
  own <- limits[num(limits$contrasts) == stick$contrasts & num(limits$replicate_df) == stick$replicate_df & limits$statistic == statistic, ]
  tail <- num(own$log_tail)
  start <- num(own$grid_start[1]); step <- num(own$grid_step[1])
  if (!(t > 0)) return(1)
  place <- (log(t) - start) / step
  if (place <= 0) return(1 - (1 - exp(tail[1])) * t / exp(start))
  last <- length(tail) - 1
  if (place >= last) return(exp(tail[last + 1] + (tail[last + 1] - tail[last]) * (place - last)))
  first <- max(0, min(last - 3, floor(place) - 1))
  x <- place - first
  v <- tail[first + 1:4]
  exp(-v[1] * (x - 1) * (x - 2) * (x - 3) / 6 + v[2] * x * (x - 2) * (x - 3) / 2 -
    v[3] * x * (x - 1) * (x - 3) / 2 + v[4] * x * (x - 1) * (x - 2) / 6)
}
pseudo_limit <- function(stick, statistic, upper) {
  low <- -20; high <- 40
  for (halving in 1:60) {
    middle <- (low + high) / 2
    if (pseudo_tail(stick, statistic, exp(middle)) > upper) low <- middle else high <- middle
  }
  exp((low + high) / 2)
}
limit_of <- function(stick, alpha) switch(stick$kind, t = qt(alpha / 2, stick$df, lower.tail = FALSE),
  known = qnorm(alpha / 2, lower.tail = FALSE), pseudo = pseudo_limit(stick, if (stick$outside) "outside" else "single", alpha))

put_test <- function(part, item, estimate, variance, stick, alpha, y_scale, with_family = TRUE) {
  if (stick$kind == "none") return(invisible())
  se <- stick$sd * sqrt(variance)
  put(part, item, "se", if (se > 0) se else 0, y_scale)
  if (stick$kind == "t") put(part, item, "df", stick$df)
  if (!(se > 0)) return(invisible())
  t <- estimate / se
  put(part, item, "t", t)
  half <- limit_of(stick, alpha) * se
  put(part, item, "low", estimate - half, y_scale)
  put(part, item, "high", estimate + half, y_scale)
  if (stick$kind == "known") return(put(part, item, "p", 2 * pnorm(abs(t), lower.tail = FALSE), 0))
  if (stick$kind == "t") {
    p <- 2 * pt(abs(t), stick$df, lower.tail = FALSE)
    family <- if (with_family) modulus_tail(abs(t), stick$tests, stick$df)
  } else {
    p <- pseudo_tail(stick, if (stick$outside) "outside" else "single", abs(t))
    family <- if (with_family) pseudo_tail(stick, if (stick$bend) "familyAndOutside" else "family", abs(t))
  }
  put(part, item, "p", p, 0)
  if (with_family) put(part, item, "pFamily", over_strata(family, p, stick$strata), 0)
}

# ---- the runs ---------------------------------------------------------------------------------------------------------------
readings <- read("readings.csv")
readings <- readings[readings$phase == "main" & readings$warm_up == "false", ]
run_rows <- readings[!duplicated(readings$run), ]
column_of <- function(letter, which) run_rows[[grep(paste0("^", letter, " ", which), names(run_rows))]]
coded <- sapply(letters_used, function(letter) {
  own <- settings[settings$letter == letter, ]
  planned <- column_of(letter, "planned"); reached <- column_of(letter, "reached")
  value <- ifelse(is.na(reached), planned, reached)
  x <- if (own$kind == "choice") ifelse(value == own$high, 1, -1) else
    (2 * num(value) - num(own$low) - num(own$high)) / (num(own$high) - num(own$low))
  near <- pmax(-1, pmin(1, round(x)))
  ifelse(abs(x - near) < 0.05 - 1e-12, near, x)
})
coded <- matrix(coded, ncol = length(letters_used), dimnames = list(NULL, letters_used))

figure_of <- function(run, spec) {
  own <- readings[readings$run == run & !is.na(readings$result) & readings$result == spec$result & readings$reading_state == "counts", ]
  own <- own[order(num(own$part)), ]
  parts <- num(own$value)[!is.na(own$value)]
  if (spec$kind == "measured") return(list(y = if (length(parts)) mean(parts) else NA, parts = parts, n = 1))
  count <- if (nrow(own) == 0) NA else if (!is.na(own$rejects[1])) num(own$rejects[1]) else num(own$value[1])
  usual <- num(spec$lot_size)
  lot <- if (nrow(own) > 0 && !is.na(own$lot[1])) num(own$lot[1]) else if (!is.na(usual)) usual else 1
  list(y = count, parts = numeric(), n = if (spec$kind == "rejects") lot else lot / (if (is.na(usual)) lot else usual))
}
scales <- list(raw = list(y = function(y, n) y, w = function(n) 1 + 0 * n), sqrt = list(y = function(y, n) sqrt(y / n), w = function(n) 4 * n),
  `freeman-tukey` = list(y = function(y, n) (asin(sqrt(y / (n + 1))) + asin(sqrt((y + 1) / (n + 1)))) / 2, w = function(n) 4 * n + 2))

# ---- error without repeats: the typical contrast (Lenth 1989), the contrast under test left out --------------------------------
robust <- function(ascending) {
  limit <- 2.5 * 1.5 * median(ascending)
  kept <- ascending[ascending < limit]
  if (length(kept) == 0) 0 else 1.5 * median(kept)
}
replicate_sizes <- list(numeric(), 1, sqrt(2) * c(sin(pi / 8), cos(pi / 8)))
corner_contrasts <- function(x, y, center, unit) {
  corner <- !center
  xc <- x[corner, , drop = FALSE]
  columns <- indicators(unit[corner]); found <- list()
  for (term in list_terms(length(letters_used))) {
    if (rank_of(columns) == sum(corner)) break
    column <- term_column(term, xc)
    if (is_new(columns, column)) { columns <- cbind(columns, column); found[[term]] <- column }
  }
  list(runs = sum(corner), columns = found, effects = sapply(found, function(column) 2 * sum(column * (y[corner] - y[corner][1])) / sum(corner)))
}

analyze <- function(spec) {
  alpha <- num(spec$alpha)
  figures <- lapply(run_rows$run, figure_of, spec)
  measured <- sapply(figures, function(f) !is.na(f$y)) & (is.na(run_rows$end) | run_rows$end == "measured")
  used <- run_rows[measured, ]
  n <- sapply(figures[measured], `[[`, "n")
  scale <- scales[[spec$scale]]
  y <- scale$y(sapply(figures[measured], `[[`, "y"), n)
  weight <- scale$w(n)
  theory <- if (spec$scale == "raw") NA else 1 / mean(weight)
  w <- if (all(weight == weight[1])) rep(1, length(y)) else weight / mean(weight)
  x <- coded[measured, , drop = FALSE]
  center <- used$center == "true"
  block <- if (length(unique(run_rows$block)) > 1) used$block else rep("", length(y))
  plots <- !all(is.na(used$whole_plot))
  plot <- if (plots) used$whole_plot else rep("", length(y))
  size <- max(y) - min(y); if (size == 0) size <- max(abs(y), 1e-300)
  column <- function(term) term_column(term, x)

  # The model: intercept, blocks (their average at the intercept), middles, then each term that these runs can tell apart.
  model <- matrix(1, length(y), 1)
  blocks <- 0
  contrasts <- unit_contrasts(block)
  for (index in seq_len(NCOL(contrasts) * !is.null(contrasts)))
    if (is_new(model, contrasts[, index])) { model <- cbind(model, contrasts[, index]); blocks <- blocks + 1 }
  middles <- if (any(center)) { at <- apply(x, 1, paste, collapse = " "); sapply(unique(at[center]), function(one) as.numeric(center & at == one)) }
  corners <- cbind(model, middles)
  bend <- any(center) && !all(center) && is_new(model, as.numeric(center))
  if (bend) model <- cbind(model, as.numeric(center))
  first <- ncol(model)
  terms <- character()
  for (term in strsplit(spec$terms, " ")[[1]]) {
    tied <- !anyDuplicated(strsplit(term, "")[[1]]) && !is_new(corners, column(term))
    if (!tied) corners <- cbind(corners, column(term))
    if (!tied && is_new(model, column(term))) { model <- cbind(model, column(term)); terms <- c(terms, term) }
  }
  root <- sqrt(w); lengths <- sqrt(colSums((model * root)^2))
  decomposition <- qr(sweep(model * root, 2, lengths, "/"), LAPACK = FALSE, tol = 1e-12)
  upper_inverse <- backsolve(qr.R(decomposition), diag(ncol(model)))
  covariance <- tcrossprod(upper_inverse) / outer(lengths, lengths)
  coefficient <- c(upper_inverse %*% crossprod(qr.Q(decomposition), (y - y[1]) * root)) / lengths
  fitted <- c(model %*% coefficient) + y[1]
  coefficient[1] <- coefficient[1] + y[1]
  residual <- y - fitted
  leverage <- rowSums(qr.Q(decomposition)^2); leverage[leverage > 1 - 1e-9] <- 1
  variance <- diag(covariance)
  df <- length(y) - ncol(model)
  residual_ss <- if (df > 0) sum(w * residual^2) else 0
  total <- around(NULL, y, w)

  # Error: the rung was fixed from the layout; its spread comes from the readings.
  at_point <- apply(x, 1, paste, collapse = " ")
  negligible <- 32 * .Machine$double.eps * max(abs(y))
  floor_sd <- if (is.na(theory)) 0 else sqrt(theory)
  lift <- function(sd) max(floor_sd, if (sd <= negligible) 0 else sd)
  pairs <- unique(c(list_terms(2), terms))
  pure <- function(unit) around(cbind(unit_contrasts(unit), indicators(at_point)), y, w)
  leftover <- function(unit) around(cbind(unit_contrasts(unit), middles, sapply(pairs, column)), y, w)
  between <- function() {
    average <- function(values) tapply(values, factor(plot, unique(plot)), mean)
    columns <- cbind(unit_contrasts(block), middles, sapply(pairs, column))
    columns <- columns[, apply(columns, 2, function(one) constant_within(plot, one)), drop = FALSE]
    averaged <- if (ncol(columns) > 0) apply(columns, 2, average)
    sizes <- c(table(factor(plot, unique(plot))))
    of_corners <- c(tapply(!center, factor(plot, unique(plot)), any))
    sizes[!of_corners] <- max(sizes[of_corners], 1)
    around(averaged, c(average(y)), sizes)
  }
  whole <- function(one) plots && constant_within(plot, one)
  places <- if (plots) ifelse(apply(model[, -seq_len(first), drop = FALSE], 2, whole), "whole", "sub") else rep("all", length(terms))
  bend_place <- if (!bend) character() else if (!plots) "all" else if (whole(as.numeric(center))) "whole" else "sub"
  rungs <- if (plots) c(whole = spec$rung_whole, sub = spec$rung_sub) else c(all = spec$rung)
  judged <- unique(c(places, bend_place)); judged <- judged[rungs[judged] != "none"]
  climb <- function(place, pure_error, left, contrasts) {
    rung <- rungs[[place]]
    base <- list(tests = max(1, sum(c(places, bend_place) == place)), bend = place %in% bend_place, strata = max(1, length(judged)))
    none <- list(sd = NA, df = NA, stick = function(one) list(kind = "none"))
    if (rung %in% c("replicates", "replicates+high-order")) {
      spread <- if (rung == "replicates" && pure_error$df > 0) pure_error else left
      if (spread$df > 0) {
        sd <- lift(sqrt(spread$ss / spread$df))
        return(list(sd = sd, df = spread$df, stick = function(one) c(base, list(kind = "t", sd = sd, df = spread$df))))
      }
    }
    if (grepl("^pseudo", rung) && !is.null(contrasts) && any(num(limits$contrasts) == length(contrasts$effects) & num(limits$replicate_df) == pure_error$df)) {
      to_run <- sqrt(contrasts$runs) / 2
      sizes <- abs(contrasts$effects)
      extra <- replicate_sizes[[pure_error$df + 1]] * (if (pure_error$df == 0) 0 else sqrt(pure_error$ss / pure_error$df) / to_run)
      overall <- lift(robust(c(sizes, extra)) * to_run)
      pseudo <- c(base, list(kind = "pseudo", contrasts = length(sizes), replicate_df = pure_error$df))
      return(list(sd = overall, df = NA, stick = function(one) {
        place <- if (is.null(one)) integer() else which(sapply(contrasts$columns, function(other) abs(sum(other * one[!center])) == contrasts$runs))
        if (length(place) == 0) c(pseudo, list(sd = overall, outside = TRUE)) else
          c(pseudo, list(sd = lift(robust(c(sizes[-place[1]], extra)) * to_run), outside = FALSE))
      }))
    }
    if (floor_sd > 0) return(list(sd = floor_sd, df = NA, stick = function(one) list(kind = "known", sd = floor_sd)))
    none
  }
  pure_error <- pure(block)
  if (!plots) {
    error <- climb("all", pure_error, leftover(block), corner_contrasts(x, y, center, block))
    stick_of <- function(one, place) error$stick(one)
    plot_variance <- 0
  } else {
    sub <- climb("sub", pure(plot), leftover(plot), corner_contrasts(x, y, center, plot))
    gaps <- between(); big <- climb("whole", gaps, gaps, NULL)
    plot_variance <- if (is.na(sub$sd) || is.na(big$sd)) 0 else max(0, (big$sd^2 - sub$sd^2) / (length(y) / length(unique(plot))))
    error <- list(sd = if (is.na(sub$sd)) NA else sqrt(sub$sd^2 + plot_variance), df = sub$df)
    stick_of <- function(one, place) if (place == "whole") big$stick(one) else sub$stick(one)
    put("error", "whole", "variance", plot_variance, size^2)
    for (stratum in c("whole", "sub")) {
      own <- if (stratum == "whole") big else sub
      put("error", stratum, "df", own$df); put("error", stratum, "sd", own$sd, size)
    }
  }
  put("error", "run", "sd", error$sd, size); put("error", "run", "df", error$df)
  if (pure_error$df > 0) { put("error", "pure", "df", pure_error$df); put("error", "pure", "ss", pure_error$ss, total$ss) }

  # Effects: changes from low to high, twice the coefficients.
  put("effect", "intercept", "effect", coefficient[1], size)
  put("effect", "intercept", "ss", coefficient[1]^2 / variance[1], total$ss)
  intercept_stick <- stick_of(NULL, if (plots) "whole" else "all")
  put_test("effect", "intercept", coefficient[1], variance[1], intercept_stick, alpha, size, with_family = FALSE)
  for (index in seq_along(terms)) {
    place <- first + index
    put("effect", terms[index], "effect", 2 * coefficient[place], size)
    put("effect", terms[index], "ss", coefficient[place]^2 / variance[place], total$ss)
    put_test("effect", terms[index], 2 * coefficient[place], 4 * variance[place], stick_of(model[, place], places[index]), alpha, size)
  }
  bend_estimate <- NA; bend_limits <- NULL
  if (bend) {
    bend_estimate <- -coefficient[first]; stick <- stick_of(NULL, bend_place)
    bend_ss <- bend_estimate^2 / variance[first]
    put("curvature", "curvature", "estimate", bend_estimate, size); put("curvature", "curvature", "ss", bend_ss, total$ss)
    put_test("curvature", "curvature", bend_estimate, variance[first], stick, alpha, size)
    bend_limits <- c(bend_estimate, bend_estimate)
    if (stick$kind != "none" && stick$sd > 0) bend_limits <- bend_estimate + c(-1, 1) * limit_of(stick, alpha) * stick$sd * sqrt(variance[first])
  }

  # Analysis of variance: what is lost when one source alone is left out.
  row <- function(source, row_df, ss, tested) {
    put("anova", source, "df", row_df); put("anova", source, "ss", ss, total$ss)
    if (row_df > 0) put("anova", source, "ms", ss / row_df, total$ss)
    if (tested && row_df > 0 && !plots && !is.na(error$sd) && !is.na(error$df) && error$sd > 0) {
      f <- ss / row_df / error$sd^2
      put("anova", source, "f", f); put("anova", source, "p", pf(f, row_df, error$df, lower.tail = FALSE), 0)
    }
  }
  lost <- function(columns) max(0, around(model[, -c(1, columns), drop = FALSE], y, w)$ss - residual_ss)
  if (blocks > 0) row("blocks", blocks, lost(1 + seq_len(blocks)), TRUE)
  if (length(terms) > 0) row("model", length(terms), lost(first + seq_along(terms)), TRUE)
  if (bend) row("curvature", 1, bend_ss, TRUE)
  row("residual", df, residual_ss, FALSE)
  if (df > pure_error$df && pure_error$df > 0) {
    lack <- list(df = df - pure_error$df, ss = max(0, residual_ss - pure_error$ss))
    row("lackOfFit", lack$df, lack$ss, FALSE)
    if (pure_error$ss > 0) {
      f <- (lack$ss / lack$df) / (pure_error$ss / pure_error$df)
      put("anova", "lackOfFit", "f", f); put("anova", "lackOfFit", "p", pf(f, lack$df, pure_error$df, lower.tail = FALSE), 0)
    }
  }
  if (pure_error$df > 0) row("pureError", pure_error$df, pure_error$ss, FALSE)
  row("total", total$df, total$ss, FALSE)
  r2 <- if (total$ss > 0) 1 - residual_ss / total$ss else 0
  put("fit", "r2", "value", r2)
  put("fit", "r2Adjusted", "value", if (df > 0 && total$ss > 0) 1 - (1 - r2) * total$df / df else r2)

  # Single runs.
  sd_residual <- if (df > 0) sqrt(residual_ss / df) else 0
  room <- 1 - leverage; weighted <- residual * root
  if (all(room > 0)) {
    press <- sum((weighted / room)^2)
    put("fit", "press", "value", press, total$ss)
    if (total$ss > 0) put("fit", "r2Predicted", "value", 1 - press / total$ss)
  }
  for (index in seq_along(y)) {
    item <- used$run[index]
    put("run", item, "fitted", fitted[index], size); put("run", item, "residual", residual[index], size); put("run", item, "leverage", leverage[index])
    if (!(sd_residual > negligible && room[index] > 0)) next
    internal <- weighted[index] / (sd_residual * sqrt(room[index]))
    put("run", item, "studentizedInternal", internal)
    left <- df - internal^2
    if (df > 1 && left > 1e-9 * df) put("run", item, "studentizedExternal", internal * sqrt((df - 1) / left))
    put("run", item, "cook", internal^2 * leverage[index] / (room[index] * ncol(model)))
  }

  # Limits as published (Lenth 1989), beside those that were used.
  if (spec$regular == "true") {
    sizes <- abs(corner_contrasts(x, y, center, block)$effects); m <- length(sizes)
    if (m >= 3) {
      pse <- robust(sizes)
      put("lenth", "d", "value", m / 3)
      put("lenth", "s0", "value", 1.5 * median(sizes), size); put("lenth", "pse", "value", pse, size)
      put("lenth", "me", "value", qt(1 - alpha / 2, m / 3) * pse, size); put("lenth", "sme", "value", qt((1 + (1 - alpha)^(1 / m)) / 2, m / 3) * pse, size)
    }
  }
  parts <- if (spec$scale %in% c("raw", "log")) Filter(function(one) length(one) >= 2, lapply(figures[measured], `[[`, "parts")) else list()
  within_sd <- NULL
  if (length(parts) > 0) {
    within_df <- sum(lengths(parts) - 1)
    within_sd <- sqrt(sum(sapply(parts, function(one) sum((one - mean(one))^2))) / within_df)
    harmonic <- length(parts) / sum(1 / lengths(parts))
    put("within", "sd", "value", within_sd, size); put("within", "df", "value", within_df); put("within", "parts", "value", harmonic)
  }

  # Predictions: average over blocks, without the bend.
  limit <- if (intercept_stick$kind == "none") NA else limit_of(intercept_stick, alpha)
  points <- read("points.csv")
  for (index in seq_len(nrow(points))) {
    at <- matrix(num(unlist(points[index, letters_used])), nrow = 1, dimnames = list(NULL, letters_used))
    values <- vapply(terms, function(term) term_column(term, at), 0)
    fit <- coefficient[1] + sum(coefficient[first + seq_along(terms)] * values)
    name <- points$point[index]
    put("prediction", name, "fit", fit, size)
    if (bend) {
      shares <- (1 - at[1, ]^2)[settings$kind == "number"]
      if (length(shares) && max(abs(range(shares))) >= 1e-9) {
        ends <- fit - outer(bend_limits, range(shares))
        put("prediction", name, "bendLow", min(ends), size); put("prediction", name, "bendHigh", max(ends), size)
      }
    }
    if (is.na(error$sd) || is.na(limit)) next
    point <- c(1, rep(0, first - 1), values)
    form <- function(one) c(one %*% covariance %*% one)
    if (!plots) { spread <- error$sd^2 * form(point); width <- limit } else {
      if (is.na(big$sd) || is.na(sub$sd)) next
      share <- form(c(1, rep(0, first - 1), ifelse(places == "whole", values, 0)))
      pieces <- c(big$sd^2 * share, sub$sd^2 * max(0, form(point) - share)); spread <- sum(pieces)
      freedom <- c(big$df, sub$df); weighed <- sum(pieces^2 / freedom)
      width <- if (anyNA(freedom) || weighed <= 0) limit else qt(alpha / 2, spread^2 / weighed, lower.tail = FALSE)
    }
    put("prediction", name, "se", sqrt(spread), size)
    put_range <- function(kind, wide) { put("prediction", name, paste0(kind, "Low"), fit - width * sqrt(wide), size)
      put("prediction", name, paste0(kind, "High"), fit + width * sqrt(wide), size) }
    put_range("ci", spread); put_range("pi", spread + error$sd^2)
    if (!is.null(within_sd)) put_range("part", spread + error$sd^2 + within_sd^2 * (1 - 1 / harmonic))
  }
}

# ---- beside the product's own ------------------------------------------------------------------------------------------------
results <- read("results.csv")
for (index in seq_len(nrow(results))) { mine$result <- results$result[index]; analyze(as.list(results[index, ])) }
pick <- function(place) sapply(mine$rows, `[[`, place)
own <- data.frame(result = pick(1), part = pick(2), item = pick(3), statistic = pick(4), recomputed = pick(5), scale = pick(6), stringsAsFactors = FALSE)
product <- read("product.csv"); product$value <- num(product$value)
key <- function(table) paste(table$result, table$part, table$item, table$statistic)
own$product <- product$value[match(key(own), key(product))]
own$difference <- abs(own$recomputed - own$product) / pmax(abs(own$recomputed), abs(own$product), 1e-6 * own$scale, 1e-300)
for (index in seq_len(nrow(results))) {
  cat("\n"); say("result", results$result[index], results$name[index], results$unit[index])
  for (part in unique(own$part)) {
    rows <- own[own$result == results$result[index] & own$part == part, ]
    if (nrow(rows) == 0) next
    cat("\n"); say(part)
    say("columns")
    cat(sprintf("%-12s %-20s %24.15g %24.15g %9.1e\n", rows$item, rows$statistic, rows$recomputed, rows$product, rows$difference), sep = "")
  }
}
cat("\n"); say("notRecomputed")
for (name in grep("^not\\.", word_list$key, value = TRUE)) { cat("- "); say(name) }
cat("\n")
if (nrow(product) == 0) { say("noVerdict"); quit(status = 0) }
label <- function(rows) paste(rows$result, rows$part, rows$item, rows$statistic, sep = " / ")
missing <- product[is.na(match(key(product), key(own))), ]
extra <- own[is.na(own$product), ]
for (name in c(label(missing), label(extra))) say("onlyOnce", name)
compared <- own[!is.na(own$difference), ]
worst <- compared[which.max(compared$difference), ]
say("largest", nrow(compared), worst$difference, label(worst))
wrong <- compared[compared$difference > tolerance, ]
wrong <- wrong[order(-wrong$difference), ]
for (line in seq_len(min(nrow(wrong), 40))) say("differs", label(wrong[line, ]), wrong$product[line], wrong$recomputed[line], wrong$difference[line])
if (nrow(wrong) + nrow(missing) + nrow(extra) > 0) { say("disagrees", nrow(wrong) + nrow(missing) + nrow(extra)); quit(status = 1) }
say("agrees", tolerance)
