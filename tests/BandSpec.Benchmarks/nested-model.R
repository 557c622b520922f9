# The nested model of CharacterizingSpeed.cs in lme4: its likelihood at our estimates, and its own search with a limit of time.
# Rscript nested-model.R FOLDER SECONDS
suppressMessages(library(lme4))
arguments <- commandArgs(trailingOnly = TRUE)
readings <- read.csv(file.path(arguments[1], "readings.csv"), colClasses = c(lot = "factor", unit = "factor"))
ours <- read.csv(file.path(arguments[1], "theta.csv"), row.names = 1)
columns <- rownames(ours)
model <- as.formula(paste("y ~ 0 +", paste(columns, collapse = " + "), "+",
  paste0("(0 + ", columns, " | unit)", collapse = " + "), "+", paste0("(0 + ", columns, " | lot)", collapse = " + ")))

parts <- lFormula(model, readings, REML = TRUE, control = lmerControl(check.conv.singular = "ignore"))
deviance <- do.call(mkLmerDevfun, parts)
names <- parts$reTrms$cnms
theta <- mapply(function(group, column) ours[column, group], names(names), unlist(names))
cat(sprintf("lme4 %s, same likelihood at our estimates: %.8f\n", packageVersion("lme4"), deviance(theta)))

invisible(tryCatch({
  setTimeLimit(cpu = as.numeric(arguments[2]), transient = TRUE)
  start <- proc.time()
  fit <- suppressMessages(suppressWarnings(lmer(model, readings, REML = TRUE,
    control = lmerControl(calc.derivs = FALSE, check.conv.singular = "ignore"))))
  took <- proc.time() - start
  cat(sprintf("lme4's own search: %.1f s by the clock, %.1f s of processor time, %d evaluations, deviance %.8f\n",
    took[["elapsed"]], took[["user.self"]] + took[["sys.self"]], as.integer(fit@optinfo$feval), REMLcrit(fit)))
}, error = function(e) cat(sprintf("lme4's own search was stopped after %s s of processor time without an answer\n", arguments[2]))))
